/** Names the pieces of a grid in reading order: "p1", "p2", … and the labels "1", "2", … that are written on the wood. */
import type { PieceId } from "../piece";
import type { GridFace } from "./face-layout";

/** A place in the grid of a face, counted from 0. */
export interface GridPlace {
  readonly row: number;
  readonly column: number;
}

export function pieceCount(face: GridFace): number {
  return face.rows.length * face.columns.length;
}

/** Every id of the face, left to right and then down. */
export function pieceIdsOf(face: GridFace): PieceId[] {
  return Array.from({ length: pieceCount(face) }, (_, index) => pieceIdAt(index));
}

export function pieceIdAt(readingIndex: number): PieceId {
  return `p${readingIndex + 1}`;
}

/** Digits only, so there is no I or O to mistake for a 1 or a 0. */
export function labelAt(readingIndex: number): string {
  return String(readingIndex + 1);
}

/** Place in reading order from 0, or null when the face has no such piece. */
export function readingIndexOf(face: GridFace, id: PieceId): number | null {
  const number = /^p([1-9]\d*)$/.exec(id)?.[1];
  if (number === undefined) return null;
  const index = Number(number) - 1;
  return index < pieceCount(face) ? index : null;
}

/** Row and column of a piece, or null when the face has no such piece. */
export function gridPlaceOf(face: GridFace, id: PieceId): GridPlace | null {
  const index = readingIndexOf(face, id);
  if (index === null) return null;
  return { row: Math.floor(index / face.columns.length), column: index % face.columns.length };
}
