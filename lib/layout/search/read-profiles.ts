/** Two profiles compared by themselves, row by row: for a seam that is looked at once, or whose edges both come from places of their own. */
import { flatBelow, lagAt, mostLag, spreadOf } from "./correlation";
import { addUp, between, type PrefixSums, prefixSums } from "./prefix-sums";
import { clearReadings, type SeamReadings, seamReadings, takeIn } from "./seam-readings";

export interface Profile {
  /** Grey of each row added up, in the seam's own direction. */
  readonly grey: Int32Array;
  readonly depth: number;
}

/** Readings of one seam, at index 0. */
export function readProfiles(a: Profile, b: Profile): SeamReadings {
  const readings = seamReadings(1);
  clearReadings(readings, 1);
  const [first, second] = [summed(a), summed(b)];
  for (let rank = 0; rank <= 2 * mostLag(a.grey.length); rank++) {
    const lag = lagAt(rank);
    const n = a.grey.length - Math.abs(lag);
    const [p, q] = [Math.max(0, -lag), Math.max(0, lag)];
    const [covariance, spreadA, spreadB] = covarianceOf(first, p, second, q, n);
    if (spreadA >= flatBelow(n, a.depth) && spreadB >= flatBelow(n, b.depth))
      takeIn(readings, 0, rank, covariance, spreadA * spreadB);
  }
  return readings;
}

export function summed({ grey }: Profile): PrefixSums {
  const sums = { ...prefixSums(grey.length), grey };
  addUp(sums);
  return sums;
}

/** n² times the covariance of n rows of a from p on and of b from q on, and n² times their variances. Whole numbers. */
export function covarianceOf(a: PrefixSums, p: number, b: PrefixSums, q: number, n: number): readonly [number, number, number] {
  const sumA = between(a.sum, p, p + n);
  const sumB = between(b.sum, q, q + n);
  const spreadA = spreadOf(n, sumA, between(a.squares, p, p + n));
  const spreadB = spreadOf(n, sumB, between(b.squares, q, q + n));
  let products = 0;
  for (let k = 0; k < n; k++) products += (a.grey[p + k] as number) * (b.grey[q + k] as number);
  return [n * products - sumA * sumB, spreadA, spreadB];
}

/** The match of those rows, 0..1; 0 where it cannot be told. */
export function matchOf(
  a: PrefixSums,
  p: number,
  b: PrefixSums,
  q: number,
  n: number,
  depths: readonly [number, number],
): number {
  const [covariance, spreadA, spreadB] = covarianceOf(a, p, b, q, n);
  if (covariance <= 0 || spreadA < flatBelow(n, depths[0]) || spreadB < flatBelow(n, depths[1])) return 0;
  return Math.min(1, covariance / Math.sqrt(spreadA * spreadB));
}
