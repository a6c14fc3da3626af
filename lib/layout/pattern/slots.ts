/**
 * Slots: the places of the spaced chart. Every piece of a face is cut from one slot and every slot gives one piece; a piece
 * that has not changed places is cut from its own.
 */
import type { PieceId } from "../piece";
import type { FaceLayout, PieceGroup } from "./face-layout";
import { readingIndexOf } from "./piece-ids";

/** The slot that a piece of the group is cut from, named by the piece whose own place it is. */
export function slotOf(group: PieceGroup, id: PieceId): PieceId {
  return group.takesPlaceOf[id] ?? id;
}

/** The group that holds a piece, or null. */
export function groupOf(layout: FaceLayout, id: PieceId): PieceGroup | null {
  return layout.groups.find((group) => group.pieceIds.includes(id)) ?? null;
}

/** A group with other contents: pieces in reading order, and no entry for a piece that is cut from its own slot. */
export function groupWith(layout: FaceLayout, group: PieceGroup, slots: ReadonlyMap<PieceId, PieceId>): PieceGroup {
  const index = (id: PieceId) => readingIndexOf(layout.face, id) ?? Number.POSITIVE_INFINITY;
  const pieceIds = [...slots.keys()].sort((p, q) => index(p) - index(q) || (p < q ? -1 : 1));
  const moved = pieceIds.flatMap((id) => {
    const slot = slots.get(id);
    return slot === undefined || slot === id ? [] : [[id, slot] as const];
  });
  return { ...group, pieceIds, takesPlaceOf: Object.fromEntries(moved) };
}

/** Piece to slot, for all pieces of a group. */
export function slotsOf(group: PieceGroup): Map<PieceId, PieceId> {
  return new Map(group.pieceIds.map((id) => [id, slotOf(group, id)]));
}
