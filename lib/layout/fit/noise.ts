/**
 * Arithmetic noise, and only that. Trade tolerances (how much a saw may stray, how near a knot is too near) are the shop's
 * settings and do not belong here: a piece that touches an outline, an area or its neighbour's loss fits, a piece one
 * micrometre over does not.
 */

/**
 * What a computed coordinate may be off, in µm. Boards are below 1e7 µm, a double keeps 16 digits, and no chain of operations
 * in this room loses more than 6 of them.
 */
export const NOISE_UM = 1e-3;

/** A depth in whole micrometres: what is below half of one, the grain of every coordinate, counts as touching. */
export function wholeDepth(depth: number): number {
  return Math.max(0, Math.round(depth - NOISE_UM));
}
