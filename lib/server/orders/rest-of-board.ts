/** The rest of one board of a begun order: what is asked of it now, planned around what is cut. */
import "server-only";
import {
  assessRest,
  defaultCutBudget,
  type PieceOnBoard,
  piecesOnBoard,
  type RescueChoices,
  type RestPiece,
  type RestPlan,
  type RestRequest,
} from "@/lib/layout";
import type { SnapshotBoard } from "@/lib/schemas/order-snapshot";
import { takesWood } from "@/lib/schemas/order-steps";
import { keepsSize, piecesAsIssued, restRequestOf } from "@/lib/schemas/rest-request";
import { restFaultSentence } from "@/lib/words/as-cut";
import { labelRanges } from "@/lib/words/part-name";
import { refused } from "../faults";
import type { BegunOrder } from "./begun-order";
import { boardFaceOf, cutRequestOf, type LayoutBoard } from "./freeze";
import type { RestPlanner } from "./plan-cuts";

export interface BoardRest {
  /** As the revision before had it. */
  readonly before: SnapshotBoard;
  readonly one: LayoutBoard;
  readonly plan: RestPlan;
}

/** null: nothing of the board is cut, and the layout lies on another picture of it by now or not on it at all; it is planned as a new one. */
export async function planRestOfBoard(
  begun: BegunOrder,
  before: SnapshotBoard,
  choices: RescueChoices,
  plan: RestPlanner,
): Promise<BoardRest | null> {
  const one = begun.given.boards.find(({ board }) => board.id === before.boardId);
  if (!one || one.straightening.id !== before.straighteningId) {
    if (!isCutInto(begun, before)) return null;
    throw refused(
      one
        ? `The layout lies on another picture of ${before.tag} than it was cut by. Move it back to that picture, or lay what is left as a face of its own.`
        : `${before.tag} is cut into, but no longer on the layout table. Put it back there first.`,
    );
  }
  const { shop } = begun.given;
  const outcome = await plan({
    request: requestNow(begun, before, one),
    limits: { limits: shop, budget: defaultCutBudget },
    choices,
  });
  if (!outcome.ok) throw refused(restFaultSentence(outcome, begun.snapshot, before.tag));
  return { before, one, plan: outcome };
}

function isCutInto({ ticked }: BegunOrder, { tag, asCut }: SnapshotBoard): boolean {
  return asCut !== undefined || [...ticked].some((stepId) => takesWood(stepId, tag));
}

/** With the pieces, areas and saws as they are now. */
function requestNow(begun: BegunOrder, before: SnapshotBoard, one: LayoutBoard): RestRequest {
  const { truingTakes, machines, flatten, thinnestSawn } = cutRequestOf(begun.given, one);
  const asked = {
    truingTakes,
    ...(machines && { machines }),
    ...(flatten !== undefined && { flatten }),
    ...(thinnestSawn !== undefined && { thinnestSawn }),
  };
  return restRequestOf(begun, before, { board: boardFaceOf(one), pieces: piecesNow(begun, before), asked });
}

/**
 * A piece that the layout has where it had it when the revision was issued is where that revision cuts it, with the size and the
 * clean-up it leaves; one that was moved since is where it was moved to. What is cut cannot be moved any more.
 */
function piecesNow(begun: BegunOrder, before: SnapshotBoard): readonly RestPiece[] {
  const { snapshot, given } = begun;
  const issued = piecesAsIssued(snapshot, before);
  const issuedDocument = snapshot.faces.flatMap(({ layout }) => piecesOnBoard(layout, before.boardId));
  const now = piecesOnBoard(given.face.layout, before.boardId);
  const stays = (pieceId: string) => {
    const [was, is] = [issuedDocument, now].map((pieces) => pieces.find((piece) => piece.pieceId === pieceId));
    return was !== undefined && is !== undefined && isSame(was, is);
  };
  refuseMovedCuts(
    begun,
    before,
    issued.filter(({ pieceId }) => !stays(pieceId)),
  );
  return now.map((piece): RestPiece => {
    const asIssued = stays(piece.pieceId) ? issued.find(({ pieceId }) => pieceId === piece.pieceId) : undefined;
    return asIssued ?? { ...piece, keepsSize: keepsSize(piece.role) };
  });
}

function refuseMovedCuts(begun: BegunOrder, before: SnapshotBoard, moved: readonly RestPiece[]): void {
  if (moved.length === 0) return;
  const assessed = assessRest(restRequestOf(begun, before));
  if (!assessed.ok) throw refused(restFaultSentence(assessed, begun.snapshot, before.tag));
  const cut = moved.filter(({ pieceId }) => assessed.finished.includes(pieceId)).map(({ label }) => label);
  if (cut.length === 0) return;
  const [fronts, was, them] = cut.length > 1 ? ["Fronts", "were", "them"] : ["Front", "was", "it"];
  throw refused(
    `${fronts} ${labelRanges(cut)} ${cut.length > 1 ? "are" : "is"} cut already, but ${was} changed on the layout table since. ` +
      `Put ${them} back there first: undo the change, or let the others loose before you move them.`,
  );
}

function isSame(a: PieceOnBoard, b: PieceOnBoard): boolean {
  return JSON.stringify([a.rect, a.cleanUp]) === JSON.stringify([b.rect, b.cleanUp]);
}
