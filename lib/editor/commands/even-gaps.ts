/** Makes the gaps along one line as wide as the wood's movement asks for. */
import { type FaceGap, type MovementRequest, type SizeStep, withRecommendedGap } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type CommandOutcome, refusedBecause, stepToLayout } from "./outcome";

/** What is known of the wood; the layout is the document's own. */
export type MovementGround = Omit<MovementRequest, "layout">;

export function evenGaps(document: TableDocument, ground: MovementGround, runs: FaceGap["runs"], step: SizeStep): CommandOutcome {
  const outcome = withRecommendedGap({ ...ground, layout: document.layout }, runs, step);
  if (!outcome.ok) return refusedBecause({ reason: `gaps-${outcome.reason}` });
  const { layout, gap, mostGivenUp } = outcome;
  return stepToLayout(document, layout, { did: "evened-gaps", gap, mostGivenUp });
}
