/**
 * How alike two edges look, from sums of whole numbers. A profile is the grey of every grid row along an edge, added up over the
 * outermost cells of the piece; a and b are the profiles of the two edges of a seam, in one direction along it, n rows each.
 *
 *   spread(a) = n·Σa² − (Σa)²                                          (n² times the variance)
 *   correlation(a, b) = (n·Σab − Σa·Σb) / √(spread(a)·spread(b))       (−1 … 1)
 *   match = correlation at lag 0
 *   step = the lag l, at most 8 mm and a quarter of the seam either way, at which a[k] and b[k + l] correlate best over the rows
 *          that both have; of equal ones the shorter lag, of l and −l the negative.
 *
 * Every sum and spread is a whole number below 2⁵³ (grey sums ≤ 2040, n ≤ 40,000 rows), so each formula has one result, however the
 * sums were found.
 *
 * "Cannot tell": an edge whose grey varies by less than 2 levels (standard deviation) shows no figure that could run on, and a
 * best correlation below 0.5 is no figure found again. Neither counts as good: such a seam adds nothing to a place's match or step.
 */

/** Depth of an edge's profile: 4 mm, as in the reading of seams (engine §6). */
export const DEPTH_CELLS = 8;
/** Seams below 20 mm have no profile to speak of. Our own choice. */
export const LEAST_ROWS = 40;
/** Farthest a figure is looked for along the seam: 8 mm (engine §6). */
export const MOST_LAG = 16;
/** Least standard deviation of an edge's grey, in levels of 255: about the noise of a photograph. Our own choice. */
export const FLAT_GREY = 2;
/** Least best correlation that a step is believed of. Our own choice. */
export const LEAST_PEAK = 0.5;

export function spreadOf(n: number, sum: number, squares: number): number {
  return n * squares - sum * sum;
}

/** Spreads below this are flat, for a profile added up over `depth` cells. */
export function flatBelow(n: number, depth: number, grey: number = FLAT_GREY): number {
  const least = grey * n * depth;
  return least * least;
}

/** Farthest lag for a seam of so many rows. */
export function mostLag(rows: number): number {
  return Math.min(MOST_LAG, Math.floor(rows / 4));
}

/** Lags in order of choice: 0, −1, 1, −2, 2, … */
export function lagAt(rank: number): number {
  return rank % 2 === 1 ? -(rank + 1) / 2 : rank / 2;
}

/** What a seam's match adds to the mean, 0..1; NaN (cannot tell) adds nothing. */
export function matchValue(match: number): number {
  return match > 0 ? Math.min(1, match) : 0;
}

/** What a seam's step adds to the mean: 1 for none, 0 for 8 mm, and nothing where it cannot be told. */
export function stepValue(match: number, peak: number, lag: number): number {
  return Number.isNaN(match) || !(peak >= LEAST_PEAK) ? 0 : 1 - Math.abs(lag) / MOST_LAG;
}
