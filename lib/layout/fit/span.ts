/**
 * Upright rectangles of the stock as two spans, one along the grain and one across it, so that every test is written once and
 * used on both axes. On solid stock pieces are turned by quarter turns only, so a piece is always such a rectangle. Real
 * numbers, µm.
 */
import type { StockPoint, StockRect } from "../frame/point";

/** Along: x of the stock frame, with the grain. Across: y. */
export type StockAxis = "along" | "across";

export interface Span {
  readonly from: number;
  readonly to: number;
}

export type Spans = Readonly<Record<StockAxis, Span>>;

export function spansOf(rect: StockRect): Spans {
  return { along: { from: rect.x, to: rect.x + rect.width }, across: { from: rect.y, to: rect.y + rect.height } };
}

export function otherAxis(axis: StockAxis): StockAxis {
  return axis === "along" ? "across" : "along";
}

/** The coordinate of a point on an axis. */
export function coordinateOf(point: StockPoint, axis: StockAxis): number {
  return axis === "along" ? point.x : point.y;
}

/** The rectangle moved along one axis. */
export function movedSpans(spans: Spans, axis: StockAxis, by: number): Spans {
  return { ...spans, [axis]: { from: spans[axis].from + by, to: spans[axis].to + by } };
}

/** Distance between two spans; negative by the overlap where they overlap, 0 where they touch. */
export function roomBetween(a: Span, b: Span): number {
  return Math.max(a.from, b.from) - Math.min(a.to, b.to);
}
