/** Pieces that are sawn as one blank and parted through its thickness: they lie on the same wood and stay together. */
import type { PieceId } from "../piece";
import type { Face } from "./face";
import { pieceIdAt } from "./piece-names";
import { rulesOf } from "./rules-of";

/** Sets of such pieces, each in reading order. */
export function oneBlankSets(face: Face): readonly (readonly PieceId[])[] {
  return (rulesOf(face).oneBlank?.(face) ?? []).map((places) => places.map(pieceIdAt));
}

/** The piece that a blank is named by: the first that comes from it. */
export function blankOwners(face: Face): (id: PieceId) => PieceId {
  const owners = new Map(oneBlankSets(face).flatMap((ids) => ids.map((id) => [id, ids[0] ?? id] as const)));
  return (id) => owners.get(id) ?? id;
}
