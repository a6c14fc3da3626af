/**
 * From pieces placed by hand on one board to the cut program, or what stands in its way.
 *
 * Whether a layout can be sawn is always decided; the budget only limits how long a better tree is sought. The search widens in
 * stages, each with a share of the budget, and keeps the best tree of all stages.
 */
import { blockingPieces } from "./blocking";
import type { KerfByAxis } from "./candidate-cuts";
import { placementRefusal } from "./check-placement";
import { type CutPlan, comparePlans } from "./cut-plan";
import type { CutRequest } from "./cut-request";
import { mirrorProgram, mirrorRequest, viewFromFirstPiece } from "./mirror";
import type { CutProgramOutcome, SearchReport } from "./program";
import { isFinished, wholeBoard } from "./region";
import { firstPlan, type SearchLimits, searchPlans } from "./search-plans";
import { type TruingWay, truingWays } from "./truing";
import { type ChosenTree, writeProgram } from "./write-program";

/** Deterministic: the same request gives the same program; a mirrored request the mirrored program. */
export function planCuts(request: CutRequest): CutProgramOutcome {
  const view = viewFromFirstPiece(request);
  const outcome = planAsSeen(mirrorRequest(request, view));
  return outcome.ok ? { ok: true, program: mirrorProgram(outcome.program, view) } : outcome;
}

/** Whether the pieces can be sawn at all, without working out how: cheap enough for every move on the screen. */
export function cutRefusal(request: CutRequest): Extract<CutProgramOutcome, { ok: false }> | null {
  const kerf = kerfByAxis(request);
  const board = wholeBoard(request);
  const refusal = placementRefusal(board, kerf);
  if (refusal) return refusal;
  const pieces = blockingPieces(board, kerf);
  if (pieces) return { ok: false, reason: "blocked", pieces };
  const truing = truingWays(board, request);
  return truing.ok ? null : truing;
}

function planAsSeen(request: CutRequest): CutProgramOutcome {
  const refusal = cutRefusal(request);
  if (refusal) return refusal;
  const kerf = kerfByAxis(request);
  const truing = truingWays(wholeBoard(request), request);
  if (!truing.ok) return truing;
  const { tree, search } = bestTree(truing.ways, kerf, request);
  if (!tree.plan && tree.way.edges.length === 0) return { ok: false, reason: "nothing-to-cut" };
  return { ok: true, program: writeProgram(request, kerf, tree, search) };
}

function kerfByAxis(request: CutRequest): KerfByAxis {
  return { x: request.kerf.crosscut, y: request.kerf.rip };
}

/**
 * Shares of the budget and how wide each stage looks: a quick one that always helps; one that is complete on small layouts; and
 * that one again with more room, measured by the tree it found.
 */
const stages: readonly (Pick<SearchLimits, "scope" | "room"> & { readonly share: number })[] = [
  { scope: "peel", room: 3, share: 0.3 },
  { scope: "all", room: 24, share: 0.3 },
  { scope: "all", room: 120, share: 0.4 },
];

function bestTree(ways: readonly TruingWay[], kerf: KerfByAxis, request: CutRequest): { tree: ChosenTree; search: SearchReport } {
  let best: ChosenTree | null = null;
  let steps = 0;
  let proven = true;
  for (const way of ways) {
    const searched = searchWay(way, kerf, request, request.budget / ways.length);
    steps += searched.steps;
    proven &&= searched.proven;
    if (!best || isBetter(searched.plan, best.plan)) best = { way, plan: searched.plan };
  }
  if (!best) throw new Error("truing left no way though it refused nothing");
  return { tree: best, search: { steps, proven } };
}

function searchWay(way: TruingWay, kerf: KerfByAxis, request: CutRequest, budget: number) {
  let plan = firstPlan(way.board, kerf, request.limits);
  if (!plan) {
    if (!isFinished(way.board)) throw new Error("no cut is left though the pieces come apart");
    return { plan, steps: 0, proven: true };
  }
  let steps = plan.cuts;
  let proven = false;
  for (const { share, scope, room } of stages) {
    const stage = { scope, room, mostSettings: plan.settings.length, budget: Math.floor(budget * share) };
    const outcome = searchPlans(way.board, kerf, request.limits, stage);
    steps += outcome.steps;
    // What one complete stage cannot finish, the next cannot either.
    if (!outcome.found && scope === "all") break;
    if (!outcome.found) continue;
    // Plans were left out for their settings, which is sound only among plans as safe as the one they were measured by.
    proven = scope === "all" && outcome.whole && isAsSafe(outcome.found, plan);
    if (comparePlans(outcome.found, plan) < 0) plan = outcome.found;
    if (proven) break;
  }
  return { plan, steps, proven };
}

function isAsSafe(a: CutPlan, b: CutPlan): boolean {
  return a.unsafe === b.unsafe && a.lateRips === b.lateRips;
}

function isBetter(plan: CutPlan | null, than: CutPlan | null): boolean {
  return plan !== null && than !== null && comparePlans(plan, than) < 0;
}
