/**
 * Small dense least squares by Householder reflections. Made for a handful of unknowns (a homography has 8); not for large systems.
 */

/** Below this share of the largest diagonal entry a column adds nothing that double precision can tell from noise. */
const RANK_TOLERANCE = 1e-11;

/**
 * The x that makes |A·x − b| least, or null where A has no full column rank. `rows` are the rows of A, each as long as the
 * unknowns; exact (to rounding) where there are as many rows as unknowns. Golub & Van Loan, Matrix Computations, 5.2 and 5.3.
 */
export function leastSquares(rows: readonly (readonly number[])[], rightSide: readonly number[]): number[] | null {
  const unknowns = rows[0]?.length ?? 0;
  if (unknowns === 0 || rows.length < unknowns) return null;
  const width = unknowns + 1;
  const work = rows.map((row, i) => Float64Array.from([...row, rightSide[i] ?? 0]));

  const diagonal = new Float64Array(unknowns);
  for (let k = 0; k < unknowns; k++) {
    diagonal[k] = reflect(work, k, width);
  }
  const largest = diagonal.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  if (!(largest > 0) || diagonal.some((value) => Math.abs(value) <= largest * RANK_TOLERANCE)) return null;

  const solution = new Array<number>(unknowns).fill(0);
  for (let k = unknowns - 1; k >= 0; k--) {
    const row = work[k] as Float64Array;
    let sum = row[unknowns] as number;
    for (let j = k + 1; j < unknowns; j++) sum -= (row[j] as number) * (solution[j] as number);
    solution[k] = sum / (diagonal[k] as number);
  }
  return solution;
}

/** Clears column k below the diagonal in every later column; returns the new diagonal entry. */
function reflect(work: readonly Float64Array[], k: number, width: number): number {
  let squares = 0;
  for (let i = k; i < work.length; i++) squares += at(work, i, k) ** 2;
  const norm = Math.sqrt(squares);
  if (norm === 0) return 0;
  const pivot = at(work, k, k);
  const diagonal = pivot > 0 ? -norm : norm;
  // v = column − diagonal·e_k; the sign keeps the first entry from cancelling.
  const v = Float64Array.from(work, (row, i) => (i < k ? 0 : i === k ? pivot - diagonal : (row[k] as number)));
  const vv = 2 * (squares - diagonal * pivot);
  for (let j = k; j < width; j++) {
    let dot = 0;
    for (let i = k; i < work.length; i++) dot += (v[i] as number) * at(work, i, j);
    const factor = (2 * dot) / vv;
    for (let i = k; i < work.length; i++) {
      const row = work[i] as Float64Array;
      row[j] = (row[j] as number) - factor * (v[i] as number);
    }
  }
  return diagonal;
}

function at(work: readonly Float64Array[], i: number, j: number): number {
  return (work[i] as Float64Array)[j] as number;
}
