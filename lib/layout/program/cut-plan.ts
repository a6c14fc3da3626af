/**
 * A tree of cuts with what it costs, and which of two trees is better: safe first, then fewest settings, then fewest turns of the
 * stock, then fewest cuts, then the most wood given back to the rack.
 */
import type { CandidateCut } from "./candidate-cuts";
import { rankOf } from "./hazard";
import type { Edge, ShopLimits } from "./program";
import { areaOf, type Region, sizeOf } from "./region";

export interface CutPlan {
  readonly cut: CandidateCut;
  /** null: that side needs no more work. */
  readonly low: CutPlan | null;
  readonly high: CutPlan | null;
}

/** Of a tree or of several; the first number that differs decides, less is better. */
export interface Cost {
  readonly rank: number;
  readonly settings: number;
  readonly turns: number;
  readonly cuts: number;
  /** µm² that go back to the rack; more is better. */
  readonly offcutArea: number;
}

/** Big enough to keep. */
export function isOffcut(region: Region, limits: ShopLimits): boolean {
  return region.blanks.length === 0 && sizeOf(region.x) >= limits.offcutLength && sizeOf(region.y) >= limits.offcutWidth;
}

export function offcutAreaOf({ low, high }: CandidateCut, limits: ShopLimits): number {
  return [low, high].reduce((sum, side) => sum + (side && isOffcut(side, limits) ? areaOf(side) : 0), 0);
}

/** One word for everything that makes two cuts share a setting of a machine; null where no saw is set. */
export function settingKey({ tool, kind, bladeSide, setting }: CandidateCut): string | null {
  return tool && `${tool.machine.id} ${kind} ${bladeSide} ${setting}`;
}

/** The first edge that a saw measures from in a tree: how the stock has to lie when work on it begins. */
export function firstLie(plan: CutPlan): Edge | null {
  return plan.cut.tool ? plan.cut.fromEdge : (firstOf(plan.low) ?? firstOf(plan.high));
}

const firstOf = (plan: CutPlan | null): Edge | null => plan && firstLie(plan);

/** How a part lies at a cut against the cut that made it. Planing in between turns nothing at the saw. */
export function turnBetween(made: Edge, next: Edge): "none" | "quarter" | "end-for-end" {
  if (made === next) return "none";
  return isEnd(made) === isEnd(next) ? "end-for-end" : "quarter";
}

const isEnd = (edge: Edge): boolean => edge === "left" || edge === "right";

/** What trees cost that belong to one program. */
export function costOfPlans(plans: readonly CutPlan[], limits: ShopLimits): Cost {
  const settings = new Set<string>();
  let [rank, turns, cuts, offcutArea] = [0, 0, 0, 0];
  const walk = (plan: CutPlan, lie: Edge | null): void => {
    const { cut } = plan;
    const key = settingKey(cut);
    if (key !== null) settings.add(key);
    rank += rankOf(cut.hazard);
    turns += Number(cut.tool !== null && lie !== null && turnBetween(lie, cut.fromEdge) !== "none");
    cuts += 1;
    offcutArea += offcutAreaOf(cut, limits);
    const now = cut.tool ? cut.fromEdge : lie;
    if (plan.low) walk(plan.low, now);
    if (plan.high) walk(plan.high, now);
  };
  for (const plan of plans) walk(plan, null);
  return { rank, settings: settings.size, turns, cuts, offcutArea };
}

/** Negative when `a` is better, 0 when neither is. */
export function compareCosts(a: Cost, b: Cost): number {
  return a.rank - b.rank || a.settings - b.settings || a.turns - b.turns || a.cuts - b.cuts || b.offcutArea - a.offcutArea;
}
