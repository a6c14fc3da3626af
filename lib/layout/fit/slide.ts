/**
 * The least slide along the board that mends a group: clear of every keep-clear area, on its board, the saw's loss from other
 * groups and from wood that is spoken for.
 */
import type { BoardFace } from "../stock/board";
import { type Um, um } from "../units/um";
import { type Kerfs, movesTooClose } from "./apart";
import { leastMove, unionOf } from "./forbidden-moves";
import { movesIntoArea } from "./keep-clear";
import type { LyingPiece } from "./lying-piece";
import { movesOverBoard } from "./on-board";
import type { Span, StockAxis } from "./span";
import { movesIntoSpokenFor } from "./spoken-for";

/** What the group moves among: the pieces of other groups that lie on the same board, and the board. */
export interface Surroundings {
  readonly board: BoardFace;
  readonly others: readonly LyingPiece[];
  readonly kerfs: Kerfs;
}

/** Every move of the group along one axis after which any of its pieces is in trouble, as open intervals in order. */
export function troubledMoves(group: readonly LyingPiece[], { board, others, kerfs }: Surroundings, axis: StockAxis): Span[] {
  return unionOf(
    group.flatMap((piece) => [
      ...movesOverBoard(piece, board, axis),
      ...board.keepClear.flatMap(({ area }) => movesIntoArea(piece.spans, area, axis)),
      ...others.flatMap((other) => movesTooClose(piece, other, axis, kerfs) ?? []),
      ...board.spokenFor.flatMap((taken) => movesIntoSpokenFor(piece, taken, axis, kerfs) ?? []),
    ]),
  );
}

/** µm along the board, negative to the left, 0 when nothing is wrong, null when no slide leaves the whole group in order. */
export function leastSlide(group: readonly LyingPiece[], surroundings: Surroundings): Um | null {
  const move = leastMove(troubledMoves(group, surroundings, "along"));
  return move === null ? null : um(move);
}
