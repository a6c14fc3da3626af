/**
 * Takes points, rectangles and polygons through an isometry. Quarter turns with whole-number shifts are exact; anything else is
 * rounded to whole micrometres here and nowhere earlier.
 */
import { type Um, um } from "../units/um";
import { inverted } from "./combine-isometries";
import type { Isometry } from "./isometry";
import type { FacePoint, FaceRect, Frame, Point, Rect, StockPoint, StockRect } from "./point";

/** The point of the wood that lies under a point of the face. */
export function toStock(stockFromFace: Isometry, point: FacePoint): StockPoint {
  return applied(stockFromFace, point);
}

/** The point of the face that shows a point of the wood. */
export function toFace(stockFromFace: Isometry, point: StockPoint): FacePoint {
  return applied(inverted(stockFromFace), point);
}

/** The smallest upright rectangle in the wood that holds a rectangle of the face: the rectangle itself after quarter turns. */
export function rectToStock(stockFromFace: Isometry, rect: FaceRect): StockRect {
  const nearest: FacePoint = { x: rect.x, y: rect.y };
  const right: FacePoint = { x: um(rect.x + rect.width), y: rect.y };
  const below: FacePoint = { x: rect.x, y: um(rect.y + rect.height) };
  const farthest: FacePoint = { x: right.x, y: below.y };
  return boundsOf([nearest, right, farthest, below].map((corner) => toStock(stockFromFace, corner)));
}

/** The outline in the wood of an outline on the face, in the same order of points; a reflection turns its sense round. */
export function polygonToStock(stockFromFace: Isometry, outline: readonly FacePoint[]): StockPoint[] {
  return outline.map((corner) => toStock(stockFromFace, corner));
}

/** The smallest upright rectangle that holds all points; throws on none. */
export function boundsOf<F extends Frame>(points: readonly Point<F>[]): Rect<F> {
  if (points.length === 0) throw new RangeError("no points have no bounds");
  let left = Number.POSITIVE_INFINITY;
  let top = Number.POSITIVE_INFINITY;
  let right = Number.NEGATIVE_INFINITY;
  let bottom = Number.NEGATIVE_INFINITY;
  for (const { x, y } of points) {
    left = Math.min(left, x);
    top = Math.min(top, y);
    right = Math.max(right, x);
    bottom = Math.max(bottom, y);
  }
  return { x: um(left), y: um(top), width: um(right - left), height: um(bottom - top) };
}

function applied<From extends Frame, To extends Frame>(map: Isometry, point: Point<From>): Point<To> {
  return {
    x: rounded(map.a * point.x + map.c * point.y + map.tx),
    y: rounded(map.b * point.x + map.d * point.y + map.ty),
  };
}

function rounded(value: number): Um {
  return um(Math.round(value));
}
