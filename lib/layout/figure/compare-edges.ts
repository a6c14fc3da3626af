/**
 * Holds the figure on both sides of a seam against each other. `step` is the lag of the best normalised cross-correlation within
 * ±8 mm, to a fraction of a sample by a parabola; `match` the correlation at lag nil.
 */
import { um } from "../units/um";
import { chanceDeviation, correlations, highPassed, vertex } from "./correlation";
import { SAMPLE_MM } from "./edge-patch";
import type { EdgeProfile } from "./edge-profile";
import type { SeamFigure } from "./seam-reading";

/** Steps are looked for this far either way: more than any kerf with clean-up shifts a line of ordinary slope. */
const REACH_MM = 8;
/**
 * Figure is what changes within this much: rings and the legs of arches stay, light and tone that wander over the board go. More
 * than the 16 mm of the reach, so that a step is seen against a whole ripple.
 */
const FIGURE_MM = 20;
/**
 * A peak counts from so many times what chance would give. A single lag of two strangers comes that high once in 4,000 times (normal
 * tail of 3.5 σ), the best of some ten independent lags within reach once in 400; edges of different trees measured: once in 90.
 */
const CHANCE_DEVIATIONS = 3.5;
/** Least peak. At 0.4 a sixth (0.4²) of what is seen on one side is seen on the other: however surely, that is no figure running on. */
const LEAST_PEAK = 0.4;
/** Least coherence of either side. Noise alone gives up to 0.1 over the shortest edge that is compared. */
const LEAST_COHERENCE = 0.15;
/** Grain within 30° of the seam runs along it: 4 mm into the wood a line has then wandered 7 mm, as far as the reach itself. */
const ALONG_RAD = Math.PI / 6;
/** Another peak is one that lies further off than this; nearer ones are ripples on one peak, since no ring is so narrow. */
const APART_MM = 1;

/** Whether lines of this direction (0 square to the seam) run along it. */
export function runsAlong(direction: number): boolean {
  return Math.abs(Math.cos(direction)) < Math.sin(ALONG_RAD);
}

/** Both sides must be equally long. */
export function compareEdges(a: EdgeProfile, b: EdgeProfile): SeamFigure {
  if (Math.min(a.coherence, b.coherence) < LEAST_COHERENCE) return { kind: "cannotTell", why: "noGrain" };
  if (runsAlong(a.direction) || runsAlong(b.direction)) return { kind: "cannotTell", why: "grainAlongSeam" };
  const { likeness, best, chance } = likenessOf(a, b);
  const reach = (likeness.length - 1) / 2;
  const at = (i: number) => likeness[i] as number;
  const peak = at(best);
  if (peak < Math.max(LEAST_PEAK, CHANCE_DEVIATIONS * chance)) return { kind: "cannotTell", why: "noLikeness" };
  if (best === 0 || best === likeness.length - 1) return { kind: "cannotTell", why: "beyondReach" };
  if (peak - nextPeak(likeness, best) < chance) return { kind: "cannotTell", why: "twoAnswers" };
  const lag = best - reach + vertex(at(best - 1), peak, at(best + 1));
  return { kind: "read", step: um(Math.round(lag * SAMPLE_MM * 1000)), match: at(reach), peak };
}

interface Likeness {
  /** Correlation at every lag from −reach to reach, in samples. */
  readonly likeness: Float64Array;
  /** Index of the greatest. */
  readonly best: number;
  /** What chance would give at that lag: its overlap is shorter than the seam. */
  readonly chance: number;
}

/** The figure of both sides at every lag. */
export function likenessOf(a: EdgeProfile, b: EdgeProfile): Likeness {
  const window = Math.round(FIGURE_MM / SAMPLE_MM);
  const reach = Math.round(REACH_MM / SAMPLE_MM);
  const figureA = highPassed(a.light, window);
  const figureB = highPassed(b.light, window);
  const likeness = correlations(figureA, figureB, reach);
  let best = 0;
  for (let i = 1; i < likeness.length; i++) if ((likeness[i] as number) > (likeness[best] as number)) best = i;
  return { likeness, best, chance: chanceDeviation(figureA, figureB, reach, figureA.length - Math.abs(best - reach)) };
}

/** The greatest peak that is not the best one; −1 where there is none. */
function nextPeak(likeness: Float64Array, best: number): number {
  const apart = APART_MM / SAMPLE_MM;
  const at = (i: number) => likeness[i] ?? Number.NEGATIVE_INFINITY;
  let next = -1;
  for (let i = 0; i < likeness.length; i++) {
    const isPeak = at(i) >= at(i - 1) && at(i) >= at(i + 1);
    if (isPeak && Math.abs(i - best) > apart) next = Math.max(next, at(i));
  }
  return next;
}
