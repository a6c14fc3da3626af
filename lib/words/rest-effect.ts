/** What entries come to, worked out at once and put into words: what no longer fits, what saves it, and which steps must wait. */
import { assessRest, isSawn, stepsThatHold } from "@/lib/layout";
import type { BegunRevision } from "@/lib/schemas/rest-request";
import { restRequestOf } from "@/lib/schemas/rest-request";
import { restFaultSentence } from "./as-cut";
import { styleOf } from "./order-step";
import { troubleSentence } from "./rest";

export interface RestEffect {
  /** Why the entries cannot be true; empty when they can. */
  readonly faults: readonly string[];
  /** What no longer fits as issued and what saves it. */
  readonly troubles: readonly string[];
  /** Ids of cuts that change once the rest is planned: not to be made before. */
  readonly waiting: ReadonlySet<string>;
}

export const noEffect: RestEffect = { faults: [], troubles: [], waiting: new Set() };

export function restEffect(begun: BegunRevision): RestEffect {
  if (begun.entries.length === 0) return noEffect;
  const { snapshot, ticked } = begun;
  const style = styleOf(snapshot);
  const faults: string[] = [];
  const troubles: string[] = [];
  const waiting = new Set<string>();
  for (const board of snapshot.boards) {
    const request = restRequestOf(begun, board);
    const assessment = assessRest(request);
    if (!assessment.ok) {
      faults.push(restFaultSentence(assessment, snapshot, board.tag));
      continue;
    }
    troubles.push(...assessment.troubles.map((trouble) => troubleSentence(trouble, style)));
    const holds = stepsThatHold(request, assessment);
    for (const { number, kind } of board.program.steps) {
      const id = `${board.tag}:${number}`;
      if (isSawn(kind) && !ticked.has(id) && !request.doneBefore.has(number) && !holds.has(number)) waiting.add(id);
    }
  }
  return { faults, troubles, waiting };
}

/** One line for entries that change nothing for any front, or only the settings. */
export function effectHeadline({ faults, troubles, waiting }: RestEffect): string {
  if (faults.length > 0) return "This cannot be so.";
  if (troubles.length > 0) return "The rest does not fit as issued.";
  return waiting.size > 0 ? "Everything still fits, with other settings." : "Everything still fits as issued.";
}
