/** Lets pieces loose from the set, or takes them back into it. */
import { type FaceLayout, letLoose, type PieceId, regroup } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type CommandOutcome, inTurn, refusedBecause, stepToLayout } from "./outcome";

/**
 * Pieces that are loose already are left as they are, unless all of them are. Where the whole set is chosen its last piece stays: a set of one is
 * loose enough.
 */
export function letPiecesLoose(document: TableDocument, pieces: readonly PieceId[]): CommandOutcome {
  if (pieces.length === 0) return refusedBecause({ reason: "nothing-selected" });
  let { layout } = document;
  const loosened: PieceId[] = [];
  for (const id of pieces) {
    const change = letLoose(layout, id);
    if (change.ok) {
      layout = change.layout;
      loosened.push(id);
    } else if (change.refusal.reason !== "already-loose" || pieces.length === 1) {
      return refusedBecause(change.refusal);
    }
  }
  return stepToLayout(document, layout, { did: "let-loose", pieces: loosened });
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
