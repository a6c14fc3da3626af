/**
 * One seam to a neighbour that stays, at every picked place of a column. The still profile does not move with the place, so places and
 * lags with one difference share their products: those are added up once for each difference.
 */
import { flatBelow, lagAt, mostLag, spreadOf } from "./correlation";
import { addUp, between, type PrefixSums, prefixSums } from "./prefix-sums";
import type { FixedSeam } from "./seam-plan";
import { cannotBeat, clearReadings, type PickedRows, type SeamReadings, takeIn } from "./seam-readings";
import { readStrip, type WoodSums } from "./wood-sums";

export interface FixedSeamScratch {
  readonly moving: PrefixSums;
  /** For one difference; indexed by rows of the still profile. */
  readonly products: Float64Array;
  /** Index of a row of places among the picked ones, −1 where it is not picked. */
  readonly indexOf: Int32Array;
}

export function fixedSeamScratch(height: number): FixedSeamScratch {
  return { moving: prefixSums(height), products: new Float64Array(height + 1), indexOf: new Int32Array(height + 1) };
}

/** The sums of a still profile, made once for a search. */
export function stillSums({ still }: FixedSeam): PrefixSums {
  const sums = { ...prefixSums(still.length), grey: still };
  addUp(sums);
  return sums;
}

export function readFixedSeam(
  seam: FixedSeam,
  still: PrefixSums,
  wood: WoodSums,
  column: number,
  picked: PickedRows,
  { steps, readings, scratch }: { readonly steps: boolean; readonly readings: SeamReadings; readonly scratch: FixedSeamScratch },
): void {
  clearReadings(readings, picked.count);
  readStrip(wood, column + seam.moving.column, seam.moving.depth, scratch.moving.grey);
  addUp(scratch.moving);
  scratch.indexOf.fill(-1);
  for (let index = 0; index < picked.count; index++) scratch.indexOf[picked.rows[index] as number] = index;

  const lags = steps ? mostLag(seam.rows) : 0;
  // A lag in the seam's own direction, from a to b, is one of this sign from the moving edge to the still one, down the board.
  const sign = (seam.moves === "a") === seam.moving.reversed ? -1 : 1;
  const [first, last] = [picked.rows[0] as number, picked.rows[picked.count - 1] as number];
  for (let difference = first - lags; difference <= last + lags; difference++) {
    addProducts(seam, still, scratch, difference);
    for (let rank = 0; rank <= 2 * lags; rank++) {
      const lag = sign * lagAt(rank);
      const row = difference + lag;
      const index = row < 0 ? -1 : (scratch.indexOf[row] ?? -1);
      if (index >= 0) readAt(seam, still, { row, lag, rank, index }, readings, scratch);
    }
  }
}

interface At {
  readonly row: number;
  readonly lag: number;
  readonly rank: number;
  readonly index: number;
}

/** With k along the seam down the board: the moving edge's row k against the still one's row k + lag. */
function readAt(seam: FixedSeam, still: PrefixSums, at: At, readings: SeamReadings, scratch: FixedSeamScratch): void {
  const n = seam.rows - Math.abs(at.lag);
  const p = at.row + seam.moving.row + Math.max(0, -at.lag);
  const u = Math.max(0, at.lag);
  const sumA = between(scratch.moving.sum, p, p + n);
  const sumB = between(still.sum, u, u + n);
  const covariance = n * between(scratch.products, u, u + n) - sumA * sumB;
  if (cannotBeat(readings, at.index, at.rank, covariance)) return;
  const spreadA = spreadOf(n, sumA, between(scratch.moving.squares, p, p + n));
  const spreadB = spreadOf(n, sumB, between(still.squares, u, u + n));
  if (spreadA < flatBelow(n, seam.moving.depth) || spreadB < flatBelow(n, seam.stillDepth)) return;
  takeIn(readings, at.index, at.rank, covariance, spreadA * spreadB);
}

/** Beyond the picture there is nothing to add; no picked place asks for it. */
function addProducts(seam: FixedSeam, still: PrefixSums, { moving, products }: FixedSeamScratch, difference: number): void {
  const shift = difference + seam.moving.row;
  let total = 0;
  for (let u = 0; u < seam.rows; u++) {
    total += (moving.grey[shift + u] ?? 0) * (still.grey[u] as number);
    products[u + 1] = total;
  }
}
