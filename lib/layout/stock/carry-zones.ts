/**
 * Outline and keep-clear areas taken over to another picture of the same board, whose rectangle may have come out a little larger or
 * smaller. What still fits is kept as it is, an outline that reaches over is cut to the rectangle, what lies off the board is dropped.
 */
import type { StockPoint } from "../frame/point";
import { um } from "../units/um";
import type { KeepClearShape } from "./board";
import { cutPolygon } from "./cut-polygon";
import { type BoardSize, outsideFault, polygonFault } from "./polygon-fault";

export type CarriedOutline =
  | { readonly fate: "none" | "dropped"; readonly outline: null }
  | { readonly fate: "kept" | "cut"; readonly outline: readonly StockPoint[] };

/** Dropped where cutting leaves nothing that encloses wood in one piece. */
export function carryOutline(outline: readonly StockPoint[] | null, size: BoardSize): CarriedOutline {
  if (outline === null) return { fate: "none", outline: null };
  if (outsideFault(outline, size) === null) return { fate: "kept", outline };
  const cut = cutToRectangle(outline, size);
  return cut.length >= 3 && polygonFault(cut) === null ? { fate: "cut", outline: cut } : { fate: "dropped", outline: null };
}

/** Whether an area reaches into the board's rectangle at all, by its bounds. Areas may hang over the board's edge, as knots do. */
export function liesOnBoard(area: KeepClearShape, { length, width }: BoardSize): boolean {
  const { left, right, top, bottom } = boundsOfArea(area);
  return right > 0 && left < length && bottom > 0 && top < width;
}

function boundsOfArea(area: KeepClearShape): { left: number; right: number; top: number; bottom: number } {
  if (area.shape === "polygon") {
    const xs = area.points.map(({ x }) => x);
    const ys = area.points.map(({ y }) => y);
    return { left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), bottom: Math.max(...ys) };
  }
  const turn = (area.turnDeg * Math.PI) / 180;
  const halfX = Math.hypot(area.radiusX * Math.cos(turn), area.radiusY * Math.sin(turn));
  const halfY = Math.hypot(area.radiusX * Math.sin(turn), area.radiusY * Math.cos(turn));
  const { x, y } = area.centre;
  return { left: x - halfX, right: x + halfX, top: y - halfY, bottom: y + halfY };
}

/** Cut to the board's own rectangle. */
function cutToRectangle(outline: readonly StockPoint[], { length, width }: BoardSize): readonly StockPoint[] {
  return cutPolygon(outline, [
    { axis: "x", limit: um(0), keeps: "above" },
    { axis: "x", limit: length, keeps: "below" },
    { axis: "y", limit: um(0), keeps: "above" },
    { axis: "y", limit: width, keeps: "below" },
  ]);
}
