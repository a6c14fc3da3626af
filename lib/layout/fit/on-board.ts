/**
 * Whether a piece lies on its board: its finished size inside the usable outline, and what is sawn for it, the finished size
 * and the clean-up of its edges, inside the board itself. Bark may run through wood that is cleaned away, but nothing can be
 * cleaned off where there is no wood. Touching is inside.
 */
import type { BoardFace } from "../stock/board";
import { unionOf } from "./forbidden-moves";
import type { LyingPiece } from "./lying-piece";
import { movesOutside, outsideBy, usableOutline } from "./outline";
import type { Span, StockAxis } from "./span";

/** µm that a piece, or what is sawn for it, reaches over; 0 when it lies on the board. */
export function overBoardBy({ spans, blank }: LyingPiece, board: BoardFace): number {
  const overRectangle = outsideBy(blank, usableOutline({ ...board, outline: null }));
  return board.outline === null ? overRectangle : Math.max(overRectangle, outsideBy(spans, board.outline));
}

/** Moves along one axis after which it reaches over, as open intervals, infinite at both ends. */
export function movesOverBoard({ spans, blank }: LyingPiece, board: BoardFace, axis: StockAxis): Span[] {
  const overRectangle = movesOutside(blank, usableOutline({ ...board, outline: null }), axis);
  if (board.outline === null) return overRectangle;
  return unionOf([...overRectangle, ...movesOutside(spans, board.outline, axis)]);
}
