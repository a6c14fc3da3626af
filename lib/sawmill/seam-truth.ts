/**
 * How the figure runs on over a seam, told by the wood itself: no camera, no noise, no pixels coarser than a fibre. The truth against
 * which seams read from photographs are judged. Shares no code with that reading.
 *
 * Both pieces' first 1.5 mm at the seam are sampled from the log, averaged into one profile each, freed of what changes slowly, and
 * held against each other at every lag.
 */
import type { Log } from "./log";
import { type Plane, planeFace, pointOn } from "./plane";

/** One end of a piece that meets another: wood of a face, told by the plane it lies in. */
export interface SeamEnd {
  readonly log: Log;
  readonly plane: Plane;
  /** Where the piece ends along the grain, mm; its wood lies before it (`"before"`) or after it. */
  readonly atMm: number;
  readonly wood: "before" | "after";
  /** Where its edge begins across the grain. */
  readonly fromMm: number;
}

export interface SeamTruth {
  /** Lag of the best correlation, mm: positive when the second piece's figure sits further across (+y) than the first's. */
  readonly stepMm: number;
  /** Correlation there, and at lag nil. */
  readonly peak: number;
  readonly match: number;
}

const PX_PER_MM = 8;
const DEPTH_MM = 1.5;
const REACH_MM = 12;
// Rings are a few millimetres apart and figures some centimetres; what changes over more than this is tone, not figure.
const SLOW_MM = 25;

/** What a perfect eye would read at a seam `heightMm` long. */
export function seamTruth(a: SeamEnd, b: SeamEnd, heightMm: number): SeamTruth {
  const first = withoutSlow(endProfile(a, heightMm));
  const second = withoutSlow(endProfile(b, heightMm));
  const reach = REACH_MM * PX_PER_MM;
  const correlations = Array.from({ length: 2 * reach + 1 }, (_, i) => correlation(first, second, i - reach));
  let best = 1;
  for (let i = 1; i < correlations.length - 1; i++) if (at(correlations, i) > at(correlations, best)) best = i;
  const [before, peak, after] = [at(correlations, best - 1), at(correlations, best), at(correlations, best + 1)];
  const bend = before - 2 * peak + after;
  const part = bend < 0 ? (before - after) / (2 * bend) : 0;
  return { stepMm: (best - reach + part) / PX_PER_MM, peak, match: at(correlations, reach) };
}

function endProfile({ log, plane, atMm, wood, fromMm }: SeamEnd, heightMm: number): number[] {
  const origin = pointOn(plane, wood === "before" ? atMm - DEPTH_MM : atMm, fromMm);
  const strip = planeFace(log, { ...plane, origin }, { lengthMm: DEPTH_MM, widthMm: heightMm }, PX_PER_MM);
  return Array.from({ length: strip.height }, (_, row) => {
    let sum = 0;
    for (let i = row * strip.width * 3; i < (row + 1) * strip.width * 3; i += 3) {
      sum += 0.2126 * at(strip.rgb, i) + 0.7152 * at(strip.rgb, i + 1) + 0.0722 * at(strip.rgb, i + 2);
    }
    return sum / strip.width;
  });
}

/** Less a bell-weighted mean of its surroundings. */
function withoutSlow(profile: readonly number[]): number[] {
  const spread = (SLOW_MM / 2.5) * PX_PER_MM * 0.5;
  const half = Math.round(2.5 * spread);
  const weights = Array.from({ length: 2 * half + 1 }, (_, i) => Math.exp(-0.5 * ((i - half) / spread) ** 2));
  return profile.map((value, row) => {
    let sum = 0;
    let whole = 0;
    for (let k = -half; k <= half; k++) {
      if (row + k < 0 || row + k >= profile.length) continue;
      sum += at(profile, row + k) * at(weights, k + half);
      whole += at(weights, k + half);
    }
    return value - sum / whole;
  });
}

function correlation(a: readonly number[], b: readonly number[], lag: number): number {
  const from = Math.max(0, -lag);
  const to = Math.min(a.length, b.length - lag);
  const count = to - from;
  let sumA = 0;
  let sumB = 0;
  let ab = 0;
  let aa = 0;
  let bb = 0;
  for (let i = from; i < to; i++) {
    const p = at(a, i);
    const q = at(b, i + lag);
    sumA += p;
    sumB += q;
    ab += p * q;
    aa += p * p;
    bb += q * q;
  }
  const spread = Math.sqrt((aa - (sumA * sumA) / count) * (bb - (sumB * sumB) / count));
  return spread > 0 ? (ab - (sumA * sumB) / count) / spread : 0;
}

function at(values: ArrayLike<number>, i: number): number {
  return values[i] ?? 0;
}
