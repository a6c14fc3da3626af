/** Which groups a selection of pieces stands for, and which pieces groups hold. */
import { type FaceLayout, groupById, groupOf, type PieceId, pieceIdsOf } from "@/lib/layout";

/** The groups of these pieces, each once, in the order of the layout. */
export function groupsOfPieces(layout: FaceLayout, pieces: readonly PieceId[]): string[] {
  const wanted = new Set(pieces.flatMap((id) => groupOf(layout, id)?.id ?? []));
  return layout.groups.flatMap(({ id }) => (wanted.has(id) ? [id] : []));
}

/** The pieces of these groups in reading order. */
export function piecesOfGroups(layout: FaceLayout, groupIds: readonly string[]): PieceId[] {
  const held = new Set(groupIds.flatMap((id) => groupById(layout, id)?.pieceIds ?? []));
  return pieceIdsOf(layout.face).filter((id) => held.has(id));
}
