/**
 * Changes sizes, gaps, counts, loss or spacing of a layout. The anchor of every group stays where it is in the wood; the rest
 * moves away from it or towards it.
 */
import type { PieceId } from "../piece";
import { hungChart } from "./charts";
import type { Face } from "./face";
import type { AnchorX, AnchorY, FaceLayout } from "./face-layout";
import type { CutChoices } from "./fresh-layout";
import { oneBlankSets } from "./one-blank";
import { ofPiece, pieceIdsOf } from "./piece-ids";
import { groupWith, slotOf } from "./slots";

export interface FaceChange {
  readonly layout: FaceLayout;
  /** Pieces that are cut from their own place again, because they no longer have the size of the one they changed places with. */
  readonly swapsUndone: readonly PieceId[];
}

/** Other losses or another spacing; sizes and gaps stay. */
export function changeCuts(layout: FaceLayout, cuts: Partial<CutChoices>): FaceLayout {
  const { crosscut, rip, spacing } = { ...layout, ...cuts };
  return { ...layout, crosscut, rip, spacing };
}

/**
 * Another face. Pieces that exist before and after stay in their groups; new ones join the set; what an anchor or a
 * swap refers to and is no longer there is given up.
 */
export function changeFace(layout: FaceLayout, face: Face): FaceChange {
  return changeFaceRenaming(layout, face, (id) => id);
}

/** The new name of a piece, or null where it is no longer there. */
export type Renaming = (id: PieceId) => PieceId | null;

/** The same where pieces are put in or taken out before others, so that the rest are numbered anew. */
export function changeFaceRenaming(before: FaceLayout, face: Face, renaming: Renaming): FaceChange {
  const layout = renamed(before, renaming);
  const ids = pieceIdsOf(face);
  const present = new Set(ids);
  const held = new Set(layout.groups.flatMap((group) => group.pieceIds));
  const added = ids.filter((id) => !held.has(id));
  const swapsUndone = undoneSwaps(layout, face, present);
  const resized = {
    ...layout,
    face,
    anchorX: stillThere(layout.anchorX, present),
    anchorY: stillThere(layout.anchorY, present),
  };
  const slotsByGroup = layout.groups.map((group, index) => {
    const slots = new Map<PieceId, PieceId>();
    for (const id of group.pieceIds) if (present.has(id)) slots.set(id, swapsUndone.has(id) ? id : slotOf(group, id));
    if (index === 0) for (const id of added) slots.set(id, id);
    return slots;
  });
  for (const ids of oneBlankSets(face)) bringTogether(slotsByGroup, ids);
  const groups = layout.groups.map((group, index) => groupWith(resized, group, slotsByGroup[index] ?? new Map()));
  return {
    layout: { ...resized, groups: groups.filter((group, index) => index === 0 || group.pieceIds.length > 0) },
    swapsUndone: ids.filter((id) => swapsUndone.has(id)),
  };
}

/** What is sawn as one blank goes to the group of its first piece. */
function bringTogether(slotsByGroup: readonly Map<PieceId, PieceId>[], ids: readonly PieceId[]): void {
  const home = slotsByGroup.find((slots) => slots.has(ids[0] ?? ""));
  for (const slots of slotsByGroup) {
    for (const id of ids) {
      const slot = slots.get(id);
      if (home === undefined || slots === home || slot === undefined) continue;
      slots.delete(id);
      home.set(id, slot);
    }
  }
}

/** The same groups and anchors under the new names; a swap that a piece without a new name had a part in is undone. */
function renamed(layout: FaceLayout, renaming: Renaming): FaceLayout {
  const next = new Map(layout.groups.flatMap((group) => group.pieceIds.map((id) => [id, slotOf(group, id)] as const)));
  const broken = new Set(
    [...next.keys()]
      .map((id) => cycleFrom(next, id))
      .flatMap((cycle) => (cycle.some((id) => renaming(id) === null) ? cycle : [])),
  );
  const groups = layout.groups.map((group) => {
    const pairs = group.pieceIds.flatMap((id) => {
      const [name, slot] = [renaming(id), renaming(broken.has(id) ? id : slotOf(group, id))];
      return name === null || slot === null ? [] : [[name, slot] as const];
    });
    const takesPlaceOf = Object.fromEntries(pairs.filter(([name, slot]) => name !== slot));
    return { ...group, pieceIds: pairs.map(([name]) => name), takesPlaceOf };
  });
  const { anchorX, anchorY } = layout;
  const anchor = <A extends AnchorX | AnchorY>(one: A): A | "centre" | { readonly piece: PieceId } => {
    if (typeof one !== "object") return one;
    const piece = renaming(one.piece);
    return piece === null ? "centre" : { piece };
  };
  return { ...layout, groups, anchorX: anchor(anchorX), anchorY: anchor(anchorY) };
}

/**
 * Slots are a permutation of the pieces. A cycle of it stays whole while all its pieces are there and of one size; otherwise
 * all of it is undone, so that the slots remain a permutation.
 */
function undoneSwaps(layout: FaceLayout, face: Face, present: ReadonlySet<PieceId>): Set<PieceId> {
  const next = new Map(layout.groups.flatMap((group) => group.pieceIds.map((id) => [id, slotOf(group, id)] as const)));
  const hung = hungChart(face);
  const sizeOf = (id: PieceId) => {
    if (!present.has(id)) return "gone";
    const { role, rect } = ofPiece(hung, id);
    return `${role} ${rect.width}×${rect.height}`;
  };
  const undone = new Set<PieceId>();
  for (const start of next.keys()) {
    const cycle = cycleFrom(next, start);
    if (cycle.length > 1 && new Set(cycle.map(sizeOf)).size > 1) for (const id of cycle) undone.add(id);
  }
  return undone;
}

function cycleFrom(next: ReadonlyMap<PieceId, PieceId>, start: PieceId): PieceId[] {
  const cycle = [start];
  for (let id = next.get(start); id !== undefined && id !== start && cycle.length <= next.size; id = next.get(id)) cycle.push(id);
  return cycle;
}

function stillThere<Anchor extends AnchorX | AnchorY>(anchor: Anchor, present: ReadonlySet<PieceId>): Anchor | "centre" {
  return typeof anchor === "object" && !present.has(anchor.piece) ? "centre" : anchor;
}
