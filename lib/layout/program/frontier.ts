/**
 * The plans of one rectangle that may still be part of the best plan of the whole.
 *
 * Safety adds up, so only the safest matter. Settings do not add up: a setting that another part of the board needs anyway costs
 * nothing, so a plan is dropped only for one whose settings are among its own and which is no worse in what follows. A turn from
 * the cut above may cost one more when the first cuts lie differently.
 */
import { type CutPlan, comparePlans, isSubset, turnBetween } from "./cut-plan";

export interface Frontier {
  readonly plans: readonly CutPlan[];
  /** False once a plan that might have mattered was left out for want of room. */
  readonly whole: boolean;
}

export const emptyFrontier: Frontier = { plans: [], whole: true };

export interface FrontierLimits {
  /** Most plans kept for one rectangle. */
  readonly room: number;
  /** Settings of the best tree known: a plan with more of them is no part of a better tree that is as safe. */
  readonly mostSettings: number;
}

/** The frontier with one more plan weighed against it; of equals the earlier stays. It never becomes empty again. */
export function withPlan(frontier: Frontier, plan: CutPlan, limits: FrontierLimits): Frontier {
  if (frontier.plans.some((kept) => makesNeedless(kept, plan))) return frontier;
  const plans = [...frontier.plans.filter((kept) => !makesNeedless(plan, kept)), plan].sort(comparePlans);
  const few = plans.filter((kept, i) => i === 0 || kept.settings.length <= limits.mostSettings);
  return few.length > limits.room ? { plans: few.slice(0, limits.room), whole: false } : { plans: few, whole: frontier.whole };
}

function makesNeedless(kept: CutPlan, other: CutPlan): boolean {
  const safer = kept.unsafe - other.unsafe || kept.lateRips - other.lateRips;
  if (safer !== 0) return safer < 0;
  if (!isSubset(kept.settings, other.settings)) return false;
  const turn = turnBetween(kept.cut, other.cut) === "none" ? 0 : 1;
  const rest = kept.turns + turn - other.turns || kept.cuts - other.cuts || other.offcutArea - kept.offcutArea;
  return rest <= 0;
}
