/**
 * A lower bound on the settings of trees that adds up: a setting that no tree uses more than n times costs a cut 1/n of it. Whatever a
 * tree uses it for, its cuts pay no more than one for each setting. What every tree needs costs nothing and is counted once for all.
 */
import type { SettingBounds } from "./setting-bounds";
import type { Roots, SettingNames } from "./setting-names";
import type { Branch, Shape } from "./shape-graph";

export interface SettingShares {
  /** No tree through the branch at this shape has fewer settings than this. */
  readonly leastThrough: (shape: Shape, branch: Branch) => number;
  /** No tree has fewer that holds a plan for the shape whose cuts pay so many shares. */
  readonly leastWith: (shape: Shape, shares: number) => number;
  /** A cut's share of a setting with a number that not every tree needs. */
  readonly shareOf: (setting: number) => number;
}

/** Sums of shares are exact to far less than this. */
const noise = 1e-6;

export function settingShares(roots: Roots, names: SettingNames, bounds: SettingBounds): SettingShares {
  const uses = mostUses(roots, names);
  const shareOf = (setting: number) => 1 / (uses[setting] ?? 1);
  const pays = (branch: Branch): number => {
    const number = names.numberOf(branch);
    if (number === null) return names.single(branch);
    return bounds.isNeeded(number) ? 0 : shareOf(number);
  };
  const inAll = (shares: number) => bounds.neededByAll + Math.ceil(shares - noise);
  const least = new Map<Shape, number>();
  const below = (shape: Shape | null) => (shape && least.get(shape)) ?? 0;
  for (const shape of names.shapes)
    least.set(shape, Math.min(...shape.branches.map((branch) => pays(branch) + below(branch.low) + below(branch.high))));
  const around = new Map<Shape, number>();
  const lies = (shape: Shape | null, beside: number) => {
    if (shape) around.set(shape, Math.min(around.get(shape) ?? Number.POSITIVE_INFINITY, beside));
  };
  const leastOf = (ways: Roots[number]) => Math.min(...ways.map(({ shape }) => below(shape)));
  const all = roots.reduce((sum, ways) => sum + leastOf(ways), 0);
  for (const ways of roots) for (const { shape } of ways) lies(shape, all - leastOf(ways));
  const aroundOf = (shape: Shape) => around.get(shape) ?? 0;
  for (const shape of [...names.shapes].reverse()) {
    for (const branch of shape.branches) {
      const here = aroundOf(shape) + pays(branch);
      lies(branch.low, here + below(branch.high));
      lies(branch.high, here + below(branch.low));
    }
  }
  return {
    leastThrough: (shape, branch) => inAll(aroundOf(shape) + pays(branch) + below(branch.low) + below(branch.high)),
    leastWith: (shape, shares) => inAll(aroundOf(shape) + shares),
    shareOf,
  };
}

/** How often one tree may use each setting at most. */
function mostUses(roots: Roots, { shapes, size, numberOf }: SettingNames): Float64Array {
  const nothing = new Float64Array(size);
  const most = new Map<Shape, Float64Array>();
  const of = (shape: Shape | null) => (shape && most.get(shape)) ?? nothing;
  for (const shape of shapes) {
    const uses = new Float64Array(size);
    for (const branch of shape.branches) {
      const [low, high] = [of(branch.low), of(branch.high)];
      const own = numberOf(branch);
      for (let i = 0; i < size; i++) uses[i] = Math.max(uses[i] ?? 0, (low[i] ?? 0) + (high[i] ?? 0) + Number(i === own));
    }
    most.set(shape, uses);
  }
  const all = new Float64Array(size);
  for (const ways of roots) {
    for (let i = 0; i < size; i++) all[i] = (all[i] ?? 0) + Math.max(...ways.map(({ shape }) => of(shape)[i] ?? 0));
  }
  return all;
}
