/**
 * One seam between two pieces that move together, at every picked place of a column. Their edges keep their distance, so for each lag
 * the products of the two strips are added up once down the board and every place takes its share by a subtraction.
 */
import { flatBelow, lagAt, mostLag, spreadOf } from "./correlation";
import { addUp, between, type PrefixSums, prefixSums } from "./prefix-sums";
import type { OwnSeam } from "./seam-plan";
import { cannotBeat, clearReadings, type PickedRows, type SeamReadings, takeIn } from "./seam-readings";
import { readStrip, type WoodSums } from "./wood-sums";

export interface OwnSeamScratch {
  readonly first: PrefixSums;
  readonly second: PrefixSums;
  readonly products: Float64Array;
}

export function ownSeamScratch(height: number): OwnSeamScratch {
  return { first: prefixSums(height), second: prefixSums(height), products: new Float64Array(height + 1) };
}

/** `steps`: look at all lags and not only at none. */
export function readOwnSeam(
  seam: OwnSeam,
  wood: WoodSums,
  column: number,
  picked: PickedRows,
  { steps, readings, scratch }: { readonly steps: boolean; readonly readings: SeamReadings; readonly scratch: OwnSeamScratch },
): void {
  clearReadings(readings, picked.count);
  readStrip(wood, column + seam.first.column, seam.first.depth, scratch.first.grey);
  readStrip(wood, column + seam.second.column, seam.second.depth, scratch.second.grey);
  addUp(scratch.first);
  addUp(scratch.second);
  const ranks = steps ? 2 * mostLag(seam.rows) : 0;
  for (let rank = 0; rank <= ranks; rank++) readAtLag(seam, rank, picked, readings, scratch);
}

function readAtLag(seam: OwnSeam, rank: number, picked: PickedRows, readings: SeamReadings, scratch: OwnSeamScratch): void {
  const { first, second, products } = scratch;
  const lag = seam.reversed ? -lagAt(rank) : lagAt(rank);
  const n = seam.rows - Math.abs(lag);
  const firstRow = seam.first.row + Math.max(0, -lag);
  const secondRow = seam.second.row + Math.max(0, lag);
  const [top, bottom] = [picked.rows[0] as number, picked.rows[picked.count - 1] as number];
  addProducts(scratch, top + firstRow, bottom + firstRow + n, secondRow - firstRow);
  const flatFirst = flatBelow(n, seam.first.depth);
  const flatSecond = flatBelow(n, seam.second.depth);
  for (let index = 0; index < picked.count; index++) {
    const row = picked.rows[index] as number;
    const [p, q] = [row + firstRow, row + secondRow];
    const sumA = between(first.sum, p, p + n);
    const sumB = between(second.sum, q, q + n);
    const covariance = n * between(products, p, p + n) - sumA * sumB;
    if (cannotBeat(readings, index, rank, covariance)) continue;
    const spreadA = spreadOf(n, sumA, between(first.squares, p, p + n));
    const spreadB = spreadOf(n, sumB, between(second.squares, q, q + n));
    if (spreadA >= flatFirst && spreadB >= flatSecond) takeIn(readings, index, rank, covariance, spreadA * spreadB);
  }
}

function addProducts({ first, second, products }: OwnSeamScratch, start: number, end: number, shift: number): void {
  const [a, b] = [first.grey, second.grey];
  let total = 0;
  products[start] = 0;
  for (let y = start; y < end; y++) {
    total += (a[y] as number) * (b[y + shift] as number);
    products[y + 1] = total;
  }
}
