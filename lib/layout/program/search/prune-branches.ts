/** Leaves branches out through which no tree is better than one that is known, again and again, because what is left tells more. */
import { type Cost, compareCosts } from "../cut-plan";
import { type SettingBounds, settingBounds } from "./setting-bounds";
import { type Roots, type SettingNames, settingNames } from "./setting-names";
import { type SettingShares, settingShares } from "./setting-shares";
import type { Branch, Shape } from "./shape-graph";
import { type TurnBounds, turnBounds } from "./turn-bounds";

/** A graph of shapes with what is known of every tree through it. */
export interface Known {
  readonly roots: Roots;
  readonly names: SettingNames;
  readonly bounds: SettingBounds;
  readonly shares: SettingShares;
  readonly turns: TurnBounds;
}

/** Costs apart from hazards, which are the same in all trees through the graph. */
export type Bound = Omit<Cost, "rank">;

/** Whether trees that cost no less than this may be better than one that costs so much. */
export function mayBeat(known: Bound | null, least: Bound): boolean {
  return known === null || compareCosts({ rank: 0, ...least }, { rank: 0, ...known }) < 0;
}

export function analysed(roots: Roots): Known {
  const names = settingNames(roots);
  const bounds = settingBounds(roots, names);
  return {
    roots,
    names,
    bounds,
    shares: settingShares(roots, names, bounds),
    turns: turnBounds(roots, names),
  };
}

/** What may still lead to something better than what costs so much; null where nothing does. */
export function prunedTo(best: Bound, before: Known): Known | null {
  let known = before;
  for (;;) {
    const { roots, names } = known;
    const next = new Map<Shape, Shape>();
    let dropped = 0;
    const side = (shape: Shape | null) => shape && (next.get(shape) ?? null);
    const reaches = (shape: Shape | null) => shape === null || next.has(shape);
    for (const shape of names.shapes) {
      const branches = shape.branches.flatMap((branch): Branch[] => {
        const kept = reaches(branch.low) && reaches(branch.high) && mayBeat(best, leastThrough(known, shape, branch));
        if (!kept) dropped++;
        return kept ? [{ ...branch, low: side(branch.low), high: side(branch.high) }] : [];
      });
      if (branches.length > 0) next.set(shape, { ...shape, branches });
    }
    if (dropped === 0) return known;
    const left = roots.map((ways) =>
      ways.filter(({ shape }) => reaches(shape)).map(({ way, shape }) => ({ way, shape: side(shape) })),
    );
    if (left.some((ways) => ways.length === 0)) return null;
    known = analysed(left);
  }
}

function leastThrough({ bounds, shares, turns }: Known, shape: Shape, branch: Branch): Bound {
  const settings = Math.max(bounds.leastThrough(shape, branch), shares.leastThrough(shape, branch));
  return { settings, ...turns.leastThrough(shape, branch) };
}
