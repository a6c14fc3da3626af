/**
 * Whether a layout that came from outside (a file, the wire) means anything at all, before `layOut` is asked. Faults are
 * mistakes of a program, not of a maker: what a maker can get wrong is in `fit/problems.ts`.
 */
import type { PieceId } from "../piece";
import type { FaceLayout } from "./face-layout";
import { faceGrid, placeOf, rectAt } from "./grids";
import { pieceIdsOf } from "./piece-ids";
import { slotOf } from "./slots";

export type LayoutFault =
  | { readonly fault: "empty-face" }
  | { readonly fault: "gap-count"; readonly axis: "columns" | "rows" }
  | { readonly fault: "size-not-positive"; readonly axis: "columns" | "rows"; readonly index: number }
  | { readonly fault: "negative-length"; readonly where: "columnGaps" | "rowGaps" | "crosscut" | "rip" }
  | { readonly fault: "no-group" }
  | { readonly fault: "group-id-twice"; readonly groupId: string }
  | { readonly fault: "unknown-piece"; readonly piece: PieceId }
  /** Every piece is in one group, and every slot gives one piece. */
  | { readonly fault: "piece-not-once"; readonly piece: PieceId; readonly times: number }
  | { readonly fault: "slot-not-once"; readonly piece: PieceId; readonly times: number }
  | { readonly fault: "swap-of-unequal"; readonly piece: PieceId; readonly slot: PieceId };

/** Everything that is wrong with the shape of a layout; empty when `layOut` may be called. */
export function layoutFaults(layout: FaceLayout): LayoutFault[] {
  const faults = faceFaults(layout);
  // The rest counts pieces by the grid, which has to be sound first.
  return faults.length > 0 ? faults : groupFaults(layout);
}

function faceFaults({ face, crosscut, rip }: FaceLayout): LayoutFault[] {
  const faults: LayoutFault[] = [];
  if (face.columns.length === 0 || face.rows.length === 0) faults.push({ fault: "empty-face" });
  for (const axis of ["columns", "rows"] as const) {
    const gaps = axis === "columns" ? face.columnGaps : face.rowGaps;
    if (gaps.length !== Math.max(0, face[axis].length - 1)) faults.push({ fault: "gap-count", axis });
    face[axis].forEach((size, index) => {
      if (!(size > 0)) faults.push({ fault: "size-not-positive", axis, index });
    });
  }
  const lengths = {
    columnGaps: face.columnGaps,
    rowGaps: face.rowGaps,
    crosscut: [crosscut.kerf, crosscut.cleanUpBefore, crosscut.cleanUpAfter],
    rip: [rip.kerf, rip.cleanUpBefore, rip.cleanUpAfter],
  };
  for (const where of ["columnGaps", "rowGaps", "crosscut", "rip"] as const) {
    if (lengths[where].some((length) => !(length >= 0))) faults.push({ fault: "negative-length", where });
  }
  return faults;
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

  const grid = faceGrid(layout.face);
  for (const { id, slot } of held) {
    if (!known.has(id) || !known.has(slot)) continue;
    const own = rectAt(grid, placeOf(layout.face, id));
    const taken = rectAt(grid, placeOf(layout.face, slot));
    if (own.width !== taken.width || own.height !== taken.height) faults.push({ fault: "swap-of-unequal", piece: id, slot });
  }
  return faults;
}

function counted(ids: readonly string[]): Map<string, number> {
  const times = new Map<string, number>();
  for (const id of ids) times.set(id, (times.get(id) ?? 0) + 1);
  return times;
}
