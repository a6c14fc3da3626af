/** From a layout to what is asked of one board: the pieces that lie on it, grown by their clean-up, and the kerfs of its saws. */
import { boundsOf, polygonToStock } from "../frame/apply-isometry";
import { cleanUpEdges } from "../pattern/clean-up-edges";
import type { FaceLayout } from "../pattern/face-layout";
import { layOut } from "../pattern/lay-out";
import type { StockId } from "../piece";
import type { BoardFace } from "../stock/board";
import type { CutRequest, PlacedPiece } from "./cut-request";

/** The pieces of a layout that lie on one board, in reading order of the face. */
export function piecesOnBoard(layout: FaceLayout, stockId: StockId): PlacedPiece[] {
  const turns = new Map(layout.groups.flatMap(({ pieceIds, placement }) => pieceIds.map((id) => [id, placement?.turns ?? 0])));
  return layOut(layout)
    .filter((piece) => piece.stockId === stockId)
    .map(({ id, label, outline, stockFromFace }) => ({
      pieceId: id,
      label,
      rect: boundsOf(polygonToStock(stockFromFace, outline)),
      cleanUp: cleanUpEdges(layout, turns.get(id) ?? 0),
    }));
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
