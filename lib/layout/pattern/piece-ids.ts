/** The pieces of a face by their names, in reading order. */
import type { PieceId } from "../piece";
import type { Face } from "./face";
import { pieceIdAt } from "./piece-names";
import { rulesOf } from "./rules-of";

export function pieceCount(face: Face): number {
  return rulesOf(face).count(face);
}

/** Every id of the face in reading order. */
export function pieceIdsOf(face: Face): PieceId[] {
  return Array.from({ length: pieceCount(face) }, (_, index) => pieceIdAt(index));
}

/** Place in reading order from 0, or null when the face has no such piece. */
export function readingIndexOf(face: Face, id: PieceId): number | null {
  const number = /^p([1-9]\d*)$/.exec(id)?.[1];
  if (number === undefined) return null;
  const index = Number(number) - 1;
  return index < pieceCount(face) ? index : null;
}

/** What a list in reading order holds for a piece. Throws on an id that the face does not have: `layoutFaults` finds those beforehand. */
export function ofPiece<T>(list: readonly T[], id: PieceId): T {
  const found = list[Number(id.slice(1)) - 1];
  if (found === undefined) throw new RangeError(`no piece ${id} on this face`);
  return found;
}
