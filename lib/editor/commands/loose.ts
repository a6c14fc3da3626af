/** Lets pieces loose from the set, or takes them back into it. */
import { type FaceLayout, groupOf, letLoose, type PieceId, regroup } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type CommandOutcome, inTurn, refusedBecause, stepToLayout } from "./outcome";

/** Pieces that are loose already are left as they are, unless all of them are. */
export function letPiecesLoose(document: TableDocument, pieces: readonly PieceId[]): CommandOutcome {
  const { layout } = document;
  if (pieces.length === 0) return refusedBecause({ reason: "nothing-selected" });
  const held = pieces.filter((id) => (groupOf(layout, id)?.pieceIds.length ?? 0) > 1);
  const change = inTurn(layout, held.length > 0 ? held : pieces.slice(0, 1), letLoose);
  if (!change.ok) return refusedBecause(change.refusal);
  return stepToLayout(document, change.layout, { did: "let-loose", pieces: held });
}

/** Pieces that are in the set already are left as they are, unless all of them are. */
export function takePiecesBack(document: TableDocument, pieces: readonly PieceId[]): CommandOutcome {
  const { layout } = document;
  if (pieces.length === 0) return refusedBecause({ reason: "nothing-selected" });
  const loose = pieces.filter((id) => !isInSet(layout, id));
  const change = inTurn(layout, loose.length > 0 ? loose : pieces.slice(0, 1), regroup);
  if (!change.ok) return refusedBecause(change.refusal);
  return stepToLayout(document, change.layout, { did: "regrouped", pieces: loose });
}

function isInSet(layout: FaceLayout, id: PieceId): boolean {
  return layout.groups[0]?.pieceIds.includes(id) ?? false;
}
