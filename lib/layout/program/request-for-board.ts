/** From a layout to what is asked of one board: the pieces that lie on it, grown by their clean-up, and the kerfs of its saws. */
import { boundsOf, polygonToStock } from "../frame/apply-isometry";
import { cleanUpEdges } from "../pattern/clean-up-edges";
import type { FaceLayout } from "../pattern/face-layout";
import { layOut } from "../pattern/lay-out";
import { blankOwners, oneBlankSets } from "../pattern/one-blank";
import type { PieceId, PieceRole, StockId } from "../piece";
import type { BoardFace } from "../stock/board";
import type { CutRequest, PlacedPiece } from "./cut-request";

/**
 * A blank as it is to be sawn, and what it is in its face. Strips that a program names are something else: parts that are cut again.
 */
export interface PieceOnBoard extends PlacedPiece {
  readonly role: PieceRole;
  /** The pieces that come from it: more than one where it is parted through its thickness; then they share label and id of the first. */
  readonly gives: readonly PieceId[];
}

/** The blanks of a layout that lie on one board, in reading order of the face. */
export function piecesOnBoard(layout: FaceLayout, stockId: StockId): PieceOnBoard[] {
  const here = layOut(layout).filter((piece) => piece.stockId === stockId);
  const cleanUps = cleanUpEdges(layout, here);
  const ownerOf = blankOwners(layout.face);
  const givenBy = new Map(oneBlankSets(layout.face).flatMap((ids) => ids.slice(0, 1).map((id) => [id, ids] as const)));
  const labelById = new Map(here.map(({ id, label }) => [id, label]));
  const labelOf = (id: PieceId) => labelById.get(id) ?? "";
  return here.flatMap(({ id, role, outline, stockFromFace }): PieceOnBoard[] => {
    const cleanUp = cleanUps.get(id);
    if (cleanUp === undefined || ownerOf(id) !== id) return [];
    const gives = givenBy.get(id) ?? [id];
    const rect = boundsOf(polygonToStock(stockFromFace, outline));
    return [{ pieceId: id, label: gives.map(labelOf).join("+"), role, rect, cleanUp, gives }];
  });
}

/** `shop`: what the board's state and the shop's rules add to the layout. */
export function cutRequestFor(
  layout: FaceLayout,
  board: Pick<BoardFace, "id" | "length" | "width">,
  shop: Omit<CutRequest, "board" | "pieces" | "kerf">,
): CutRequest {
  return {
    ...shop,
    board: { length: board.length, width: board.width },
    pieces: piecesOnBoard(layout, board.id),
    kerf: { rip: layout.rip.kerf, crosscut: layout.crosscut.kerf },
  };
}
