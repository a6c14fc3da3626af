/**
 * The fewest turns and cuts and the most wood for the rack of any tree through a shape, inside and around it; each may be that of
 * another tree.
 */
import type { Edge } from "../program";
import { everyEdge } from "../region";
import type { Roots, SettingNames } from "./setting-names";
import type { Branch, Shape } from "./shape-graph";

export interface Work {
  readonly turns: number;
  readonly cuts: number;
  /** µm². */
  readonly offcutArea: number;
}

export interface TurnBounds {
  readonly leastThrough: (shape: Shape, branch: Branch) => Work;
  /** Of what lies around a shape, without the turn that brings it to its first cut. */
  readonly around: (shape: Shape) => Work;
}

interface Inside {
  /** By how the stock lies at the first cut; the last of trees in which only the plane is at work. */
  readonly turns: readonly number[];
  readonly cuts: number;
  readonly offcutArea: number;
}

const lies: readonly (Edge | null)[] = [...everyEdge, null];
const nothing: Work = { turns: 0, cuts: 0, offcutArea: 0 };
const never: Work = { turns: Number.POSITIVE_INFINITY, cuts: Number.POSITIVE_INFINITY, offcutArea: 0 };

export function turnBounds(roots: Roots, { shapes }: SettingNames): TurnBounds {
  const inside = new Map<Shape, Inside>();
  /** Work of a side, with the turn from the cut that made it. */
  const after = (lie: Edge | null, shape: Shape | null): Work => {
    const found = shape && inside.get(shape);
    if (!found) return nothing;
    const turns = found.turns.map((count, i) => count + Number(lie !== null && lies[i] !== null && lies[i] !== lie));
    return { ...found, turns: Math.min(...turns) };
  };
  const through = ({ cut, low, high, offcutArea }: Branch): Work => {
    const lie = cut.tool ? cut.fromEdge : null;
    return [after(lie, low), after(lie, high)].reduce(plus, { turns: 0, cuts: 1, offcutArea });
  };
  for (const shape of shapes) inside.set(shape, insideOf(shape, through, inside));
  const around = aroundOf(roots, shapes, after);
  return {
    leastThrough: (shape, branch) => plus(around(shape), through(branch)),
    around,
  };
}

function insideOf(shape: Shape, through: (branch: Branch) => Work, inside: ReadonlyMap<Shape, Inside>): Inside {
  const turns = lies.map(() => Number.POSITIVE_INFINITY);
  let least = never;
  for (const branch of shape.branches) {
    const work = through(branch);
    least = less(least, work);
    const child = branch.low ?? branch.high;
    const passed = branch.cut.tool ? null : child && inside.get(child)?.turns;
    lies.forEach((lie, i) => {
      // The plane leaves the stock as it lies: what comes next decides.
      const own = branch.cut.tool
        ? lie === branch.cut.fromEdge
          ? work.turns
          : undefined
        : passed
          ? passed[i]
          : lie === null
            ? 0
            : undefined;
      turns[i] = Math.min(turns[i] ?? Number.POSITIVE_INFINITY, own ?? Number.POSITIVE_INFINITY);
    });
  }
  return { ...least, turns };
}

const plus = (a: Work, b: Work): Work => ({
  turns: a.turns + b.turns,
  cuts: a.cuts + b.cuts,
  offcutArea: a.offcutArea + b.offcutArea,
});
const less = (a: Work, b: Work): Work => ({
  turns: Math.min(a.turns, b.turns),
  cuts: Math.min(a.cuts, b.cuts),
  offcutArea: Math.max(a.offcutArea, b.offcutArea),
});

function aroundOf(roots: Roots, shapes: readonly Shape[], after: (lie: Edge | null, shape: Shape | null) => Work) {
  const around = new Map<Shape, Work>();
  const put = (shape: Shape | null, work: Work) => {
    if (shape) around.set(shape, less(around.get(shape) ?? never, work));
  };
  const leastOf = (ways: Roots[number]) => ways.map(({ shape }) => after(null, shape)).reduce(less, never);
  roots.forEach((ways, i) => {
    const others = roots
      .filter((_, j) => j !== i)
      .map(leastOf)
      .reduce(plus, nothing);
    for (const { shape } of ways) put(shape, others);
  });
  const of = (shape: Shape) => around.get(shape) ?? nothing;
  for (const shape of [...shapes].reverse()) {
    for (const { cut, low, high, offcutArea } of shape.branches) {
      const lie = cut.tool ? cut.fromEdge : null;
      const here = plus(of(shape), { turns: 0, cuts: 1, offcutArea });
      put(low, plus(here, after(lie, high)));
      put(high, plus(here, after(lie, low)));
    }
  }
  return of;
}
