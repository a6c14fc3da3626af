/** Sums over upright rectangles of a grid of numbers, each in four look-ups (summed-area table). */

export interface Sums {
  readonly width: number;
  readonly height: number;
  /** One row and column more than the grid: entry (x, y) is the sum of all numbers left of x and above y. */
  readonly table: Float64Array;
}

export function sumsOf(values: Float32Array, width: number, height: number): Sums {
  const table = new Float64Array((width + 1) * (height + 1));
  for (let y = 0; y < height; y++) {
    let row = 0;
    const above = y * (width + 1) + 1;
    for (let x = 0; x < width; x++) {
      row += values[y * width + x] as number;
      table[above + width + 1 + x] = (table[above + x] as number) + row;
    }
  }
  return { width, height, table };
}

/** Mean over the cells from (left, top) up to but not including (right, bottom), rounded and cut to the grid; null where none is left. */
export function meanOver(
  { width, height, table }: Sums,
  left: number,
  top: number,
  right: number,
  bottom: number,
): number | null {
  const x0 = Math.max(0, Math.min(width, Math.round(left)));
  const x1 = Math.max(0, Math.min(width, Math.round(right)));
  const y0 = Math.max(0, Math.min(height, Math.round(top)));
  const y1 = Math.max(0, Math.min(height, Math.round(bottom)));
  const count = (x1 - x0) * (y1 - y0);
  if (count <= 0 || x1 < x0) return null;
  const at = (x: number, y: number) => table[y * (width + 1) + x] as number;
  return (at(x1, y1) - at(x0, y1) - at(x1, y0) + at(x0, y0)) / count;
}
