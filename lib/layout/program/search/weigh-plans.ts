/** The best trees through a graph of shapes, within a budget of plans weighed. */
import { turnBetween } from "../cut-plan";
import type { Edge } from "../program";
import { compareWeighed, type Frontier, noUses, type Plan, together, type Uses, type Weighed, withPlan } from "./frontier";
import { type Bound, type Known, mayBeat } from "./prune-branches";
import type { SettingBounds } from "./setting-bounds";
import type { SettingNames } from "./setting-names";
import type { Branch, Shape } from "./shape-graph";

/** One way for each root, with its plan; a root that needs no cut has none. */
export interface Choice extends Weighed, Uses {
  readonly ways: readonly { readonly way: number; readonly plan: Plan | null }[];
}

export interface Weighing {
  /** False once the budget was spent. */
  readonly done: boolean;
  /** null: nothing better than what was known was found. */
  readonly best: Choice | null;
  readonly steps: number;
  readonly whole: boolean;
}

export interface WeighLimits {
  /** Most plans kept for one rectangle. */
  readonly room: number;
  /** What is not better than this is left out. */
  readonly known: Bound | null;
  readonly budget: number;
}

const nothing: Weighed & Uses = { lie: null, counted: 0, ...noUses, turns: 0, cuts: 0, offcutArea: 0 };

export function weighPlans(graph: Known, { room, known: best, budget }: WeighLimits): Weighing {
  const { roots, names, bounds } = graph;
  const known = new Map<Shape, Frontier<Plan>>();
  let steps = 0;

  function frontierOf(shape: Shape): Frontier<Plan> | null {
    const before = known.get(shape);
    if (before) return before;
    let frontier: Frontier<Plan> = { plans: [], whole: true };
    for (const branch of shape.branches) {
      const low = plansOf(branch.low);
      const high = low && plansOf(branch.high);
      if (!low || !high) return null;
      frontier = { plans: frontier.plans, whole: frontier.whole && low.whole && high.whole };
      const weight = weightOf(shape, branch, names, bounds);
      for (const lowPlan of low.plans) {
        for (const highPlan of high.plans) {
          steps++;
          if (steps > budget) return null;
          const plan = planOf(weight, lowPlan, highPlan);
          if (mayBeat(best, leastWith(graph, shape, plan))) frontier = withPlan(frontier, plan, room);
        }
      }
    }
    known.set(shape, frontier);
    return frontier;
  }

  function plansOf(shape: Shape | null): { readonly plans: readonly (Plan | null)[]; readonly whole: boolean } | null {
    return shape ? frontierOf(shape) : { plans: [null], whole: true };
  }

  let choices: Frontier<Choice> = { plans: [{ ...nothing, ways: [] }], whole: true };
  for (const ways of roots) {
    let next: Frontier<Choice> = { plans: [], whole: choices.whole };
    for (const { way, shape } of ways) {
      const plans = plansOf(shape);
      if (!plans) return { done: false, best: null, steps, whole: false };
      next = { plans: next.plans, whole: next.whole && plans.whole };
      for (const choice of choices.plans) {
        for (const plan of plans.plans) {
          steps++;
          next = withPlan(next, choiceOf(choice, way, plan), room);
        }
      }
    }
    choices = next;
  }
  const first = choices.plans.reduce<Choice | null>((a, b) => (a && compareWeighed(b, a) >= 0 ? a : b), null);
  return { done: true, best: first, steps, whole: choices.whole };
}

/** No tree that holds the plan costs less. */
function leastWith({ bounds, shares, turns }: Known, shape: Shape, plan: Plan): Bound {
  const around = turns.around(shape);
  const paid = plan.remembered.reduce((sum, setting, i) => sum + (plan.uses[i] ?? 0) * shares.shareOf(setting), plan.counted);
  return {
    settings: Math.max(bounds.leastWith(shape, plan.counted, plan.remembered), shares.leastWith(shape, paid)),
    turns: plan.turns + around.turns,
    cuts: plan.cuts + around.cuts,
    offcutArea: plan.offcutArea + around.offcutArea,
  };
}

/** What a branch adds, found once for all the plans of its sides. */
interface Weight {
  readonly branch: Branch;
  readonly lie: Edge | null;
  readonly counted: number;
  readonly own: Uses;
  readonly isOpen: (setting: number) => boolean;
}

function weightOf(shape: Shape, branch: Branch, names: SettingNames, bounds: SettingBounds): Weight {
  const number = names.numberOf(branch);
  return {
    branch,
    lie: branch.cut.tool ? branch.cut.fromEdge : null,
    counted: names.single(branch),
    // What every tree needs is counted once for all.
    own: number === null || bounds.isNeeded(number) ? noUses : { remembered: [number], uses: [1] },
    isOpen: (setting) => bounds.isOpen(shape, setting),
  };
}

function planOf(weight: Weight, low: Plan | null, high: Plan | null): Plan {
  const { branch, lie, isOpen } = weight;
  const all = together(together(low ?? noUses, high ?? noUses), weight.own);
  // Nothing outside the rectangle uses the others any more: they count once and are forgotten.
  const open = all.remembered.every(isOpen) ? all : openOf(all, isOpen);
  return {
    branch,
    low,
    high,
    lie: lie ?? low?.lie ?? high?.lie ?? null,
    counted: weight.counted + (low?.counted ?? 0) + (high?.counted ?? 0) + all.remembered.length - open.remembered.length,
    remembered: open.remembered,
    uses: open.uses,
    turns: (low ? low.turns + turnTo(lie, low) : 0) + (high ? high.turns + turnTo(lie, high) : 0),
    cuts: 1 + (low?.cuts ?? 0) + (high?.cuts ?? 0),
    offcutArea: branch.offcutArea + (low?.offcutArea ?? 0) + (high?.offcutArea ?? 0),
  };
}

function openOf({ remembered, uses }: Uses, isOpen: (setting: number) => boolean): Uses {
  return { remembered: remembered.filter(isOpen), uses: uses.filter((_, i) => isOpen(remembered[i] ?? 0)) };
}

function turnTo(lie: Edge | null, { lie: next }: Plan): number {
  return Number(lie !== null && next !== null && turnBetween(lie, next) !== "none");
}

function choiceOf(before: Choice, way: number, plan: Plan | null): Choice {
  return {
    lie: null,
    ways: [...before.ways, { way, plan }],
    counted: before.counted + (plan?.counted ?? 0),
    ...together(before, plan ?? noUses),
    turns: before.turns + (plan?.turns ?? 0),
    cuts: before.cuts + (plan?.cuts ?? 0),
    offcutArea: before.offcutArea + (plan?.offcutArea ?? 0),
  };
}
