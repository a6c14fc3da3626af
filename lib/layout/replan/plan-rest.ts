/**
 * The next revision of a cut program: what is done stands in it as it was cut, and the rest is planned anew around it. A part in hand
 * that is as it was planned keeps its steps; another is planned as a board of its own.
 */
import { conservationOf } from "../program/conservation";
import { planCuts } from "../program/plan-cuts";
import { bladeOf, type CutProgram, type CutStep, isSawn, type Part, type SearchReport } from "../program/program";
import { assessRest, type RestAssessment } from "./assess-rest";
import type { RestFault } from "./carry-out";
import { freeLabels } from "./free-labels";
import { finishedPiece, type Holding } from "./hold-pieces";
import { keptSteps } from "./kept-steps";
import { namedSteps } from "./name-rest";
import { inOrderOfWork, withSettingNumbers } from "./order-rest";
import { openSteps, type PartInHand, type RestLimits, type RestPiece, type RestRequest } from "./part-in-hand";
import { requestForPart } from "./stands";
import type { RescueChoices } from "./trouble";
import { wholeProgram } from "./whole-program";

export interface RestPlan {
  readonly ok: true;
  readonly assessment: RestAssessment;
  /** Steps done, as they were cut, then the rest; pieces, offcuts and waste of the whole board. */
  readonly program: CutProgram;
  /** Numbers of the steps that are done. */
  readonly done: readonly number[];
  /** Every part in hand before the rest is cut. */
  readonly inHand: readonly PartInHand[];
  /** The pieces cut or to be cut, where they lie now, with their clean-up. */
  readonly pieces: readonly RestPiece[];
  /** Steps of the revision that were not kept. */
  readonly changed: boolean;
}

export type RestPlanOutcome = RestPlan | RestFault;

export function planRest(request: RestRequest, limits: RestLimits, choices: RescueChoices = {}): RestPlanOutcome {
  const assessment = assessRest(request, choices);
  if (!assessment.ok) return assessment;
  const open = stillOpen(request, assessment);
  const before = [
    ...request.program.steps
      .filter(({ number }) => request.doneBefore.has(number))
      .map((step) => (isSawn(step.kind) ? { ...step, blade: bladeOf(step, request.program) } : step)),
    ...assessment.doneSteps,
  ];
  const parts = planParts(request, assessment, { open, before }, limits);
  const kept = parts.every(({ kept: same }) => same);
  const lists = parts.map(({ steps }) => steps);
  const rest = kept ? inIssuedOrder(open, lists.flat()) : withSettingNumbers(before, inOrderOfWork(lists, before.at(-1)));
  const search = {
    steps: parts.reduce((sum, { search: { steps } }) => sum + steps, 0),
    proven: parts.every(({ search: { proven } }) => proven),
  };
  const final = parts.flatMap((part) => part.final);
  const program = wholeProgram(request, assessment, { done: before, rest, final, search }, limits);
  return {
    ok: true,
    assessment,
    program: { ...program, conservation: conservationOf(request.board, program) },
    done: before.map(({ number }) => number),
    inHand: assessment.holdings.map(({ held }) => held),
    pieces: assessment.holdings.flatMap(({ pieces }) => pieces),
    changed: !kept || rest.length < open.length,
  };
}

/** Steps of the revision that are not done. */
function stillOpen(request: RestRequest, { doneSteps }: RestAssessment): readonly CutStep[] {
  const done = new Set(doneSteps.map(({ number }) => number));
  return openSteps(request).filter(({ number }) => !done.has(number));
}

interface PlannedPart {
  readonly steps: readonly CutStep[];
  /** What is left of the part when all are done, before clean-up. */
  readonly final: readonly Part[];
  readonly kept: boolean;
  readonly search: SearchReport;
}

function planParts(
  request: RestRequest,
  { holdings, sawing }: RestAssessment,
  { open, before }: { readonly open: readonly CutStep[]; readonly before: readonly CutStep[] },
  limits: RestLimits,
): readonly PlannedPart[] {
  const known = [
    ...request.start.map(({ part }) => part),
    ...holdings.map(({ held }) => held.part),
    ...request.program.steps.flatMap(({ yields }) => yields),
  ];
  const labels = freeLabels(known);
  const toCut = holdings.filter((holding) => holding.pieces.length > 0 && !finishedPiece(holding));
  const budget = Math.ceil(limits.budget / Math.max(1, toCut.length));
  let nextNumber = 1 + Math.max(0, ...request.program.steps.map(({ number }) => number));
  const planAnew = ({ held, pieces }: Holding): PlannedPart => {
    const outcome = planCuts(requestForPart(held, pieces, sawing, { ...limits, budget }));
    if (!outcome.ok && outcome.reason === "nothing-to-cut") return uncut(held.part);
    if (!outcome.ok) throw new Error(`a part in hand was found fit to be cut and is not: ${JSON.stringify(outcome)}`);
    const maker = before.find(({ yields }) => yields.some(({ id }) => id === held.part.id));
    const named = namedSteps(held, outcome.program, nextNumber, labels, maker);
    nextNumber += named.steps.length;
    return { steps: named.steps, final: named.parts, kept: false, search: outcome.program.search };
  };
  return holdings.map((holding): PlannedPart => {
    if (!toCut.includes(holding)) return uncut(holding.held.part);
    const same = keptSteps(holding, open, request.program, sawing);
    return same ? { steps: same, final: finalParts(same), kept: true, search: request.program.search } : planAnew(holding);
  });
}

const uncut = (part: Part): PlannedPart => ({ steps: [], final: [part], kept: true, search: { steps: 0, proven: true } });

/** Parts that no step takes in hand again. */
function finalParts(steps: readonly CutStep[]): readonly Part[] {
  const cutAgain = new Set(steps.map(({ part }) => part.id));
  return steps.flatMap(({ yields }) => yields).filter(({ id }) => !cutAgain.has(id));
}

function inIssuedOrder(open: readonly CutStep[], kept: readonly CutStep[]): readonly CutStep[] {
  const numbers = new Set(kept.map(({ number }) => number));
  return open.filter(({ number }) => numbers.has(number));
}
