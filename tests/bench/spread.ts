/** Middle values of measured numbers. */
import type { Spread } from "./row";

/** The value below which this share of the numbers lies, between neighbours in proportion. */
export function quantile(numbers: readonly number[], share: number): number {
  const sorted = [...numbers].sort((a, b) => a - b);
  if (sorted.length === 0) throw new RangeError("nothing was measured");
  const place = (sorted.length - 1) * share;
  const below = sorted[Math.floor(place)] as number;
  const above = sorted[Math.ceil(place)] as number;
  return below + (above - below) * (place - Math.floor(place));
}

export const median = (numbers: readonly number[]): number => quantile(numbers, 0.5);

export const spreadOf = (numbers: readonly number[]): Spread => ({
  median: median(numbers),
  low: quantile(numbers, 0.25),
  high: quantile(numbers, 0.75),
});
