/**
 * How a lens bends straight lines, as one radial term, there and back. Finding the term from marks is `fit-lens.ts`.
 *
 *   flat = c + (p − c)·(1 + k1·|p − c|² / norm²)      c: picture centre, norm: half the diagonal, so the corner has radius 1
 *
 * "Flat" photo points are those a lens without bending would have given; homographies hold between them and the wood.
 */
import type { PhotoPoint } from "./homography";

export interface Lens {
  readonly k1: number;
  readonly centre: PhotoPoint;
  /** px */
  readonly norm: number;
}

/** Size of an upright photo, px. */
export interface PhotoSize {
  readonly width: number;
  readonly height: number;
}

/** Above −1/3 the radius grows all the way to the corner of the picture; the margin keeps the way back well conditioned. */
export const STRONGEST_K1 = 0.25;

export function lensOf(photo: PhotoSize, k1: number): Lens {
  return { k1, centre: { x: photo.width / 2, y: photo.height / 2 }, norm: Math.hypot(photo.width, photo.height) / 2 };
}

/** Where the point would lie had the lens not bent it. */
export function flatFromPhoto(lens: Lens, p: PhotoPoint): PhotoPoint {
  const x = p.x - lens.centre.x;
  const y = p.y - lens.centre.y;
  const factor = 1 + (lens.k1 * (x * x + y * y)) / (lens.norm * lens.norm);
  return { x: lens.centre.x + x * factor, y: lens.centre.y + y * factor };
}

/** Where the lens put a flat point. Right for flat points that come from within the picture; held at the turning radius beyond it. */
export function photoFromFlat(lens: Lens, flat: PhotoPoint): PhotoPoint {
  const x = flat.x - lens.centre.x;
  const y = flat.y - lens.centre.y;
  const factor = shrinkAt(lens.k1, (x * x + y * y) / (lens.norm * lens.norm));
  return { x: lens.centre.x + x * factor, y: lens.centre.y + y * factor };
}

/**
 * (photo radius) / (flat radius) for a flat radius squared, both in units of `norm`: solves r·(1 + k1·r²) = R for r by Newton's
 * steps. For k1 < 0 the radius grows only up to r = 1/√(−3·k1); beyond what that reaches the answer is held there.
 */
export function shrinkAt(k1: number, flatRadiusSquared: number): number {
  if (k1 === 0 || flatRadiusSquared === 0) return 1;
  const target = Math.sqrt(flatRadiusSquared);
  if (k1 < 0) {
    const turning = 1 / Math.sqrt(-3 * k1);
    if (target >= (turning * 2) / 3) return turning / target;
  }
  // For k1 > 0 the curve is convex and R lies above the root; for k1 < 0 it is concave and R below it: Newton closes in from one side.
  let r = target;
  for (let step = 0; step < 60; step++) {
    const change = (r * (1 + k1 * r * r) - target) / (1 + 3 * k1 * r * r);
    r -= change;
    if (Math.abs(change) <= 1e-15 * target) break;
  }
  return r / target;
}
