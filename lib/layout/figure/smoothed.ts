/** Smooths a grid of numbers over squares. */

/** Every number replaced by the mean of the square of 2·reach + 1 cells round it, cut at the rim, twice over: weights like a tent. */
export function smoothed(values: Float32Array, width: number, height: number, reach: number): Float32Array {
  const once = alongColumns(alongRows(values, width, height, reach), width, height, reach);
  return alongColumns(alongRows(once, width, height, reach), width, height, reach);
}

function alongRows(values: Float32Array, width: number, height: number, reach: number): Float32Array {
  const means = new Float32Array(values.length);
  for (let y = 0; y < height; y++) {
    const start = y * width;
    let sum = 0;
    for (let x = 0; x < Math.min(width, reach); x++) sum += values[start + x] as number;
    for (let x = 0; x < width; x++) {
      if (x + reach < width) sum += values[start + x + reach] as number;
      if (x > reach) sum -= values[start + x - reach - 1] as number;
      means[start + x] = sum / (Math.min(width - 1, x + reach) - Math.max(0, x - reach) + 1);
    }
  }
  return means;
}

/** Row by row, so that memory is read in order: one running sum a column. */
function alongColumns(values: Float32Array, width: number, height: number, reach: number): Float32Array {
  const means = new Float32Array(values.length);
  const sums = new Float64Array(width);
  const add = (y: number, sign: number) => {
    for (let x = 0; x < width; x++) sums[x] = (sums[x] as number) + sign * (values[y * width + x] as number);
  };
  for (let y = 0; y < Math.min(height, reach); y++) add(y, 1);
  for (let y = 0; y < height; y++) {
    if (y + reach < height) add(y + reach, 1);
    if (y > reach) add(y - reach - 1, -1);
    const count = Math.min(height - 1, y + reach) - Math.max(0, y - reach) + 1;
    for (let x = 0; x < width; x++) means[y * width + x] = (sums[x] as number) / count;
  }
  return means;
}
