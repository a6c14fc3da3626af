/** Which of the steps still to be done may be done as they were issued, whatever else was found. */
import type { RestAssessment } from "./assess-rest";
import { keptSteps } from "./kept-steps";
import { openSteps, type RestRequest } from "./part-in-hand";

/** Their numbers. Any other open step changes once the rest is planned. */
export function stepsThatHold(request: RestRequest, { holdings, doneSteps, sawing }: RestAssessment): ReadonlySet<number> {
  const done = new Set(doneSteps.map(({ number }) => number));
  const open = openSteps(request).filter(({ number }) => !done.has(number));
  const kept = holdings.flatMap((holding) => keptSteps(holding, open, request.program, sawing) ?? []);
  return new Set(kept.map(({ number }) => number));
}
