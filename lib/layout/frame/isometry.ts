/**
 * Maps between frames that keep lengths: `stockFromFace` takes a point of the face to the point of the wood it is cut from.
 *
 *   x' = a·x + c·y + tx
 *   y' = b·x + d·y + ty         (a, b), (c, d) orthonormal; tx, ty in µm
 *
 * A turned leaf has determinant −1. Quarter turns hold exact 0 and ±1, so patterns on solid stock stay in whole micrometres.
 */
export interface Isometry {
  readonly a: number;
  readonly b: number;
  readonly c: number;
  readonly d: number;
  readonly tx: number;
  readonly ty: number;
}

export const identity: Isometry = { a: 1, b: 0, c: 0, d: 1, tx: 0, ty: 0 };
