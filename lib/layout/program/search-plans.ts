/**
 * The best tree of cuts through a rectangle, remembered by rectangle: what a rectangle holds and how its edges are follows from
 * where it lies in the board. The budget is counted in plans weighed, so the same input always stops at the same place.
 */
import { candidateCuts, type KerfByAxis, type Scope } from "./candidate-cuts";
import { type CostFrame, type CutPlan, planOf, settingKey } from "./cut-plan";
import { emptyFrontier, type Frontier, withPlan } from "./frontier";
import type { ShopLimits } from "./program";
import { isFinished, type Region, regionKey } from "./region";

export interface SearchLimits {
  readonly scope: Scope;
  /** Most plans kept for one rectangle. */
  readonly room: number;
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
  const known = new Map<string, Result>();
  let steps = 0;

  function weigh(region: Region): Result {
    if (isFinished(region)) return "finished";
    const key = regionKey(region);
    const before = known.get(key);
    if (before) return before;
    let frontier = emptyFrontier;
    for (const cut of candidateCuts(region, kerf, search.scope)) {
      const low = cut.low ? weigh(cut.low) : "finished";
      const high = low && cut.high ? weigh(cut.high) : "finished";
      if (!low || !high) return null;
      for (const lowPlan of plansIn(low)) {
        for (const highPlan of plansIn(high)) {
          steps++;
          if (steps > search.budget) return null;
          frontier = withPlan(frontier, planOf(cut, lowPlan, highPlan, frame), search.room);
        }
      }
      frontier = { plans: frontier.plans, whole: frontier.whole && isWhole(low) && isWhole(high) };
    }
    known.set(key, frontier);
    return frontier;
  }

  const result = weigh(root);
  const found = result && result !== "finished" ? result.plans[0] : undefined;
  return found && result ? { found, steps, whole: isWhole(result) } : { found: null, steps };
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
