/**
 * The best tree of cuts through a rectangle, remembered by shape: rectangles with blanks of the same sizes at the same places are
 * cut alike wherever they lie in the board. The budget is counted in plans weighed, so the same input always stops at the same place.
 */
import { type CandidateCut, candidateCuts, type KerfByAxis, type Scope } from "./candidate-cuts";
import { type CostFrame, type CutPlan, isSafeEnough, planOf, settingKey } from "./cut-plan";
import { emptyFrontier, type Frontier, type FrontierLimits, withPlan } from "./frontier";
import type { ShopLimits } from "./program";
import { isFinished, part, type Region, shapeKey } from "./region";

export interface SearchLimits extends FrontierLimits {
  readonly scope: Scope;
  /** Most plans weighed. */
  readonly budget: number;
}

export type SearchOutcome =
  | { readonly found: CutPlan; readonly steps: number; readonly whole: boolean }
  | { readonly found: null; readonly steps: number };

/** null plans mark the end of the budget; `finished` a rectangle that needs no cut. */
type Result = Frontier | "finished" | null;

export function searchPlans(root: Region, kerf: KerfByAxis, limits: ShopLimits, search: SearchLimits): SearchOutcome {
  const frame = costFrame(root, limits);
  const known = new Map<string, Frontier>();
  let steps = 0;

  function weigh(region: Region | null): Result {
    if (!region || isFinished(region)) return "finished";
    const key = shapeKey(region);
    const before = known.get(key);
    if (before) return before;
    let frontier = emptyFrontier;
    for (const cut of candidateCuts(region, kerf, search.scope)) {
      if (!isSafeEnough(cut, frontier.plans[0], frame)) continue;
      const next: Frontier | null = weighCut(cut, frontier);
      if (!next) return null;
      frontier = next;
    }
    known.set(key, frontier);
    return frontier;
  }

  function weighCut(cut: CandidateCut, soFar: Frontier): Frontier | null {
    const low = weigh(cut.low);
    const high = low && weigh(cut.high);
    if (!low || !high) return null;
    let frontier = soFar;
    for (const lowPlan of plansIn(low)) {
      for (const highPlan of plansIn(high)) {
        steps++;
        if (steps > search.budget) return null;
        frontier = withPlan(frontier, planOf(cut, lowPlan, highPlan, frame), search);
      }
    }
    return { plans: frontier.plans, whole: frontier.whole && isWhole(low) && isWhole(high) };
  }

  const result = weigh(root);
  const found = result && result !== "finished" ? result.plans[0] : undefined;
  return found && result ? { found: inPlace(found, root, frame), steps, whole: isWhole(result) } : { found: null, steps };
}

/** A plan may have been worked out for the same shape elsewhere in the board; here it is moved to where it is carried out. */
function inPlace(plan: CutPlan, region: Region, frame: CostFrame): CutPlan {
  const { cut } = plan;
  const shift = region[cut.axis].from - cut.region[cut.axis].from;
  const halves = part(region, cut.axis, { from: cut.kerf.from + shift, to: cut.kerf.to + shift });
  const follow = (side: CutPlan | null, half: Region | null) => (side && half ? inPlace(side, half, frame) : null);
  return planOf({ ...cut, ...halves, region }, follow(plan.low, halves.low), follow(plan.high, halves.high), frame);
}

/** One tree without search, the first candidate at every rectangle: what is followed when the budget allows nothing better. */
export function firstPlan(root: Region, kerf: KerfByAxis, limits: ShopLimits): CutPlan | null {
  const frame = costFrame(root, limits);
  function follow(region: Region | null): CutPlan | null {
    if (!region || isFinished(region)) return null;
    const [cut] = candidateCuts(region, kerf, "peel");
    return cut ? planOf(cut, follow(cut.low), follow(cut.high), frame) : null;
  }
  return follow(root);
}

function costFrame(root: Region, limits: ShopLimits): CostFrame {
  const register = new Map<string, number>();
  return {
    root,
    limits,
    settingNumber: (cut) => {
      const key = settingKey(cut);
      const number = register.get(key) ?? register.size;
      register.set(key, number);
      return number;
    },
  };
}

const plansIn = (result: Frontier | "finished"): readonly (CutPlan | null)[] => (result === "finished" ? [null] : result.plans);
const isWhole = (result: Frontier | "finished"): boolean => result === "finished" || result.whole;
