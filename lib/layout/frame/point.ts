/**
 * Points and rectangles, each in a named frame so that a face coordinate cannot be taken for a stock coordinate.
 *
 * Stock frame: origin at the reference corner of the board face or leaf face, x along the grain, y across, as photographed.
 * Face frame: origin at the top left of the face as seen from the front, x right, y down.
 * In both, y points down. Units: micrometres.
 */
import type { Um } from "../units/um";

declare const frameBrand: unique symbol;

export type Frame = "stock" | "face";

export interface Point<F extends Frame> {
  readonly x: Um;
  readonly y: Um;
  readonly [frameBrand]?: F;
}

export type StockPoint = Point<"stock">;
export type FacePoint = Point<"face">;

/** An axis-aligned rectangle: corner nearest the origin, and size. Width runs along x, height along y. */
export interface Rect<F extends Frame> {
  readonly x: Um;
  readonly y: Um;
  readonly width: Um;
  readonly height: Um;
  readonly [frameBrand]?: F;
}

export type StockRect = Rect<"stock">;
export type FaceRect = Rect<"face">;
