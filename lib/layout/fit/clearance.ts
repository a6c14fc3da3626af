/**
 * How near the pieces lie to what they must keep clear of, for the maker's eye: "front 4 is 21 mm from a knot". Straight
 * slides only, along the board or across it, as wood is moved; a corner that misses an area diagonally may lie nearer than
 * this says.
 */
import type { FaceLayout } from "../pattern/face-layout";
import type { PieceId } from "../piece";
import type { BoardFace, KeepClearKind, KeepClearShape } from "../stock/board";
import { type Um, um } from "../units/um";
import { movesIntoArea } from "./keep-clear";
import { lyingPieces } from "./lying-piece";
import { NOISE_UM } from "./noise";
import type { Spans } from "./span";

export interface Clearance {
  readonly piece: PieceId;
  readonly areaId: string;
  readonly area: KeepClearKind;
  /** Shortest straight slide of the piece after which it touches the area; 0 when it touches or reaches in. */
  readonly room: Um;
}

/** The nearest area of every piece that has one in its way, in reading order; of two equally near the first of the board. */
export function clearances(layout: FaceLayout, boards: readonly BoardFace[]): Clearance[] {
  const boardById = new Map(boards.map((board) => [board.id, board]));
  return lyingPieces(layout).flatMap(({ id, stockId, spans }) => {
    let nearest: Clearance | null = null;
    for (const keepClear of boardById.get(stockId)?.keepClear ?? []) {
      const room = roomBefore(spans, keepClear.area);
      if (room === null) continue;
      // Rounded down: never said to be farther than it is.
      const whole = um(Math.floor(room + NOISE_UM));
      if (nearest === null || whole < nearest.room)
        nearest = { piece: id, areaId: keepClear.id, area: keepClear.kind, room: whole };
    }
    return nearest ?? [];
  });
}

/** µm that a piece can slide along the board or across it before it touches the area; null when no straight slide ever does. */
export function roomBefore(piece: Spans, area: KeepClearShape): number | null {
  const intervals = [...movesIntoArea(piece, area, "along"), ...movesIntoArea(piece, area, "across")];
  const rooms = intervals.map(({ from, to }) => (from > 0 ? from : to < 0 ? -to : 0));
  return rooms.length === 0 ? null : Math.min(...rooms);
}
