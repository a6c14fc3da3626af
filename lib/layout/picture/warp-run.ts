/** Places of the photo along a row of the picture, told to a sampler piece by piece as cubic curves. */
import type { Curve, Sampler } from "./sampler";
import { sourceInto, type WarpMap } from "./warp-map";

/** Samples at picture points (x + i·step, y), i from 0 to count − 1. */
export interface Run {
  readonly x: number;
  readonly y: number;
  readonly step: number;
  readonly count: number;
}

/** Places may be off by this much, px: four times finer than the steps of 1/256 px at which pixels are read. */
const PLACE_TOLERANCE_PX = 1 / 1024;
/** Longer runs are halved unasked: six places tell too little about them. */
const LONGEST_RUN = 2048;

/**
 * Perspective and lens change slowly, so a cubic through four places of a run tells all of them without a division or a root per
 * pixel. Where it strays, the run is halved; one or two samples are always exact. `channels`: bytes a sample takes.
 */
export function sampleRun(sampler: Sampler, channels: number, map: WarpMap, out: Uint8Array, offset: number, run: Run): void {
  const found = run.count > LONGEST_RUN ? null : curvesOf(map, run);
  if (found !== null) {
    sampler.along(out, offset, run.count, found.x, found.y);
    return;
  }
  const half = run.count >> 1;
  sampleRun(sampler, channels, map, out, offset, { ...run, count: half });
  const rest = { ...run, x: run.x + half * run.step, count: run.count - half };
  sampleRun(sampler, channels, map, out, offset + half * channels, rest);
}

/** Shares of a run at which places are looked up: four that the cubic goes through, two where it strays most between them. */
const SHARES = [0, 1 / 3, 2 / 3, 1, 1 / 8, 7 / 8] as const;
/** x and y of each. Numbers in one array: an object a place would take longer than the sampling. */
const places = new Float64Array(2 * SHARES.length);

/** The places of a run as one cubic each way, or null where they stray. */
function curvesOf(map: WarpMap, { x, y, step, count }: Run): { readonly x: Curve; readonly y: Curve } | null {
  const last = count - 1;
  for (let n = 0; n < SHARES.length; n++) sourceInto(map, x + (SHARES[n] as number) * last * step, y, places, 2 * n);
  const found = { x: cubicThrough(0, last), y: cubicThrough(1, last) };
  const strays =
    last > 1 && (offAt(4, last, found.x, found.y) > PLACE_TOLERANCE_PX || offAt(5, last, found.x, found.y) > PLACE_TOLERANCE_PX);
  return strays ? null : found;
}

/** Through the first four places looked up, by Newton's divided differences; `way` is 0 for x, 1 for y. */
function cubicThrough(way: 0 | 1, last: number): Curve {
  const at = places[way] as number;
  if (last === 0) return { a: at, b: 0, c: 0, d: 0 };
  const third = last / 3;
  const first = (places[2 + way] as number) - at;
  const second = (places[4 + way] as number) - (places[2 + way] as number) - first;
  const rest = (places[6 + way] as number) - at - 3 * first - 3 * second;
  // at + first·t + second·t(t − 1)/2 + rest·t(t − 1)(t − 2)/6, t in thirds.
  return {
    a: at,
    b: (first - second / 2 + rest / 3) / third,
    c: (second / 2 - rest / 2) / (third * third),
    d: rest / 6 / (third * third * third),
  };
}

/** How far the curves are from a place looked up, px. */
function offAt(n: number, last: number, x: Curve, y: Curve): number {
  const i = (SHARES[n] as number) * last;
  const dx = x.a + (x.b + (x.c + x.d * i) * i) * i - (places[2 * n] as number);
  const dy = y.a + (y.b + (y.c + y.d * i) * i) * i - (places[2 * n + 1] as number);
  return Math.abs(dx) + Math.abs(dy);
}
