/** Running sums of a strip of wood: what any stretch of it adds up to, and its squares, is one subtraction. Whole numbers. */

export interface PrefixSums {
  /** Grey of each row. */
  readonly grey: Int32Array;
  /** `sum[y]`: of the rows before y. */
  readonly sum: Float64Array;
  readonly squares: Float64Array;
}

export function prefixSums(height: number): PrefixSums {
  return { grey: new Int32Array(height), sum: new Float64Array(height + 1), squares: new Float64Array(height + 1) };
}

/** Adds up what `grey` holds by now. */
export function addUp({ grey, sum, squares }: PrefixSums): void {
  let [total, square] = [0, 0];
  for (let y = 0; y < grey.length; y++) {
    const value = grey[y] as number;
    total += value;
    square += value * value;
    sum[y + 1] = total;
    squares[y + 1] = square;
  }
}

/** Sum over the rows from `start` to before `end`. */
export function between(sums: Float64Array, start: number, end: number): number {
  return (sums[end] as number) - (sums[start] as number);
}
