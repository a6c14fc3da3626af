/**
 * Whether a layout that came from outside (a file, the wire) means anything at all, before `layOut` is asked. Faults are
 * mistakes of a program, not of a maker: what a maker can get wrong is in `fit/problems.ts`.
 */
import type { PieceId } from "../piece";
import { hungChart } from "./charts";
import type { Face } from "./face";
import type { FaceFault } from "./face-fault";
import type { FaceLayout } from "./face-layout";
import { oneBlankSets } from "./one-blank";
import { ofPiece, pieceIdsOf } from "./piece-ids";
import { rulesOf } from "./rules-of";
import { slotOf } from "./slots";

export type LayoutFault =
  | FaceFault
  | { readonly fault: "negative-length"; readonly where: "crosscut" | "rip" }
  | { readonly fault: "no-group" }
  | { readonly fault: "group-id-twice"; readonly groupId: string }
  | { readonly fault: "unknown-piece"; readonly piece: PieceId }
  /** Every piece is in one group, and every slot gives one piece. */
  | { readonly fault: "piece-not-once"; readonly piece: PieceId; readonly times: number }
  | { readonly fault: "slot-not-once"; readonly piece: PieceId; readonly times: number }
  /** What is sawn as one blank lies in one group. */
  | { readonly fault: "one-blank-parted"; readonly pieces: readonly PieceId[] }
  | { readonly fault: "swap-of-unequal"; readonly piece: PieceId; readonly slot: PieceId };

/** Everything that is wrong with the shape of a layout; empty when `layOut` may be called. */
export function layoutFaults(layout: FaceLayout): LayoutFault[] {
  const faults = [...faceFaults(layout.face), ...lossFaults(layout)];
  // The rest counts pieces by the face, which has to be sound first.
  return faults.length > 0 ? faults : groupFaults(layout);
}

/** What is wrong with the face alone; empty when its pieces may be asked for. */
export function faceFaults(face: Face): readonly FaceFault[] {
  return rulesOf(face).faults(face);
}

function lossFaults(layout: FaceLayout): LayoutFault[] {
  return (["crosscut", "rip"] as const).flatMap((where) => {
    const { kerf, cleanUpBefore, cleanUpAfter } = layout[where];
    const sound = [kerf, cleanUpBefore, cleanUpAfter].every((length) => length >= 0);
    return sound ? [] : [{ fault: "negative-length", where }];
  });
}

function groupFaults(layout: FaceLayout): LayoutFault[] {
  const faults: LayoutFault[] = [];
  const ids = pieceIdsOf(layout.face);
  const known = new Set(ids);
  if (layout.groups.length === 0) faults.push({ fault: "no-group" });
  for (const [groupId, times] of counted(layout.groups.map((group) => group.id))) {
    if (times > 1) faults.push({ fault: "group-id-twice", groupId });
  }

  const held = layout.groups.flatMap((group) => group.pieceIds.map((id) => ({ id, slot: slotOf(group, id) })));
  const anchors = [layout.anchorX, layout.anchorY].flatMap((anchor) => (typeof anchor === "object" ? [anchor.piece] : []));
  const named = [
    ...held.flatMap(({ id, slot }) => [id, slot]),
    ...anchors,
    ...layout.groups.flatMap((group) => Object.keys(group.takesPlaceOf)),
  ];
  for (const piece of new Set(named)) if (!known.has(piece)) faults.push({ fault: "unknown-piece", piece });

  const pieceTimes = counted(held.map(({ id }) => id));
  const slotTimes = counted(held.map(({ slot }) => slot));
  for (const piece of ids) {
    const times = pieceTimes.get(piece) ?? 0;
    if (times !== 1) faults.push({ fault: "piece-not-once", piece, times });
    const slots = slotTimes.get(piece) ?? 0;
    if (slots !== 1) faults.push({ fault: "slot-not-once", piece, times: slots });
  }

  for (const pieces of oneBlankSets(layout.face)) {
    const together = layout.groups.some(({ pieceIds }) => pieces.every((id) => pieceIds.includes(id)));
    if (!together) faults.push({ fault: "one-blank-parted", pieces });
  }

  const hung = hungChart(layout.face);
  for (const { id, slot } of held) {
    if (!known.has(id) || !known.has(slot)) continue;
    const own = ofPiece(hung, id);
    const taken = ofPiece(hung, slot);
    const alike = own.role === taken.role && own.rect.width === taken.rect.width && own.rect.height === taken.rect.height;
    if (!alike) faults.push({ fault: "swap-of-unequal", piece: id, slot });
  }
  return faults;
}

function counted(ids: readonly string[]): Map<string, number> {
  const times = new Map<string, number>();
  for (const id of ids) times.set(id, (times.get(id) ?? 0) + 1);
  return times;
}
