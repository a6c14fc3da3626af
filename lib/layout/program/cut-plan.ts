/**
 * A tree of cuts with what it costs, and which of two trees is better: safe first, then fewest settings, then fewest turns of the
 * stock, then fewest cuts, then the most wood given back to the rack.
 */
import type { CandidateCut } from "./candidate-cuts";
import type { ShopLimits } from "./program";
import { areaOf, type Region, sizeOf } from "./region";

export interface CutPlan {
  readonly cut: CandidateCut;
  /** null: that side needs no more cutting. */
  readonly low: CutPlan | null;
  readonly high: CutPlan | null;
  /** Cuts at which something shorter or narrower than the shop's limits is held. */
  readonly unsafe: number;
  /** Rips of parts that a crosscut has already shortened: long parts are kept long until last. */
  readonly lateRips: number;
  /** Different settings of the saw, as sorted numbers of the search's own register. */
  readonly settings: readonly number[];
  readonly turns: number;
  readonly cuts: number;
  /** µm² that go back to the rack. */
  readonly offcutArea: number;
}

/** Big enough to keep. */
export function isOffcut(region: Region, limits: ShopLimits): boolean {
  return region.blanks.length === 0 && sizeOf(region.x) >= limits.offcutLength && sizeOf(region.y) >= limits.offcutWidth;
}

/** What a crosscut leaves is held at one of its ends, so the longer of the two counts; what a rip leaves is as long as before. */
export function isHeldShort(cut: CandidateCut, limits: ShopLimits): boolean {
  const longest =
    cut.axis === "y" ? sizeOf(cut.region.x) : Math.max(cut.low ? sizeOf(cut.low.x) : 0, cut.high ? sizeOf(cut.high.x) : 0);
  return longest < limits.shortestCrosscut;
}

/** What runs between the fence and the blade of a rip is narrower than a hand may push. */
export function isNarrowRip(cut: CandidateCut, limits: ShopLimits): boolean {
  if (cut.axis !== "y") return false;
  const between = cut.bladeSide === "near" ? cut.setting : cut.setting - sizeOf(cut.kerf);
  return between < limits.narrowestRip;
}

/** One number for everything that makes two cuts share a setting of the machine. */
export function settingKey(cut: CandidateCut): string {
  return `${cut.kind} ${cut.bladeSide} ${cut.setting}`;
}

/** How a part lies at a cut against the cut that made it. */
export function turnBetween(made: CandidateCut, next: CandidateCut): "none" | "quarter" | "end-for-end" {
  if (made.kind !== next.kind) return "quarter";
  return made.fromEdge === next.fromEdge ? "none" : "end-for-end";
}

export interface CostFrame {
  readonly limits: ShopLimits;
  /** The board after truing. */
  readonly root: Region;
  /** Number of a setting in the search's register. */
  readonly settingNumber: (cut: CandidateCut) => number;
}

/** Cuts of this one that hold something short or narrow. */
const ownUnsafe = (cut: CandidateCut, { limits }: CostFrame): number =>
  Number(isHeldShort(cut, limits)) + Number(isNarrowRip(cut, limits));

const isShortened = (region: Region, { root }: CostFrame): boolean => sizeOf(region.x) < sizeOf(root.x);

const ownLateRips = (cut: CandidateCut, frame: CostFrame): number => Number(cut.axis === "y" && isShortened(cut.region, frame));

/** At least so many late rips are needed in what a cut leaves: one where a shortened part is not yet at its width. */
function leastLateRips(region: Region | null, frame: CostFrame): number {
  if (!region || !isShortened(region, frame)) return 0;
  return Number(region.blanks.some((blank) => sizeOf(blank.y) < sizeOf(region.y)));
}

/** Whether a plan that begins with this cut can still be as safe as the one at hand; a test that costs no search. */
export function isSafeEnough(cut: CandidateCut, best: CutPlan | undefined, frame: CostFrame): boolean {
  if (!best) return true;
  const late = ownLateRips(cut, frame) + leastLateRips(cut.low, frame) + leastLateRips(cut.high, frame);
  return (ownUnsafe(cut, frame) - best.unsafe || late - best.lateRips) <= 0;
}

/** The cost of one cut followed by the plans of what it leaves. */
export function planOf(cut: CandidateCut, low: CutPlan | null, high: CutPlan | null, frame: CostFrame): CutPlan {
  const { limits } = frame;
  const sum = (of: (plan: CutPlan) => number) => (low ? of(low) : 0) + (high ? of(high) : 0);
  const racked = (side: Region | null) => (side && isOffcut(side, limits) ? areaOf(side) : 0);
  return {
    cut,
    low,
    high,
    unsafe: sum((plan) => plan.unsafe) + ownUnsafe(cut, frame),
    lateRips: sum((plan) => plan.lateRips) + ownLateRips(cut, frame),
    settings: union(union(low?.settings ?? [], high?.settings ?? []), [frame.settingNumber(cut)]),
    turns: sum((plan) => plan.turns + Number(turnBetween(cut, plan.cut) !== "none")),
    cuts: sum((plan) => plan.cuts) + 1,
    offcutArea: sum((plan) => plan.offcutArea) + racked(cut.low) + racked(cut.high),
  };
}

/** Negative when `a` is the better plan, 0 when neither is. */
export function comparePlans(a: CutPlan, b: CutPlan): number {
  return (
    a.unsafe - b.unsafe ||
    a.lateRips - b.lateRips ||
    a.settings.length - b.settings.length ||
    a.turns - b.turns ||
    a.cuts - b.cuts ||
    b.offcutArea - a.offcutArea
  );
}

/** Union of two ascending lists without repeats. */
function union(a: readonly number[], b: readonly number[]): readonly number[] {
  if (a.length === 0) return b;
  if (b.length === 0) return a;
  const all: number[] = [];
  let i = 0;
  let j = 0;
  while (i < a.length || j < b.length) {
    const left = a[i] ?? Number.POSITIVE_INFINITY;
    const right = b[j] ?? Number.POSITIVE_INFINITY;
    all.push(Math.min(left, right));
    if (left <= right) i++;
    if (right <= left) j++;
  }
  return all;
}

/** Whether every number of one ascending list is in another. */
export function isSubset(part: readonly number[], whole: readonly number[]): boolean {
  let j = 0;
  for (const value of part) {
    while (j < whole.length && (whole[j] ?? value) < value) j++;
    if (whole[j] !== value) return false;
  }
  return true;
}
