/** Normalised cross-correlation of two profiles lag by lag, its best lag to a fraction of a sample, and what chance would reach. */

/** Removes what changes slowly: the profile less its mean over `window` samples round each place, fewer at the ends. */
export function highPassed(profile: Float64Array, window: number): Float64Array {
  const sums = new Float64Array(profile.length + 1);
  for (let i = 0; i < profile.length; i++) sums[i + 1] = (sums[i] as number) + (profile[i] as number);
  const half = Math.floor(window / 2);
  return profile.map((value, i) => {
    const from = Math.max(0, i - half);
    const to = Math.min(profile.length, i + half + 1);
    return value - ((sums[to] as number) - (sums[from] as number)) / (to - from);
  });
}

/** Correlation of a(i) with b(i + lag) over their overlap, for every lag from −reach to reach; 0 where either is even. */
export function correlations(a: Float64Array, b: Float64Array, reach: number): Float64Array {
  return Float64Array.from({ length: 2 * reach + 1 }, (_, i) => correlationAt(a, b, i - reach));
}

function correlationAt(a: Float64Array, b: Float64Array, lag: number): number {
  const from = Math.max(0, -lag);
  const to = Math.min(a.length, b.length - lag);
  let sumA = 0;
  let sumB = 0;
  for (let i = from; i < to; i++) {
    sumA += a[i] as number;
    sumB += b[i + lag] as number;
  }
  const meanA = sumA / (to - from);
  const meanB = sumB / (to - from);
  let ab = 0;
  let aa = 0;
  let bb = 0;
  for (let i = from; i < to; i++) {
    const da = (a[i] as number) - meanA;
    const db = (b[i + lag] as number) - meanB;
    ab += da * db;
    aa += da * da;
    bb += db * db;
  }
  return aa > 0 && bb > 0 ? ab / Math.sqrt(aa * bb) : 0;
}

/** Where the parabola through three neighbouring values peaks, from the middle one, in (−1, 1); 0 where they do not bend down. */
export function vertex(before: number, at: number, after: number): number {
  const bend = before - 2 * at + after;
  return bend < 0 ? (before - after) / (2 * bend) : 0;
}

/**
 * Standard deviation of the correlation of two profiles that have nothing to do with each other but wander as slowly as these do,
 * over `overlap` samples: σ² = Σ ρ_a(k)·ρ_b(k) / n, ρ the profiles' own correlations at lag k (Bartlett, Journal of the Royal Statistical Society Suppl. 8, 1946).
 */
export function chanceDeviation(a: Float64Array, b: Float64Array, reach: number, overlap: number): number {
  let sum = 1;
  for (let lag = 1; lag <= Math.min(reach, overlap - 1); lag++) sum += 2 * ownCorrelation(a, lag) * ownCorrelation(b, lag);
  return Math.sqrt(Math.max(1, sum) / overlap);
}

function ownCorrelation(a: Float64Array, lag: number): number {
  let sum = 0;
  let whole = 0;
  for (let i = 0; i < a.length; i++) {
    const value = a[i] as number;
    whole += value * value;
    if (i + lag < a.length) sum += value * (a[i + lag] as number);
  }
  return whole > 0 ? sum / whole : 0;
}
