/**
 * The structure tensor of one cell of a grey picture whose grain is expected to run about along x.
 *
 * Marks of saw and planer run across the grain and outshout it on wood fresh from the machine, so the picture is first averaged over
 * a few millimetres of grain. Averaging along x alone would draw short strokes, such as pores, towards x; so the direction that this
 * gives is the one that the second and final look averages along.
 */
import { lineDirection, type Tensor } from "./structure-tensor";

export interface Grey {
  /** 0…255, row by row. */
  readonly light: Float32Array;
  readonly width: number;
  readonly height: number;
}

/** Whole pixels of a picture, `to` not included. */
export interface Cell {
  readonly fromX: number;
  readonly toX: number;
  readonly fromY: number;
  readonly toY: number;
}

/** Lines steeper against x than this are not followed: a few millimetres of them cross more of the picture than a cell. */
const STEEPEST = Math.tan(Math.PI / 3);

export interface CellTensor {
  readonly tensor: Tensor;
  /** What white noise would have given, up to a factor: averaging makes lines of it. */
  readonly noise: Tensor;
}

/** Gradients' outer products, summed. `reach`: pixels to either side along x that one smoothed pixel is averaged over. */
export function cellTensor(grey: Grey, cell: Cell, reach: number): CellTensor {
  const first = tensorAlong(grey, cell, reach, 0);
  const slope = Math.tan(lineDirection(first));
  if (Math.abs(slope) > STEEPEST) return { tensor: first, noise: noiseAlong(reach, 0) };
  return { tensor: tensorAlong(grey, cell, reach, slope), noise: noiseAlong(reach, slope) };
}

const noiseBySlope = new Map<string, Tensor>();

/** White noise has no two pixels alike, so its mean tensor is that of a single bright pixel. Slopes to a sixteenth. */
function noiseAlong(reach: number, slope: number): Tensor {
  const step = Math.round(slope * 16);
  const key = `${reach} ${step}`;
  const known = noiseBySlope.get(key);
  if (known !== undefined) return known;
  const side = 2 * Math.ceil(reach * (1 + STEEPEST)) + 9;
  const light = new Float32Array(side * side);
  light[(side * side - 1) / 2] = 1;
  const noise = tensorAlong({ light, width: side, height: side }, { fromX: 0, toX: side, fromY: 0, toY: side }, reach, step / 16);
  noiseBySlope.set(key, noise);
  return noise;
}

/** The tensor after averaging along lines that sink by `slope` for every pixel to the right. */
function tensorAlong({ light, width, height }: Grey, cell: Cell, reach: number, slope: number): Tensor {
  // Where smoothing would leave the picture nothing is known; a picture too narrow for it is not smoothed.
  const half = width > 2 * reach + 2 ? reach : 0;
  const fromX = Math.max(cell.fromX, half + 1);
  const toX = Math.min(cell.toX, width - half - 1);
  const fromY = Math.max(cell.fromY, 1);
  const toY = Math.min(cell.toY, height - 1);
  const count = toX - fromX + 2;
  const smoothed = [0, 1, 2].map(() => new Float32Array(Math.max(0, count)));
  let xx = 0;
  let yy = 0;
  let xy = 0;
  for (let y = fromY - 1; y <= toY; y++) {
    const below = smoothed[(y + 1) % 3] as Float32Array;
    smoothRow({ light, width, height }, fromX - 1, y, half, slope, below);
    if (y < fromY + 1) continue;
    const above = smoothed[(y + 2) % 3] as Float32Array;
    const here = smoothed[y % 3] as Float32Array;
    for (let i = 1; i < count - 1; i++) {
      const nw = above[i - 1] as number;
      const ne = above[i + 1] as number;
      const sw = below[i - 1] as number;
      const se = below[i + 1] as number;
      // Scharr's weights (3, 10, 3) favour no direction; their factor drops out.
      const dx = 3 * (ne - nw + se - sw) + 10 * ((here[i + 1] as number) - (here[i - 1] as number));
      const dy = 3 * (sw - nw + se - ne) + 10 * ((below[i] as number) - (above[i] as number));
      xx += dx * dx;
      yy += dy * dy;
      xy += dx * dy;
    }
  }
  return { xx, yy, xy };
}

/** Sums along the slope, one a pixel of row `y` from column `fromX` on; rows beyond the picture are its first and last. */
function smoothRow(
  { light, width, height }: Grey,
  fromX: number,
  y: number,
  half: number,
  slope: number,
  sums: Float32Array,
): void {
  sums.fill(0);
  for (let step = -half; step <= half; step++) {
    const at = Math.min(height - 1, Math.max(0, y + step * slope));
    const row = Math.min(Math.max(height - 2, 0), Math.floor(at));
    const share = at - row;
    const upper = row * width + fromX + step;
    const lower = height > 1 ? upper + width : upper;
    for (let i = 0; i < sums.length; i++) {
      sums[i] = (sums[i] as number) + (light[upper + i] as number) * (1 - share) + (light[lower + i] as number) * share;
    }
  }
}
