/**
 * The ways in which straight cuts from edge to edge may part pieces without any two of them changing sides: along which axis each two
 * are parted, and which of them lies before the other. What is before stays before, by the middles of the pieces as they lie.
 *
 * A way is a tree read flat: the pieces fall into runs along one axis, each run again into runs along the other.
 */
import type { Axis, Span } from "../program/region";

/** A rectangle to be cut, as sawn; µm. */
export interface Block {
  readonly id: string;
  readonly size: Readonly<Record<Axis, number>>;
  /** Where it lies now: the edge nearer the origin. */
  readonly from: Readonly<Record<Axis, number>>;
  /** Where that edge may lie: inside the part, and off what must be kept clear. */
  readonly room: Readonly<Record<Axis, Span>>;
}

/** Index pairs: the first lies before the second, and a cut runs between them. */
export interface Way {
  readonly x: readonly (readonly [number, number])[];
  readonly y: readonly (readonly [number, number])[];
}

export interface Bounds {
  readonly size: Readonly<Record<Axis, number>>;
  readonly kerf: Readonly<Record<Axis, number>>;
}

/** At most so many are looked at: all there are of six pieces in any arrangement, of far more where they lie in rows. */
export const MOST_WAYS = 2_000;

export function waysApart(blocks: readonly Block[], bounds: Bounds, most: number = MOST_WAYS): readonly Way[] {
  const all = blocks.map((_, i) => i);
  return partings(blocks, all, bounds, null, { left: most });
}

interface Budget {
  left: number;
}

const axes: readonly Axis[] = ["x", "y"];
const nothing: Way = { x: [], y: [] };

function partings(blocks: readonly Block[], group: readonly number[], bounds: Bounds, not: Axis | null, budget: Budget): Way[] {
  if (group.length < 2) return [nothing];
  return axes
    .filter((axis) => axis !== not)
    .flatMap((axis) => {
      const sorted = [...group].sort((a, b) => middle(blocks, a, axis) - middle(blocks, b, axis) || a - b);
      return runs(blocks, sorted, bounds, axis, bounds.size[axis], [], budget);
    });
}

/** Every division of what is left, in order, into runs that are parted along the axis; at least two in all. */
function runs(
  blocks: readonly Block[],
  rest: readonly number[],
  bounds: Bounds,
  axis: Axis,
  room: number,
  before: readonly number[],
  budget: Budget,
): Way[] {
  const found: Way[] = [];
  for (let count = 1; count <= rest.length; count++) {
    const run = rest.slice(0, count);
    if (before.length === 0 && count === rest.length) break;
    const least = Math.max(...run.map((i) => blocks[i]?.size[axis] ?? 0));
    if (least > room || budget.left <= 0) break;
    const inside = partings(blocks, run, { ...bounds, size: { ...bounds.size, [axis]: room } }, axis, budget);
    if (inside.length === 0) continue;
    const after = rest.slice(count);
    const beyond =
      after.length === 0 ? [nothing] : runs(blocks, after, bounds, axis, room - least - bounds.kerf[axis], run, budget);
    const pairs = before.flatMap((a) => run.map((b) => [a, b] as const));
    for (const a of inside) {
      for (const b of beyond) {
        budget.left--;
        if (budget.left < 0) return found;
        const way = { x: [...a.x, ...b.x], y: [...a.y, ...b.y] };
        found.push({ ...way, [axis]: [...pairs, ...way[axis]] });
      }
    }
  }
  return found;
}

const middle = (blocks: readonly Block[], index: number, axis: Axis): number => {
  const block = blocks[index];
  return block ? block.from[axis] + block.size[axis] / 2 : 0;
};
