/** One board's cut program, made and then carried out by the core's independent replay: what does not hold never leaves this file. */
import "server-only";
import { type CutProgramOutcome, type CutRequest, planCuts, verifyProgram } from "@/lib/layout";

export type Planner = (request: CutRequest) => Promise<CutProgramOutcome>;

/** Throws on a program that does not hold: that is a fault of ours, and nothing may be issued on it. Takes up to some seconds. */
export function planAndVerify(request: CutRequest): CutProgramOutcome {
  const outcome = planCuts(request);
  if (!outcome.ok) return outcome;
  const verdict = verifyProgram(request, outcome.program);
  if (!verdict.ok) throw new Error(`a cut program does not hold: ${JSON.stringify(verdict)}`);
  return outcome;
}
