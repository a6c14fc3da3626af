/**
 * Leaves sliced one below the other from one block: neighbours show nearly the same figure.
 */
import { type BoardOptions, type SawnBoard, sawBoard } from "./board-face";
import type { FacePicture } from "./picture";
import { deeper, type Plane, planeFace, pointOn, turned } from "./plane";

export interface FlitchOptions extends BoardOptions {
  /** Distance from leaf to leaf; 0.6 mm unless said. */
  readonly leafMm?: number;
}

export interface Flitch extends SawnBoard {
  readonly leafMm: number;
}

/** How a leaf's window lies off its neighbours', as leaves do once they have been clipped and stacked; face frame. */
export interface LeafSlip {
  readonly alongMm: number;
  readonly acrossMm: number;
}

/** The side towards the bark, or the side towards the pith as it is seen once the leaf is turned over. */
export type LeafSide = "bark" | "pith";

/** Grows the log and marks out the block. Leaf 0 is the face of the board with the same options. */
export function growFlitch(options: FlitchOptions): Flitch {
  return { ...sawBoard(options), leafMm: options.leafMm ?? 0.6 };
}

/** The plane of one side of leaf `leaf` (0 is nearest the bark for flat leaves). */
export function leafPlane(
  flitch: Flitch,
  leaf: number,
  slip: LeafSlip = { alongMm: 0, acrossMm: 0 },
  side: LeafSide = "bark",
): Plane {
  const below = deeper(flitch.plane, leaf * flitch.leafMm);
  const bark: Plane = { ...below, origin: pointOn(below, slip.alongMm, slip.acrossMm) };
  return side === "bark" ? bark : turned(bark, flitch.leafMm, flitch.widthMm);
}

/** The face of a leaf, square on and to scale. */
export function leafFace(flitch: Flitch, leaf: number, pxPerMm: number, slip?: LeafSlip, side?: LeafSide): FacePicture {
  return planeFace(flitch.log, leafPlane(flitch, leaf, slip, side), flitch, pxPerMm);
}
