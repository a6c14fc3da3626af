/** Corners of a polygon moved, inserted and taken away, and snapping to the board's rectangle. Pure; stock frame, µm. */
import { type StockPoint, type Um, um } from "@/lib/layout";
import type { PictureSize } from "./zones-doc";

/** Fewer enclose nothing. */
export const FEWEST_CORNERS = 3;
/** As many as are stored. */
export const MOST_CORNERS = 200;

export const wholeBoard = ({ length, width }: PictureSize): readonly StockPoint[] => [
  { x: um(0), y: um(0) },
  { x: length, y: um(0) },
  { x: length, y: width },
  { x: um(0), y: width },
];

export const moveCorner = (points: readonly StockPoint[], index: number, to: StockPoint): readonly StockPoint[] =>
  points.map((point, at) => (at === index ? to : point));

/** A new corner on the edge that begins at corner `edge`, halfway. Nothing happens when the polygon is full. */
export function insertCorner(points: readonly StockPoint[], edge: number): readonly StockPoint[] {
  const at = middleOfEdge(points, edge);
  return at && points.length < MOST_CORNERS ? points.toSpliced(edge + 1, 0, at) : points;
}

export function middleOfEdge(points: readonly StockPoint[], edge: number): StockPoint | null {
  const from = points[edge];
  const to = points[(edge + 1) % points.length];
  if (!from || !to) return null;
  return { x: um(Math.round((from.x + to.x) / 2)), y: um(Math.round((from.y + to.y) / 2)) };
}

/** A triangle keeps its three corners. */
export const removeCorner = (points: readonly StockPoint[], index: number): readonly StockPoint[] =>
  points.length > FEWEST_CORNERS ? points.toSpliced(index, 1) : points;

/** Onto the board's edges where nearer than `reach`, and so onto its corners; else as it is. µm, rounded; `bound` keeps it on the board. */
export function snapped(p: { x: number; y: number }, size: PictureSize, reach: number, bound: boolean): StockPoint {
  return { x: snappedTo(p.x, size.length, reach, bound), y: snappedTo(p.y, size.width, reach, bound) };
}

function snappedTo(value: number, most: Um, reach: number, bound: boolean): Um {
  if (Math.abs(value) <= reach) return um(0);
  if (Math.abs(value - most) <= reach) return most;
  const kept = bound ? Math.min(Math.max(value, 0), most) : value;
  return um(Math.round(kept));
}
