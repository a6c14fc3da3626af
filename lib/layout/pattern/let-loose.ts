/**
 * Lets a piece loose from the set, or takes it back. Letting loose moves no wood; taking back returns the piece to its place
 * in the set.
 */
import type { PieceId } from "../piece";
import type { FaceLayout, PieceGroup } from "./face-layout";
import { groupAt, originOf } from "./group-origin";
import { changed, type LayoutChange, refused, withGroup } from "./layout-change";
import { oneBlankSets } from "./one-blank";
import { groupOf, groupWith, slotOf, slotsOf } from "./slots";

/** The piece becomes a group of one that lies where it lay. */
export function letLoose(layout: FaceLayout, piece: PieceId): LayoutChange {
  const group = groupOf(layout, piece);
  if (group === null) return refused({ reason: "unknown-piece", piece });
  if (group.pieceIds.length === 1) return refused({ reason: "already-loose", piece });

  const mates = oneBlankSets(layout.face).find((ids) => ids.includes(piece));
  if (mates !== undefined) return refused({ reason: "one-blank", pieces: mates });

  const origin = originOf(layout, group);
  const slots = slotsOf(group);
  slots.delete(piece);
  const rest = groupAt(layout, groupWith(layout, group, slots), origin);
  const empty: PieceGroup = { id: freeGroupId(layout), pieceIds: [], placement: null, takesPlaceOf: {} };
  const alone = groupAt(layout, groupWith(layout, empty, new Map([[piece, slotOf(group, piece)]])), origin);
  const kept = withGroup(layout, rest);
  return changed({ ...kept, groups: [...kept.groups, alone] });
}

/** The piece goes back to its place in the set, wherever the set lies now. */
export function regroup(layout: FaceLayout, piece: PieceId): LayoutChange {
  const [set] = layout.groups;
  const group = groupOf(layout, piece);
  if (set === undefined || group === null) return refused({ reason: "unknown-piece", piece });
  if (group.id === set.id) return refused({ reason: "already-in-set", piece });

  const setSlots = slotsOf(set).set(piece, slotOf(group, piece));
  const otherSlots = slotsOf(group);
  otherSlots.delete(piece);
  const whole = groupAt(layout, groupWith(layout, set, setSlots), originOf(layout, set));
  const rest = groupAt(layout, groupWith(layout, group, otherSlots), originOf(layout, group));
  const next = withGroup(withGroup(layout, whole), rest);
  return changed({ ...next, groups: next.groups.filter((kept) => kept.id === set.id || kept.pieceIds.length > 0) });
}

/** "loose-1", "loose-2", …: the first that no group bears, so that the same steps always give the same ids. */
function freeGroupId(layout: FaceLayout): string {
  const taken = new Set(layout.groups.map((group) => group.id));
  let number = 1;
  while (taken.has(`loose-${number}`)) number += 1;
  return `loose-${number}`;
}
