/**
 * The figure as it arrives at an edge: luminance along the edge, averaged over the first few millimetres of wood along the local
 * direction of the grain, so that lines which meet the edge askew stay sharp and are read where they reach it.
 */
import { type EdgePatch, SAMPLE_MM } from "./edge-patch";
import { coherenceOf, lineDirection, type Tensor } from "./structure-tensor";

/** Depth of wood that a profile is the mean of. */
export const PROFILE_MM = 4;
/** Direction is taken over this much wood, along the edge and into the piece: the cell of the grain field. */
export const CELL_MM = 10;
/** Lines that lie flatter to the edge than this are not followed: 4 mm in, they would come from 7 mm along. */
const FLATTEST_FOLLOWED = Math.tan((60 * Math.PI) / 180);
/**
 * Share of the whole edge's direction in every cell's: where a cell holds next to no contrast, its neighbours know better. A tenth
 * hardly turns a cell of ordinary contrast.
 */
const SHARE_OF_WHOLE = 0.1;

/** The tensor of every cell along a patch, each with x along the edge and y into the piece. */
export function tensorsAlong(patch: EdgePatch): Tensor[] {
  const { light, columns, rows } = patch;
  const cellColumns = CELL_MM / SAMPLE_MM;
  const cells = Math.max(1, Math.round(columns / cellColumns));
  const sums = Array.from({ length: cells }, () => ({ xx: 0, yy: 0, xy: 0 }));
  for (let j = 1; j < rows - 1; j++) {
    for (let k = 1; k < columns - 1; k++) {
      const at = j * columns + k;
      const value = (offset: number) => light[at + offset] as number;
      // Scharr's 3 × 3 weights (3, 10, 3) favour no direction; the factor is common to both and drops out.
      const dx =
        3 * (value(1 - columns) - value(-1 - columns)) +
        10 * (value(1) - value(-1)) +
        3 * (value(1 + columns) - value(-1 + columns));
      const dy =
        3 * (value(columns - 1) - value(-columns - 1)) +
        10 * (value(columns) - value(-columns)) +
        3 * (value(columns + 1) - value(1 - columns));
      const sum = sums[Math.min(cells - 1, Math.floor((k * cells) / columns))] as { xx: number; yy: number; xy: number };
      sum.xx += dx * dx;
      sum.yy += dy * dy;
      sum.xy += dx * dy;
    }
  }
  return sums;
}

/** Sum of tensors. */
export function tensorSum(tensors: readonly Tensor[]): Tensor {
  return tensors.reduce((sum, { xx, yy, xy }) => ({ xx: sum.xx + xx, yy: sum.yy + yy, xy: sum.xy + xy }), {
    xx: 0,
    yy: 0,
    xy: 0,
  });
}

export interface EdgeProfile {
  readonly light: Float64Array;
  /** Direction of the grain against the edge over its whole length: 0 along the edge, ±π/2 square to it. */
  readonly direction: number;
  readonly coherence: number;
}

/** The profile of a patch that is at least `PROFILE_MM` deep. One value a sample of the edge. */
export function edgeProfile(patch: EdgePatch): EdgeProfile {
  const tensors = tensorsAlong(patch);
  const whole = tensorSum(tensors);
  const slopes = slopesOf(tensors, whole);
  const depth = Math.min(patch.rows, Math.round(PROFILE_MM / SAMPLE_MM));
  const light = new Float64Array(patch.columns);
  for (let k = 0; k < patch.columns; k++) {
    const slope = between(slopes, ((k + 0.5) * slopes.length) / patch.columns - 0.5);
    let sum = 0;
    for (let j = 0; j < depth; j++) sum += between(patch.light, k + slope * (j + 0.5), j * patch.columns, patch.columns);
    light[k] = sum / depth;
  }
  return { light, direction: lineDirection(whole), coherence: coherenceOf(whole) };
}

/** How far along the edge a line wanders a step into the piece, cell by cell, smoothed over neighbours with weights 1, 2, 1. */
function slopesOf(tensors: readonly Tensor[], whole: Tensor): number[] {
  const share = SHARE_OF_WHOLE / tensors.length;
  return tensors.map((tensor, i) => {
    const near = tensorSum([tensors[i - 1] ?? tensor, tensor, tensor, tensors[i + 1] ?? tensor]);
    const held = { xx: near.xx / 4 + share * whole.xx, yy: near.yy / 4 + share * whole.yy, xy: near.xy / 4 + share * whole.xy };
    const slope = 1 / Math.tan(lineDirection(held));
    return Math.max(-FLATTEST_FOLLOWED, Math.min(FLATTEST_FOLLOWED, slope));
  });
}

/** The value between two neighbours of a run of numbers; the first and last go on beyond it. */
function between(values: ArrayLike<number>, at: number, start = 0, count = values.length): number {
  const held = Math.max(0, Math.min(count - 1, at));
  const below = Math.min(count - 2, Math.floor(held));
  if (below < 0) return values[start] as number;
  const low = values[start + below] as number;
  return low + ((values[start + below + 1] as number) - low) * (held - below);
}
