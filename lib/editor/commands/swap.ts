/** Two pieces of one size change places in the wood. */
import { type PieceId, swapPieces } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type CommandOutcome, refusedBecause, stepToLayout } from "./outcome";

export function swapTwo(document: TableDocument, pieces: readonly PieceId[]): CommandOutcome {
  const [first, second] = pieces;
  if (first === undefined || second === undefined || pieces.length > 2) {
    return refusedBecause({ reason: "needs-two-pieces", selected: pieces.length });
  }
  const change = swapPieces(document.layout, first, second);
  if (!change.ok) return refusedBecause(change.refusal);
  return stepToLayout(document, change.layout, { did: "swapped", pieces: [first, second] });
}
