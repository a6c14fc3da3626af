/**
 * Wood that something else is to be cut from, as another layout on the same board: what a layout takes of a board, and how near
 * a piece comes to wood that is taken. One cut parts the two, and either side may make it: it takes the wider of their kerfs.
 * What is sawn for a piece keeps out of the wood grown by that kerf; touching is allowed. Exact.
 */
import type { StockRect } from "../frame/point";
import type { FaceLayout } from "../pattern/face-layout";
import { layOut } from "../pattern/lay-out";
import { blankOwners } from "../pattern/one-blank";
import type { PieceId, StockId } from "../piece";
import type { SpokenFor } from "../stock/board";
import { um } from "../units/um";
import type { Kerfs } from "./apart";
import { movesInto } from "./forbidden-moves";
import { type LyingPiece, lyingPieces } from "./lying-piece";
import { otherAxis, roomBetween, type Span, type Spans, type StockAxis, spansOf } from "./span";

export interface WoodTaken extends Omit<SpokenFor, "id"> {
  readonly piece: PieceId;
  /** What is written on the wood. */
  readonly label: string;
}

/** What the pieces of a layout take of one board, in reading order; pieces of one blank take it together. */
export function woodTaken(layout: FaceLayout, stockId: StockId): WoodTaken[] {
  const pieces = layOut(layout);
  const ownerOf = blankOwners(layout.face);
  const labelOf = (id: PieceId) => pieces.flatMap((piece) => (ownerOf(piece.id) === id ? piece.label : [])).join("+");
  const kerfs = { along: layout.crosscut.kerf, across: layout.rip.kerf };
  return lyingPieces(layout, pieces)
    .filter((piece) => piece.stockId === stockId && piece.blankId === piece.id)
    .map(({ id, blank }) => ({ piece: id, label: labelOf(id), rect: rectOf(blank), kerfs }));
}

/** Moves of a piece along one axis that bring it too near for the cut between; none while the two pass each other. */
export function movesIntoSpokenFor({ blank }: LyingPiece, taken: SpokenFor, axis: StockAxis, kerfs: Kerfs): Span | null {
  return movesIntoWood(blank, grownByCut(taken, kerfs), axis);
}

/** µm that a piece would have to move along the board or across it for the cut between; 0 when the saw gets through. */
export function missingToSpokenFor({ blank }: LyingPiece, taken: SpokenFor, kerfs: Kerfs): number {
  return wayOut(blank, grownByCut(taken, kerfs));
}

/** µm that a piece would have to move for no wood to be sawn for both; 0 where they only touch. */
export function overSpokenFor({ blank }: LyingPiece, { rect }: SpokenFor): number {
  return wayOut(blank, spansOf(rect));
}

function movesIntoWood(blank: Spans, wood: Spans, axis: StockAxis): Span | null {
  const other = otherAxis(axis);
  return roomBetween(blank[other], wood[other]) >= 0 ? null : movesInto(blank[axis], wood[axis]);
}

function wayOut(blank: Spans, wood: Spans): number {
  if (roomBetween(blank.along, wood.along) >= 0 || roomBetween(blank.across, wood.across) >= 0) return 0;
  const [along, across] = [movesInto(blank.along, wood.along), movesInto(blank.across, wood.across)];
  return Math.min(-along.from, along.to, -across.from, across.to);
}

/** The wood and the cut around it: what is sawn for a piece with these kerfs has to keep out of. */
export function grownByCut({ rect, kerfs }: SpokenFor, mine: Kerfs): Spans {
  const { along, across } = spansOf(rect);
  return {
    along: grownBy(along, Math.max(mine.along, kerfs.along)),
    across: grownBy(across, Math.max(mine.across, kerfs.across)),
  };
}

function grownBy({ from, to }: Span, by: number): Span {
  return { from: from - by, to: to + by };
}

function rectOf({ along, across }: Spans): StockRect {
  return {
    x: um(along.from),
    y: um(across.from),
    width: um(along.to - along.from),
    height: um(across.to - across.from),
  };
}
