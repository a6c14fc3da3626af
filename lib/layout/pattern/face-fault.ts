/** What makes a face mean nothing, by pattern: mistakes of a program, not of a maker. */
import type { Um } from "../units/um";

export type FaceFault = GridFault | CutOutFault | WrapFault | ResawnFault;

export type GridFault =
  | { readonly fault: "empty-face" }
  | { readonly fault: "gap-count"; readonly axis: "columns" | "rows" }
  | { readonly fault: "size-not-positive"; readonly axis: "columns" | "rows"; readonly index: number }
  | { readonly fault: "negative-length"; readonly where: "columnGaps" | "rowGaps" };

/** Strips, rows and parts are counted from 0. */
export type CutOutFault =
  | { readonly fault: "empty-face" }
  /** There is one strip more than there are rows. */
  | { readonly fault: "strip-count"; readonly strips: number; readonly rows: number }
  | { readonly fault: "strip-not-positive"; readonly strip: number }
  | { readonly fault: "row-not-positive"; readonly row: number }
  | { readonly fault: "part-not-positive"; readonly row: number; readonly part: number }
  /** A row starts and ends with a fixed part. */
  | { readonly fault: "row-ends-open"; readonly row: number }
  /** Two fixed parts side by side are one. */
  | { readonly fault: "fixed-beside-fixed"; readonly row: number; readonly part: number }
  /** The gaps leave nothing of the opening for its front. */
  | { readonly fault: "no-front"; readonly row: number; readonly part: number }
  /** All rows have the finished length of the first; this one is longer by so much, or shorter where negative. */
  | { readonly fault: "row-length-differs"; readonly row: number; readonly by: Um }
  | { readonly fault: "negative-length"; readonly where: "gap" | "fitting" };

/** Sides and corners are counted from 0. */
export type WrapFault =
  | { readonly fault: "empty-face" }
  /** A closed run has three sides at least. */
  | { readonly fault: "too-few-sides"; readonly sides: number }
  | { readonly fault: "corner-count"; readonly corners: number; readonly needed: number }
  | { readonly fault: "side-not-positive"; readonly side: number }
  | { readonly fault: "size-not-positive"; readonly axis: "height" | "thickness"; readonly index: 0 }
  | { readonly fault: "turn-out-of-range"; readonly corner: number }
  | { readonly fault: "negative-length"; readonly where: "gap" }
  /** The bevels of its two ends meet before the inner face: it is this much too short. */
  | { readonly fault: "no-inner-face"; readonly side: number; readonly by: Um };

export type ResawnFault =
  | { readonly fault: "size-not-positive"; readonly axis: "width" | "height" | "thickness"; readonly index: 0 }
  | { readonly fault: "negative-length"; readonly where: "resaw" }
  /** A surface that leans by a right angle or more shows on no two faces. */
  | { readonly fault: "lean-out-of-range" };
