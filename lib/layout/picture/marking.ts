/** What a person marks on a photograph to bring a board to scale. Plain data, shared by screens, storage and the core. */
import type { Um } from "../units/um";
import type { PhotoPoint } from "./homography";

/**
 * Four corners of a rectangle in the order (0,0), (length,0), (length,width), (0,width) of its own frame: clockwise as seen,
 * beginning at the left end of the edge that is as long as `length`. Pixels of the upright, full-size photo.
 */
export type FourCorners = readonly [PhotoPoint, PhotoPoint, PhotoPoint, PhotoPoint];

/** The rectangle whose true size gives the scale: the board itself, or a sheet of paper or card lying on it. */
export type MarkingReference =
  | { readonly kind: "board"; readonly length: Um; readonly width: Um }
  | { readonly kind: "sheet"; readonly length: Um; readonly width: Um; readonly corners: FourCorners };

/** A further point whose place in the reference rectangle's frame is known. */
export interface ExtraPoint {
  readonly photo: PhotoPoint;
  readonly at: { readonly x: Um; readonly y: Um };
}

/** Of the board as it lies in the stock frame: top is y = 0, left is x = 0. */
export type BoardEdge = "top" | "right" | "bottom" | "left";

/** A point somewhere on a straight edge of the board; takes out the lens' bending. */
export interface EdgePoint {
  readonly photo: PhotoPoint;
  readonly edge: BoardEdge;
}

export interface Marking {
  readonly reference: MarkingReference;
  /** The board's own corners. With a board as reference they are the corners of true size; else its extent is measured by them. */
  readonly corners: FourCorners;
  readonly extraPoints: readonly ExtraPoint[];
  readonly edgePoints: readonly EdgePoint[];
}
