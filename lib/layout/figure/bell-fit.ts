/**
 * Fits a bell (a two-dimensional Gaussian) to a hump in a field, by adaptive moments: weight the field with the bell found so far,
 * take centre and spread of what it then weighs, and make a bell of them, until it stays. Weighting a bell with itself halves its spread, so
 * the spread is doubled each time. What lies further off, such as the tails of another hump, has no weight. (Bernstein & Jarvis,
 * "Shapes and shears, stars and smears", Astronomical Journal 123 (2002), use it for the shapes of galaxies.)
 */

export interface Bell {
  readonly x: number;
  readonly y: number;
  /** Spread: mean squares and product of the offsets. */
  readonly xx: number;
  readonly yy: number;
  readonly xy: number;
}

export interface Field {
  /** No negative values. */
  readonly values: Float32Array;
  readonly width: number;
  readonly height: number;
}

/** A dozen rounds bring centre and spread to rest within a tenth of a pixel, save where tails pull for ever; those stay in bounds. */
const ROUNDS = 12;
/** The bell is nil for practical purposes beyond three times its spread. */
const REACH = 3;
/** Bells may not grow longer than this against their width (√0.8 correlation), or rounding would tear them. */
const MOST_CORRELATED = 0.8;

/** From a round bell of spread `start` at a point, all in pixels; spreads are held between `least` and `most`. */
export function bellFit(
  field: Field,
  at: { readonly x: number; readonly y: number },
  start: number,
  least: number,
  most: number,
): Bell {
  let bell: Bell = { ...at, xx: start * start, yy: start * start, xy: 0 };
  const held = (value: number) => Math.max(least * least, Math.min(most * most, value));
  for (let round = 0; round < ROUNDS; round++) {
    const seen = momentsUnder(field, bell);
    if (seen === null) return bell;
    const xx = held(2 * seen.xx);
    const yy = held(2 * seen.yy);
    const bound = Math.sqrt(MOST_CORRELATED * xx * yy);
    bell = { x: seen.x, y: seen.y, xx, yy, xy: Math.max(-bound, Math.min(bound, 2 * seen.xy)) };
  }
  return bell;
}

/** A wide bell needs not every pixel: four samples a spread tell its moments to a thousandth, in a smooth field. */
function stepOf({ xx, yy, xy }: Bell): number {
  const least = (xx + yy) / 2 - Math.hypot((xx - yy) / 2, xy);
  return Math.max(1, Math.floor(Math.sqrt(Math.max(0, least)) / 4));
}

/** Centre and spread of the field under a bell; null where it holds nothing there. */
function momentsUnder({ values, width, height }: Field, bell: Bell): Bell | null {
  const det = bell.xx * bell.yy - bell.xy * bell.xy;
  const step = stepOf(bell);
  const reachX = REACH * Math.sqrt(bell.xx);
  const reachY = REACH * Math.sqrt(bell.yy);
  let weight = 0;
  let sumX = 0;
  let sumY = 0;
  let sumXx = 0;
  let sumYy = 0;
  let sumXy = 0;
  for (let y = Math.max(0, Math.floor(bell.y - reachY)); y < Math.min(height, bell.y + reachY); y += step) {
    for (let x = Math.max(0, Math.floor(bell.x - reachX)); x < Math.min(width, bell.x + reachX); x += step) {
      const value = values[y * width + x] as number;
      if (value === 0) continue;
      const dx = x + 0.5 - bell.x;
      const dy = y + 0.5 - bell.y;
      const off = (bell.yy * dx * dx + bell.xx * dy * dy - 2 * bell.xy * dx * dy) / det;
      if (off > REACH * REACH) continue;
      const share = value * Math.exp(-off / 2);
      weight += share;
      sumX += share * dx;
      sumY += share * dy;
      sumXx += share * dx * dx;
      sumYy += share * dy * dy;
      sumXy += share * dx * dy;
    }
  }
  if (weight === 0) return null;
  const x = sumX / weight;
  const y = sumY / weight;
  return { x: bell.x + x, y: bell.y + y, xx: sumXx / weight - x * x, yy: sumYy / weight - y * y, xy: sumXy / weight - x * y };
}
