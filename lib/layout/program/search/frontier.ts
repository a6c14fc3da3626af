/**
 * The plans of one rectangle that may still be part of the best plan of the whole.
 *
 * Settings that may be used elsewhere are remembered by number; all others are counted. A plan is dropped only for one that is no worse
 * whatever the rest of the board turns out to need: in the worst case the rest needs all the other's settings and none of its own. A
 * turn from the cut above may cost one more when the stock lies differently at the first cuts.
 */
import type { Edge } from "../program";
import type { Branch } from "./shape-graph";

export interface Plan {
  readonly branch: Branch;
  readonly low: Plan | null;
  readonly high: Plan | null;
  /** How the stock lies at its first cut; null: only the plane is at work. */
  readonly lie: Edge | null;
  /** Settings that nothing else uses. */
  readonly counted: number;
  /** Ascending. */
  readonly remembered: readonly number[];
  /** How often each of these is used, in their order. */
  readonly uses: readonly number[];
  readonly turns: number;
  readonly cuts: number;
  /** µm² that go back to the rack. */
  readonly offcutArea: number;
}

export type Weighed = Pick<Plan, "lie" | "counted" | "remembered" | "turns" | "cuts" | "offcutArea">;

export interface Frontier<P extends Weighed> {
  readonly plans: readonly P[];
  /** False once a plan that might have mattered was left out for want of room. */
  readonly whole: boolean;
}

/** The frontier with one more plan weighed against it; of equals the earlier stays. It never becomes empty again. */
export function withPlan<P extends Weighed>(frontier: Frontier<P>, plan: P, room: number): Frontier<P> {
  if (frontier.plans.some((kept) => makesNeedless(kept, plan))) return frontier;
  const plans = [...frontier.plans.filter((kept) => !makesNeedless(plan, kept)), plan];
  if (plans.length <= room) return { plans, whole: frontier.whole };
  const worst = plans.reduce((a, b) => (compareWeighed(b, a) >= 0 ? b : a));
  return { plans: plans.filter((one) => one !== worst), whole: false };
}

/** Negative when `a` is better by itself, 0 when neither is. */
export function compareWeighed(a: Weighed, b: Weighed): number {
  return a.counted + a.remembered.length - b.counted - b.remembered.length || compareRest(a, b, 0);
}

function makesNeedless(kept: Weighed, other: Weighed): boolean {
  const more = kept.counted + countMissing(kept.remembered, other.remembered) - other.counted;
  if (more !== 0) return more < 0;
  return compareRest(kept, other, kept.lie === null || kept.lie === other.lie ? 0 : 1) <= 0;
}

function compareRest(a: Weighed, b: Weighed, turn: number): number {
  return a.turns + turn - b.turns || a.cuts - b.cuts || b.offcutArea - a.offcutArea;
}

/** How many numbers of one ascending list are not in another. */
export function countMissing(part: readonly number[], whole: readonly number[]): number {
  let missing = 0;
  let j = 0;
  for (const value of part) {
    while (j < whole.length && (whole[j] ?? value) < value) j++;
    if (whole[j] !== value) missing++;
  }
  return missing;
}

export type Uses = Pick<Plan, "remembered" | "uses">;

export const noUses: Uses = { remembered: [], uses: [] };

/** Both together. */
export function together(a: Uses, b: Uses): Uses {
  if (a.remembered.length === 0) return b;
  if (b.remembered.length === 0) return a;
  const remembered: number[] = [];
  const uses: number[] = [];
  let i = 0;
  let j = 0;
  while (i < a.remembered.length || j < b.remembered.length) {
    const left = a.remembered[i] ?? Number.POSITIVE_INFINITY;
    const right = b.remembered[j] ?? Number.POSITIVE_INFINITY;
    remembered.push(Math.min(left, right));
    uses.push((left <= right ? (a.uses[i] ?? 0) : 0) + (right <= left ? (b.uses[j] ?? 0) : 0));
    if (left <= right) i++;
    if (right <= left) j++;
  }
  return { remembered, uses };
}
