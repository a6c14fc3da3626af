/**
 * Two pieces of one size and role change places in the wood: each takes the other's slot and the other's group, so that no wood moves
 * and only the labels on it change.
 */
import type { PieceId } from "../piece";
import { hungChart } from "./charts";
import type { FaceLayout, PieceGroup } from "./face-layout";
import { groupAt, originOf } from "./group-origin";
import { changed, type LayoutChange, type PieceSize, refused, withGroup } from "./layout-change";
import type { HungPiece } from "./pattern-rules";
import { ofPiece } from "./piece-ids";
import { groupOf, groupWith, slotOf, slotsOf } from "./slots";

export function swapPieces(layout: FaceLayout, p: PieceId, q: PieceId): LayoutChange {
  const groupP = groupOf(layout, p);
  const groupQ = groupOf(layout, q);
  if (groupP === null) return refused({ reason: "unknown-piece", piece: p });
  if (groupQ === null) return refused({ reason: "unknown-piece", piece: q });
  if (p === q) return refused({ reason: "same-piece", piece: p });
  const hung = hungChart(layout.face);
  if (ofPiece(hung, p).role !== ofPiece(hung, q).role) return refused({ reason: "roles-differ", pieces: [p, q] });
  const sizes = [sizeOf(hung, p), sizeOf(hung, q)] as const;
  if (sizes[0].width !== sizes[1].width || sizes[0].height !== sizes[1].height) {
    return refused({ reason: "sizes-differ", pieces: [p, q], sizes });
  }

  const slotP = slotOf(groupP, p);
  const slotQ = slotOf(groupQ, q);
  if (groupP.id === groupQ.id) {
    return changed(withSlots(layout, groupP, slotsOf(groupP).set(p, slotQ).set(q, slotP)));
  }
  const slotsP = slotsOf(groupP).set(q, slotP);
  slotsP.delete(p);
  const slotsQ = slotsOf(groupQ).set(p, slotQ);
  slotsQ.delete(q);
  return changed(withSlots(withSlots(layout, groupP, slotsP), groupQ, slotsQ));
}

/**
 * The group with other pieces in its slots, its wood where it was: an anchor piece may have left the group or changed its
 * slot.
 */
function withSlots(layout: FaceLayout, group: PieceGroup, slots: ReadonlyMap<PieceId, PieceId>): FaceLayout {
  return withGroup(layout, groupAt(layout, groupWith(layout, group, slots), originOf(layout, group)));
}

function sizeOf(hung: readonly HungPiece[], id: PieceId): PieceSize {
  const { width, height } = ofPiece(hung, id).rect;
  return { width, height };
}
