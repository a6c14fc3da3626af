/**
 * The figure as it arrives at an edge: luminance along the edge, averaged over the first few millimetres of wood along the local
 * direction of the grain, so that lines which meet the edge askew stay sharp and are read where they reach it.
 */
import { type CellTensor, cellTensor, type Grey } from "./cell-tensor";
import { SAMPLE_MM } from "./edge-patch";
import { CELL_MM, SMOOTHED_MM } from "./grain-field";
import { coherenceOf, lineDirection, type Tensor, tensorSum } from "./structure-tensor";

/** Depth of wood that a profile is the mean of. */
export const PROFILE_MM = 4;
/** Depth of wood that the direction is taken from: a cell of the grain field and what its smoothing takes at both ends. */
export const DIRECTION_MM = CELL_MM + SMOOTHED_MM;
/** Lines that lie flatter to the edge than this are not followed: 4 mm in, they would come from 7 mm along. */
const FLATTEST_FOLLOWED = Math.tan((60 * Math.PI) / 180);
/**
 * Share of the whole edge's direction in every cell's: where a cell holds next to no contrast, its neighbours know better. A tenth
 * hardly turns a cell of ordinary contrast.
 */
const SHARE_OF_WHOLE = 0.1;

export interface EdgeProfile {
  /** One value a sample of the edge. */
  readonly light: Float64Array;
  /** Direction of the grain over the whole edge, in (−π/2, π/2]: 0 straight into the piece, ±π/2 along the edge. */
  readonly direction: number;
  readonly coherence: number;
}

/** The profile of a patch `DIRECTION_MM` deep. */
export function edgeProfile(patch: Grey): EdgeProfile {
  const cells = tensorsAlong(halved(patch));
  const tensors = cells.map(({ tensor }) => tensor);
  const whole = tensorSum(tensors);
  const noise = tensorSum(cells.map((cell) => cell.noise));
  const slopes = slopesOf(tensors, whole);
  const depth = Math.min(patch.width, Math.round(PROFILE_MM / SAMPLE_MM));
  const light = new Float64Array(patch.height);
  for (let k = 0; k < patch.height; k++) {
    const slope = between(slopes, ((k + 0.5) * slopes.length) / patch.height - 0.5, 0, 1, slopes.length);
    let sum = 0;
    for (let i = 0; i < depth; i++) sum += between(patch.light, k + slope * (i + 0.5), i, patch.width, patch.height);
    light[k] = sum / depth;
  }
  return { light, direction: lineDirection(whole), coherence: coherenceOf(whole, noise) };
}

/** The tensors of even cells along the edge, each about `CELL_MM` long and as deep as the patch. */
function tensorsAlong(grey: Grey): CellTensor[] {
  const count = Math.max(1, Math.round((grey.height * 2 * SAMPLE_MM) / CELL_MM));
  const edge = (i: number) => Math.round((i * grey.height) / count);
  const reach = Math.round(SMOOTHED_MM / (4 * SAMPLE_MM));
  return Array.from({ length: count }, (_, i) =>
    cellTensor(grey, { fromX: 0, toX: grey.width, fromY: edge(i), toY: edge(i + 1) }, reach),
  );
}

/** How far along the edge a line wanders a step into the piece, cell by cell, smoothed over neighbours with weights 1, 2, 1. */
function slopesOf(tensors: readonly Tensor[], whole: Tensor): number[] {
  const share = SHARE_OF_WHOLE / tensors.length;
  return tensors.map((tensor, i) => {
    const near = tensorSum([tensors[i - 1] ?? tensor, tensor, tensor, tensors[i + 1] ?? tensor]);
    const held = { xx: near.xx / 4 + share * whole.xx, yy: near.yy / 4 + share * whole.yy, xy: near.xy / 4 + share * whole.xy };
    return Math.max(-FLATTEST_FOLLOWED, Math.min(FLATTEST_FOLLOWED, Math.tan(lineDirection(held))));
  });
}

/** Mean of squares of four: the scale at which direction is read (`GRAIN_PX_PER_MM`). */
function halved({ light, width, height }: Grey): Grey {
  const half = { width: Math.floor(width / 2), height: Math.floor(height / 2) };
  const mean = new Float32Array(half.width * half.height);
  for (let y = 0; y < 2 * half.height; y++) {
    for (let x = 0; x < 2 * half.width; x++) {
      const at = (y >> 1) * half.width + (x >> 1);
      mean[at] = (mean[at] as number) + (light[y * width + x] as number) / 4;
    }
  }
  return { light: mean, ...half };
}

/** The value between two neighbours of `count` numbers `stride` apart; the first and last go on beyond them. */
function between(values: ArrayLike<number>, at: number, start: number, stride: number, count: number): number {
  const held = Math.max(0, Math.min(count - 1, at));
  const below = Math.min(Math.max(0, count - 2), Math.floor(held));
  const low = values[start + below * stride] as number;
  return count === 1 ? low : low + ((values[start + (below + 1) * stride] as number) - low) * (held - below);
}
