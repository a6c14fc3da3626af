/** Whether a piece reaches into a keep-clear area, how far, and which moves would have it do so. Touching is clear. Exact. */
import type { KeepClearShape } from "../stock/board";
import { ellipseShadow } from "./ellipse-shadow";
import { movesInto, unionOf } from "./forbidden-moves";
import { polygonShadow } from "./polygon-shadow";
import { otherAxis, type Span, type Spans, type StockAxis } from "./span";

/** Moves along one axis that bring the piece into the area, as open intervals. */
export function movesIntoArea(piece: Spans, area: KeepClearShape, axis: StockAxis): Span[] {
  const band = piece[otherAxis(axis)];
  if (area.shape === "polygon") {
    return unionOf(polygonShadow(area.points, axis, band).map((shadow) => movesInto(piece[axis], shadow)));
  }
  const shadow = ellipseShadow(area, axis, band);
  return shadow === null ? [] : [movesInto(piece[axis], shadow)];
}

/**
 * How far a piece reaches into an area: the shortest straight move, along the board or across it, that takes it off; 0 where
 * it only touches. For an edge that cuts into a round knot this is the height of what it cuts off.
 */
export function reachInto(piece: Spans, area: KeepClearShape): number {
  if (isFarFrom(piece, area)) return 0;
  const along = distanceOut(movesIntoArea(piece, area, "along"));
  return along === 0 ? 0 : Math.min(along, distanceOut(movesIntoArea(piece, area, "across")));
}

/** The middle of the area along the board: where a maker looks for it with a tape. */
export function middleAlong(area: KeepClearShape): number {
  if (area.shape === "ellipse") return area.centre.x;
  const xs = area.points.map((point) => point.x);
  return (Math.min(...xs) + Math.max(...xs)) / 2;
}

/** Most areas are nowhere near most pieces, and this runs for every pair of them while dragging. */
function isFarFrom({ along, across }: Spans, area: KeepClearShape): boolean {
  if (area.shape === "ellipse") {
    const reach = Math.max(area.radiusX, area.radiusY);
    const { x, y } = area.centre;
    return x + reach <= along.from || x - reach >= along.to || y + reach <= across.from || y - reach >= across.to;
  }
  return (
    area.points.every(({ x }) => x <= along.from) ||
    area.points.every(({ x }) => x >= along.to) ||
    area.points.every(({ y }) => y <= across.from) ||
    area.points.every(({ y }) => y >= across.to)
  );
}

function distanceOut(union: readonly Span[]): number {
  const around = union.find(({ from, to }) => from < 0 && to > 0);
  return around === undefined ? 0 : Math.min(-around.from, around.to);
}
