/**
 * The best tree of cuts for each part in hand, all of them together: a setting that one part needs anyway costs nothing at another.
 *
 * Whether the parts come apart is decided before; the budget, counted in steps so that the same input always stops at the same place,
 * only limits how long a better tree is sought. All trees are weighed where that can be done; of a crowded board only those that take
 * parts off from outside.
 */
import { type CandidateCut, candidateCuts, type Scope } from "../candidate-cuts";
import { type CutPlan, compareCosts, costOfPlans } from "../cut-plan";
import { part, shavings, worked } from "../part";
import type { SearchReport } from "../program";
import { isFinished, type Region } from "../region";
import type { Workshop } from "../workshop";
import type { Plan } from "./frontier";
import { analysed, type Bound, type Known, prunedTo } from "./prune-branches";
import type { Roots } from "./setting-names";
import { exploreShapes, fineRules, type Rules, type Shape } from "./shape-graph";
import { type Choice, weighPlans } from "./weigh-plans";

/** A part in hand may begin in one of several ways (another edge trued). */
export type Ways = readonly Region[];

export interface ChosenTree {
  /** Which of the part's ways. */
  readonly way: number;
  /** null: no saw and no plane is needed. */
  readonly plan: CutPlan | null;
}

export interface BestTrees {
  /** One for each part. */
  readonly trees: readonly ChosenTree[];
  readonly search: SearchReport;
}

/** Plans kept for one rectangle: for a first idea, for a better one, and for certainty. */
const rooms = [6, 30, 1500];
/** What is left of the budget for the quick search when the whole one does not come to an end. */
const quickShare = 0.3;

export function bestTrees(parts: readonly Ways[], shop: Workshop, budget: number): BestTrees {
  const first = parts.map((ways): ChosenTree => ({ way: 0, plan: firstPlan(ways[0] ?? null, shop) }));
  const whole = searched(parts, shop, "all", Math.floor(budget * (1 - quickShare)));
  const quick = whole.proven ? null : searched(parts, shop, "peel", Math.floor(budget * quickShare));
  let trees: readonly ChosenTree[] = first;
  for (const found of [whole.trees, quick?.trees]) if (found && isBetter(found, trees, shop)) trees = found;
  return { trees, search: { steps: whole.steps + (quick?.steps ?? 0), proven: whole.proven } };
}

interface Searched {
  readonly trees: readonly ChosenTree[] | null;
  readonly steps: number;
  readonly proven: boolean;
}

function searched(parts: readonly Ways[], shop: Workshop, scope: Scope, budget: number): Searched {
  return bestByRules(parts, fineRules(shop, scope), shop, budget);
}

/**
 * Every tree that the rules allow is weighed, or the budget runs out. A hasty weighing with little room comes first: what it finds tells
 * how good is good enough, and whatever cannot be better is left out of the thorough ones.
 */
export function bestByRules(parts: readonly Ways[], rules: Rules, shop: Workshop, budget: number): Searched {
  const explored = exploreShapes(parts.flat(), rules, shop, budget);
  let { steps } = explored;
  if (!explored.shapes) return { trees: null, steps: Math.min(steps, budget), proven: false };
  let graph: Known | null = analysed(safestRoots(parts, explored.shapes));
  let best: { readonly choice: Choice; readonly cost: Bound } | null = null;
  let proven = false;
  for (const room of rooms) {
    const weighed = weighPlans(graph, { room, known: best?.cost ?? null, budget: budget - steps });
    steps = Math.min(steps + weighed.steps, budget);
    if (!weighed.done) break;
    if (weighed.best) best = { choice: weighed.best, cost: costOf(weighed.best, graph) };
    graph = weighed.whole || !best ? null : prunedTo(best.cost, graph);
    proven = graph === null;
    if (!graph) break;
  }
  return { trees: best && treesOf(best.choice, parts), steps, proven };
}

function costOf({ counted, remembered, turns, cuts, offcutArea }: Choice, { bounds }: Known): Bound {
  return { settings: counted + remembered.length + bounds.neededByAll, turns, cuts, offcutArea };
}

/** Of each part only the ways to begin that are as safe as any. */
function safestRoots(parts: readonly Ways[], shapes: readonly (Shape | null)[]): Roots {
  let at = 0;
  return parts.map((ways) => {
    const here = ways.map((_, way) => ({ way, shape: shapes[at + way] ?? null }));
    at += ways.length;
    const least = Math.min(...here.map(({ shape }) => shape?.rank ?? 0));
    return here.filter(({ shape }) => (shape?.rank ?? 0) === least);
  });
}

function treesOf(choice: Choice, parts: readonly Ways[]): readonly ChosenTree[] {
  return choice.ways.map(({ way, plan }, i) => {
    const region = parts[i]?.[way];
    return { way, plan: plan && region ? inPlace(plan, region) : null };
  });
}

/** A plan may have been worked out for the same shape elsewhere in the board; here it is moved to where it is carried out. */
function inPlace({ branch, low, high }: Plan, region: Region): CutPlan {
  const cut = movedTo(branch.cut, region);
  return {
    cut,
    low: low && cut.low ? inPlace(low, cut.low) : null,
    high: high && cut.high ? inPlace(high, cut.high) : null,
  };
}

function movedTo(cut: CandidateCut, region: Region): CandidateCut {
  const { axis, fromEdge, setting, tool } = cut;
  if (!tool) {
    const left = worked(region, fromEdge, setting);
    const kerf = shavings(region, fromEdge, setting);
    return { ...cut, region, kerf, low: cut.low && left, high: cut.high && left };
  }
  const shift = region[axis].from - cut.region[axis].from;
  const blade = { from: cut.kerf.from + shift, to: cut.kerf.to + shift };
  return { ...cut, region, ...part(region, axis, blade, cut.leaves) };
}

/** One tree without search, the first candidate at every rectangle: what is followed when the budget allows nothing better. */
function firstPlan(region: Region | null, shop: Workshop): CutPlan | null {
  if (!region || isFinished(region)) return null;
  const [cut] = candidateCuts(region, shop, "peel");
  if (!cut) throw new Error("no cut is left though the pieces come apart");
  return { cut, low: firstPlan(cut.low, shop), high: firstPlan(cut.high, shop) };
}

function isBetter(trees: readonly ChosenTree[], than: readonly ChosenTree[], shop: Workshop): boolean {
  const cost = (all: readonly ChosenTree[]) =>
    costOfPlans(
      all.flatMap(({ plan }) => plan ?? []),
      shop.limits,
    );
  return compareCosts(cost(trees), cost(than)) < 0;
}
