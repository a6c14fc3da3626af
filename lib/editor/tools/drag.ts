/**
 * A drag as a pure function of where it started and where the pointer is now: start + total delta, never step by step, so that the number of moves
 * in between cannot matter.
 */
import {
  type BoardFace,
  type FaceLayout,
  groupById,
  moveGroup,
  type Snap,
  type StockId,
  snapSlide,
  type Um,
  um,
} from "@/lib/layout";
import { type BoardPlace, boardNear, type TablePoint } from "../view/geometry";
import type { PartPreview } from "./part-drag";

export interface Drag {
  /** All on wood when the drag began. */
  readonly groupIds: readonly string[];
  readonly start: TablePoint;
}

/** What a drag moves over. */
export interface DragTable {
  readonly boards: readonly BoardFace[];
  readonly places: readonly BoardPlace[];
}

export interface DragWish {
  /** How near a place must be to be snapped to; null: do not snap. */
  readonly snapWithin: Um | null;
  /** Keep to the direction along or across the board that the pointer went further in. */
  readonly straight: boolean;
}

/** Groups that slide: the layout as it would be if the pointer were let go now. */
export interface SlidePreview {
  readonly kind: "slide";
  readonly layout: FaceLayout;
  readonly groupIds: readonly string[];
  /** The board the groups would lie on. */
  readonly stockId: StockId;
  readonly along: Snap | null;
  readonly across: Snap | null;
}

/** A drag in progress: groups that slide on the wood, or a part of the face that is moved on the show side. */
export type Preview = SlidePreview | PartPreview;

/** Null when the groups lie on no board of the table. */
export function previewAt(layout: FaceLayout, table: DragTable, drag: Drag, at: TablePoint, wish: DragWish): SlidePreview | null {
  const total = straightened({ x: at.x - drag.start.x, y: at.y - drag.start.y }, wish.straight);
  const source = placeOfGroups(layout, table, drag.groupIds);
  const grabbed = boardNear(table.places, table.boards, drag.start.y);
  const reached = boardNear(table.places, table.boards, drag.start.y + total.y);
  if (!source || !grabbed || !reached) return null;
  // Let go over the board it came from it stays there, also where boards lie close together.
  const target = reached.stockId === grabbed.stockId ? source : reached;
  const board = table.boards.find(({ id }) => id === target.stockId);
  if (!board) return null;

  const lifted = onBoard(layout, drag.groupIds, target.stockId, um(source.top - target.top));
  const delta = { x: um(Math.round(total.x)), y: um(Math.round(total.y)) };
  const snapped =
    wish.snapWithin === null
      ? { delta, along: null, across: null }
      : snapSlide(lifted, board, drag.groupIds, delta, wish.snapWithin);
  const by = wish.straight ? keptStraight(snapped.delta, total) : snapped.delta;
  return {
    kind: "slide",
    layout: slid(lifted, drag.groupIds, by),
    groupIds: drag.groupIds,
    stockId: target.stockId,
    along: snapped.along,
    across: snapped.across,
  };
}

function placeOfGroups(layout: FaceLayout, table: DragTable, groupIds: readonly string[]): BoardPlace | null {
  const stockId = groupIds.map((id) => groupById(layout, id)?.placement?.stockId).find((id) => id !== undefined);
  return table.places.find((place) => place.stockId === stockId) ?? null;
}

/** The groups on another board without having moved on the table. */
function onBoard(layout: FaceLayout, groupIds: readonly string[], stockId: StockId, down: Um): FaceLayout {
  const groups = layout.groups.map((group) => {
    if (!groupIds.includes(group.id) || group.placement === null || group.placement.stockId === stockId) return group;
    const at = { x: group.placement.at.x, y: um(group.placement.at.y + down) };
    return { ...group, placement: { ...group.placement, stockId, at } };
  });
  return { ...layout, groups };
}

function slid(layout: FaceLayout, groupIds: readonly string[], by: { readonly x: Um; readonly y: Um }): FaceLayout {
  return groupIds.reduce((present, id) => {
    const change = moveGroup(present, id, by);
    return change.ok ? change.layout : present;
  }, layout);
}

function straightened(total: TablePoint, straight: boolean): TablePoint {
  if (!straight) return total;
  return Math.abs(total.x) >= Math.abs(total.y) ? { x: total.x, y: 0 } : { x: 0, y: total.y };
}

/** Snapping must not leave the line. */
function keptStraight(delta: { readonly x: Um; readonly y: Um }, total: TablePoint): { readonly x: Um; readonly y: Um } {
  return total.y === 0 ? { x: delta.x, y: um(0) } : { x: um(0), y: delta.y };
}
