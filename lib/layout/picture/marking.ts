/**
 * What a person marks on a photograph so that it can be brought to scale. Photo points are in pixels of the upright, full-size
 * photograph, origin at the outer corner of its first pixel (pixel centres lie at +0.5), y down.
 */
import type { StockPoint } from "../frame/point";
import type { Um } from "../units/um";

export interface PhotoPoint {
  readonly x: number;
  readonly y: number;
}

/** Corners in the order (0,0), (L,0), (L,W), (0,W) of the rectangle marked, L along the grain. */
export type FourCorners = readonly [PhotoPoint, PhotoPoint, PhotoPoint, PhotoPoint];

/** Where the true size comes from: the board itself, or a sheet of known size lying on it. */
export type ScaleReference =
  | { readonly kind: "board"; readonly length: Um; readonly width: Um }
  | { readonly kind: "sheet"; readonly length: Um; readonly width: Um; readonly corners: FourCorners };

/** A further point whose place in the reference rectangle's own frame is known, µm from its first corner. */
export interface ExtraPoint {
  readonly photo: PhotoPoint;
  readonly at: StockPoint;
}

/** A point somewhere along a straight edge of the board, for taking out the bending of the lens. */
export interface EdgePoint {
  readonly photo: PhotoPoint;
  readonly edge: "top" | "right" | "bottom" | "left";
}

export interface Marking {
  readonly reference: ScaleReference;
  /** The board's own corners, whichever reference gives the scale. */
  readonly corners: FourCorners;
  readonly extraPoints: readonly ExtraPoint[];
  readonly edgePoints: readonly EdgePoint[];
}
