/**
 * The years of a tree: how wide each ring grew, and which year a distance from the pith belongs to.
 */
import { bell, type Random } from "./random";

export interface Rings {
  /** Outer radius of every year from the pith outwards, starting with 0. */
  readonly outerMm: Float64Array;
  /** How strongly each year's latewood shows, about 1. */
  readonly contrast: Float64Array;
  /** First year to try for each tenth of a millimetre. */
  readonly yearByTenth: Uint16Array;
}

/** A place within a year's growth: year number, share of the way through it 0…1, its width. Written to by `readRing`. */
export interface RingPlace {
  year: number;
  share: number;
  widthMm: number;
  contrast: number;
}

/**
 * Rings out to `radiusMm`. Widths follow the year before (good and poor decades) and shrink slowly as the tree ages;
 * no ring is thinner than a quarter of the mean.
 */
export function growRings(meanMm: number, spread: number, radiusMm: number, random: Random): Rings {
  const outer = [0];
  const contrast: number[] = [];
  let vigour = 0;
  let reached = 0;
  while (reached < radiusMm) {
    vigour = 0.72 * vigour + 0.69 * bell(random);
    const age = 1.35 - 0.6 * Math.min(1, reached / radiusMm);
    const width = meanMm * Math.max(0.25, age * (1 + spread * (0.75 * vigour + 0.45 * bell(random))));
    reached += width;
    outer.push(reached);
    contrast.push(Math.min(1.35, Math.max(0.45, 1 + 0.22 * bell(random))));
  }
  const outerMm = Float64Array.from(outer);
  const yearByTenth = new Uint16Array(Math.ceil(reached * 10) + 1);
  let year = 0;
  for (let tenth = 0; tenth < yearByTenth.length; tenth++) {
    while (year < contrast.length - 1 && (outerMm[year + 1] ?? 0) <= tenth / 10) year++;
    yearByTenth[tenth] = year;
  }
  return { outerMm, contrast: Float64Array.from(contrast), yearByTenth };
}

/** The ring place of a growth radius; radii outside the tree are held to its first and last ring. */
export function readRing(rings: Rings, growthMm: number, place: RingPlace): void {
  const last = rings.contrast.length - 1;
  const held = Math.max(0, growthMm);
  let year = rings.yearByTenth[Math.min(rings.yearByTenth.length - 1, Math.floor(held * 10))] ?? last;
  while (year < last && (rings.outerMm[year + 1] ?? 0) <= held) year++;
  const from = rings.outerMm[year] ?? 0;
  const width = (rings.outerMm[year + 1] ?? 0) - from;
  place.year = year;
  place.widthMm = width;
  place.share = Math.min(0.999999, (held - from) / width);
  place.contrast = rings.contrast[year] ?? 1;
}
