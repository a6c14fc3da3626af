/** One board's cut program, made and then carried out by the core's independent replay: what does not hold never leaves this file. */
import "server-only";
import {
  type CutProgramOutcome,
  type CutRequest,
  planCuts,
  planRest,
  type RescueChoices,
  type RestLimits,
  type RestPlanOutcome,
  type RestRequest,
  verifyProgram,
  verifyRest,
} from "@/lib/layout";

export type Planner = (request: CutRequest) => Promise<CutProgramOutcome>;

/** Throws on a program that does not hold: that is a fault of ours, and nothing may be issued on it. Takes up to some seconds. */
export function planAndVerify(request: CutRequest): CutProgramOutcome {
  const outcome = planCuts(request);
  if (!outcome.ok) return outcome;
  const verdict = verifyProgram(request, outcome.program);
  if (!verdict.ok) throw new Error(`a cut program does not hold: ${JSON.stringify(verdict)}`);
  return outcome;
}

/** The rest of one board around what is cut. */
export interface RestTask {
  readonly request: RestRequest;
  readonly limits: RestLimits;
  readonly choices: RescueChoices;
}

export type RestPlanner = (task: RestTask) => Promise<RestPlanOutcome>;

/** Throws as above, on a rest that does not hold. */
export function planRestAndVerify({ request, limits, choices }: RestTask): RestPlanOutcome {
  const outcome = planRest(request, limits, choices);
  if (!outcome.ok) return outcome;
  const verdict = verifyRest(request.board, outcome);
  if (!verdict.ok) throw new Error(`the rest of a cut program does not hold: ${JSON.stringify(verdict)}`);
  return outcome;
}
