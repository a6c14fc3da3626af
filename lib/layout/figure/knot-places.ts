/**
 * Where a board shows contrast along its grain, as clear wood hardly does: knots, mostly. Rings and fibres run along the grain, so
 * walking along it changes little; a knot's rim, its rings on end, bark and checks change at every step.
 */
import { bellFit } from "./bell-fit";
import { type Gradients, gradientsOf } from "./gradients";
import type { GreyPicture } from "./grey-picture";
import { smoothed } from "./smoothed";

/** An ellipse in pixels of the grey picture, and how far contrast along the grain rises there above the board's own. */
export interface KnotPlace {
  readonly x: number;
  readonly y: number;
  /** Half axes: `long` at `turn` radians from x towards y, `short` square to it. */
  readonly long: number;
  readonly short: number;
  readonly turn: number;
  /** Natural logarithm of the ratio of mean squared slopes along the grain, there and at the middle of the board's places. */
  readonly contrast: number;
}

/** Slopes are averaged over a square of 5 mm twice: the rim of a small knot and its middle flow into one hump. */
const SMOOTHED_REACH_MM = 2;
/** Least contrast of a place, as a logarithm: twelve times the board's own (3.5 times in slope). Clear wood stays below, arches included. */
export const LEAST_CONTRAST = Math.log(12);
/** Squared slope below which there is only noise: a fifth of a grey value a pixel. Keeps even boards from showing stray pixels as knots. */
const NOISE = 0.05;
/** No more humps than this are looked at, the strongest: several times the knots of a bad board, and an end to the work on a burr. */
const MOST_TOPS = 400;
/** Nothing else may be higher within this distance of a hump's top. */
const APART_MM = 3;
/**
 * Bells begin with these spreads: a knot of 10 mm radius, and one so big that a bell of the first kind may sit down on one side of its
 * rim. They are held between a pin knot's and a big one's.
 */
const STARTS_MM = [8, 16];
const LEAST_SPREAD_MM = 2;
const MOST_SPREAD_MM = 35;
/** What is offered is the bell at half its height: 1.177 times its spread. */
const HALF_HEIGHT = Math.sqrt(2 * Math.LN2);
/** A branch leaves the trunk at 30° or more, so its section is no longer than twice its width; the rest is grain that swerves. */
const LONGEST = 2;

export interface KnotPlaces {
  readonly places: readonly KnotPlace[];
  readonly gradients: Gradients;
}

/** Places by the contrast they were found by, strongest first; several may lie on one knot. */
export function knotPlaces(grey: GreyPicture): KnotPlaces {
  const { width, height, pxPerMm } = grey;
  const gradients = gradientsOf(grey);
  const along = smoothed(gradients.xx, width, height, Math.round(SMOOTHED_REACH_MM * pxPerMm));
  const own = median(along) + NOISE;
  const contrast = along.map((value) => Math.log((value + NOISE) / own));
  // The slope itself above what is usual; its square would see the darkest rim alone.
  const field = { values: rise(gradients.xx, width, height, Math.round(pxPerMm), own), width, height };
  const tops = topsOf(contrast, width, height, Math.round(APART_MM * pxPerMm));
  const places = tops.flatMap((top) => {
    const at = { x: (top % width) + 0.5, y: Math.floor(top / width) + 0.5 };
    return STARTS_MM.map((start) => {
      const bell = bellFit(field, at, start * pxPerMm, LEAST_SPREAD_MM * pxPerMm, MOST_SPREAD_MM * pxPerMm);
      return { ...ellipseOf(bell), contrast: contrast[top] as number };
    });
  });
  return { places, gradients };
}

/** Root of the smoothed squares where they are more than three times the board's own, less that. */
function rise(squares: Float32Array, width: number, height: number, reach: number, own: number): Float32Array {
  return smoothed(squares, width, height, reach).map((value) => Math.sqrt(Math.max(0, value - 3 * own)));
}

/** Pixels of at least `LEAST_CONTRAST` that nothing within `apart` pixels surpasses, strongest first. */
function topsOf(contrast: Float32Array, width: number, height: number, apart: number): number[] {
  const tops: number[] = [];
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const at = y * width + x;
      if ((contrast[at] as number) >= LEAST_CONTRAST && isTop(contrast, width, height, x, y, apart)) tops.push(at);
    }
  }
  return tops.sort((a, b) => (contrast[b] as number) - (contrast[a] as number) || a - b).slice(0, MOST_TOPS);
}

function isTop(contrast: Float32Array, width: number, height: number, x: number, y: number, apart: number): boolean {
  const own = contrast[y * width + x] as number;
  for (let v = Math.max(0, y - apart); v <= Math.min(height - 1, y + apart); v++) {
    for (let u = Math.max(0, x - apart); u <= Math.min(width - 1, x + apart); u++) {
      const other = contrast[v * width + u] as number;
      // Of equals the first in reading order is the top.
      if (other > own || (other === own && (v < y || (v === y && u < x)))) return false;
    }
  }
  return true;
}

function ellipseOf({ x, y, xx, yy, xy }: { x: number; y: number; xx: number; yy: number; xy: number }) {
  const middle = (xx + yy) / 2;
  const half = Math.hypot((xx - yy) / 2, xy);
  const turn = 0.5 * Math.atan2(2 * xy, xx - yy);
  const short = HALF_HEIGHT * Math.sqrt(middle - half);
  const long = HALF_HEIGHT * Math.sqrt(middle + half);
  // Only along the grain is the length cut: there the swerving grain drags the bell out.
  return { x, y, short, turn, long: Math.abs(turn) < Math.PI / 4 ? Math.min(long, LONGEST * short) : long };
}

function median(values: Float32Array): number {
  return (Float32Array.from(values).sort()[Math.floor(values.length / 2)] ?? 0) as number;
}
