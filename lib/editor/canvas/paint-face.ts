/**
 * Paints a face, or a window of it, from the photographs of its boards into a plain canvas: for views that stand still beside the layout
 * table, such as a magnified seam or a place that is offered. Draws wood and nothing else.
 */
import { type FacePiece, type FaceRect, type Piece, type PieceId, rectToStock } from "@/lib/layout";
import type { TableBoard } from "../table-board";
import { paintPatch } from "./marks/wood";
import type { Palette } from "./palette";
import type { Pictures } from "./pictures";

/** What of a board is needed to paint from it. */
export type PaintedBoard = Pick<TableBoard, "face" | "levels">;

export interface FaceWindow {
  readonly facePieces: readonly FacePiece[];
  readonly pieceById: ReadonlyMap<PieceId, Piece>;
  readonly boards: readonly PaintedBoard[];
  /** What of the face is shown, in the face's frame. */
  readonly view: FaceRect;
  readonly pxPerMm: number;
  /** Device pixels of one CSS pixel. */
  readonly density: number;
}

/** The context's unit is a CSS pixel; its origin is the upper left corner of the window. */
export function paintFace(context: CanvasRenderingContext2D, look: FaceWindow, pictures: Pictures, palette: Palette): void {
  const { view, pxPerMm } = look;
  const pxPerUm = pxPerMm / 1000;
  context.fillStyle = palette.gap;
  context.fillRect(0, 0, view.width * pxPerUm, view.height * pxPerUm);
  for (const { id, rect } of look.facePieces) {
    if (!overlaps(rect, view)) continue;
    const piece = look.pieceById.get(id);
    const board = piece && look.boards.find(({ face }) => face.id === piece.stockId);
    const picture = board ? pictures.at(board, pxPerMm * look.density) : ({ state: "missing" } as const);
    context.save();
    context.translate((rect.x - view.x) * pxPerUm, (rect.y - view.y) * pxPerUm);
    const box = { left: 0, top: 0, width: rect.width * pxPerUm, height: rect.height * pxPerUm };
    if (piece === undefined) {
      context.fillStyle = palette.rule;
      context.fillRect(0, 0, box.width, box.height);
    } else {
      paintPatch(picture, piece.stockFromFace, rect, rectToStock(piece.stockFromFace, rect), pxPerUm, palette)(context, box);
    }
    context.restore();
  }
}

function overlaps(rect: FaceRect, view: FaceRect): boolean {
  return (
    rect.x < view.x + view.width && rect.x + rect.width > view.x && rect.y < view.y + view.height && rect.y + rect.height > view.y
  );
}
