/** What a column of places finds out about one seam, place by place, and the working space for it. */
import { lagAt } from "./correlation";

/** Rows of places in one column that are looked at, in order. */
export interface PickedRows {
  count: number;
  readonly rows: Int32Array;
}

/** By index into the picked rows. */
export interface SeamReadings {
  /** Correlation at lag 0; NaN where it cannot be told. */
  readonly match: Float64Array;
  /** Best correlation; −1 before any. */
  readonly peak: Float64Array;
  /** Its place in the order of lags. */
  readonly rank: Int32Array;
}

export function seamReadings(most: number): SeamReadings {
  return { match: new Float64Array(most), peak: new Float64Array(most), rank: new Int32Array(most) };
}

export function clearReadings({ match, peak, rank }: SeamReadings, count: number): void {
  match.fill(Number.NaN, 0, count);
  peak.fill(-1, 0, count);
  rank.fill(0, 0, count);
}

/** Whether a lag is sure to be no better than what is known: against the run of the figure, where something runs with it. */
export function cannotBeat({ peak }: SeamReadings, index: number, lagRank: number, covariance: number): boolean {
  return lagRank > 0 && covariance <= 0 && (peak[index] as number) > 0;
}

/** Well above what squares and roots are off by. */
const SURELY = 1 - 1e-9;

/**
 * Takes in the correlation at one lag, `covariance / √spreads`: the highest stays, of equal ones the first in the order of lags. Most lags
 * are far below the best, and their squares say so without a root.
 */
export function takeIn(
  { match, peak, rank }: SeamReadings,
  index: number,
  lagRank: number,
  covariance: number,
  spreads: number,
): void {
  const best = peak[index] as number;
  if (lagRank > 0 && best > 0 && covariance * covariance < best * best * spreads * SURELY) return;
  const correlation = covariance / Math.sqrt(spreads);
  if (lagRank === 0) match[index] = correlation;
  if (correlation > best || (correlation === best && lagRank < (rank[index] as number))) {
    peak[index] = correlation;
    rank[index] = lagRank;
  }
}

/** The step in cells, in the seam's own direction. */
export function lagOf({ rank }: SeamReadings, index: number): number {
  return lagAt(rank[index] as number);
}
