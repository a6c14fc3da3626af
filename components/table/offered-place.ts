/** From a place that a search found to the layout it would give. */
import type { PaintedBoard } from "@/lib/editor/canvas/paint-face";
import { type FaceLayout, groupById, placeGroup } from "@/lib/layout";
import type { FoundPlaceOnWire, SearchedBoard } from "@/lib/schemas/wood-search";

/** The layout with the group at that place; null where the group is no longer there. */
export function layoutAt(
  layout: FaceLayout,
  groupId: string,
  boardId: string,
  { corner, turns }: Pick<FoundPlaceOnWire, "corner" | "turns">,
): FaceLayout | null {
  if (groupById(layout, groupId) === null) return null;
  const placed = placeGroup(layout, groupId, boardId, corner, turns);
  return placed.ok ? placed.layout : null;
}

/** Enough of a board of the rack to paint pieces from its picture. */
export function boardToPaint(board: SearchedBoard): PaintedBoard {
  const { boardId, length, width, thickness, levels } = board;
  return {
    face: { id: boardId, length, width, thickness, outline: null, keepClear: [], spokenFor: [], glueLines: [] },
    levels: [...levels].sort((p, q) => q.widthPx - p.widthPx),
  };
}
