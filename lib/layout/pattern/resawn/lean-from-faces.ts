/**
 * How the figure leans in a thick board, from photographs of both its faces: a growth line that lies at y on the face comes out at
 * y + T · tan φ on the back, T the thickness. Rings are round, so the shift differs across the board; it is followed from window to
 * window of the face (`follow-shift.ts`) by normalised cross-correlation with the back,
 *
 *   r(s) = Σ f(y) · b(y + s) / √(Σ f² · Σ b²), each freed of its mean over the window and of what varies slowly
 *
 * to a fraction of a sample by a parabola through each peak. φ comes from the mean shift. Growth lines are nearly even, so a path one
 * line further may look as good; then, and where too little agrees, there is no answer.
 */
import { type Um, um } from "../../units/um";
import { followShift, type WindowShift } from "./follow-shift";

/** Luminance from the top edge of a face to its bottom edge as photographed, at even steps. */
export interface AcrossProfile {
  readonly values: ArrayLike<number>;
  /** From one value to the next, µm. */
  readonly stepUm: number;
}

export interface LeanReading {
  /** As `ResawnFace.leanDeg` has it. */
  readonly leanDeg: number;
  /** T · tan φ. */
  readonly shift: Um;
  /** Least and greatest shift across the face: how far one lean speaks for all of it. */
  readonly shifts: { readonly least: Um; readonly most: Um };
  /** Mean correlation of the windows, at most 1. */
  readonly match: number;
}

/** Mean correlation of the windows that is needed, and by how much the next best path has to stay below it. */
const LEAST_MATCH = 0.55;
const CLEAR_BY = 0.12;
/** Steeper surfaces show as bands on a face, not as lines. */
const STEEPEST_DEG = 55;
/** Light and colour change over this width, growth lines over less, µm. */
const SLOW_UM = 20_000;
/** Of a window, some growth lines wide, and from one to the next, µm. */
const WINDOW_UM = 30_000;
const NEXT_UM = 10_000;
/** By how much the shift may differ from one window to the next, as a share of their distance: the bend of rings near the pith. */
const MOST_BEND = 0.35;
/** A path that is everywhere at least this far from the best is another one, µm. */
const OTHER_UM = 1_500;
/** Windows that have to find their lines on the back. */
const LEAST_WINDOWS = 3;

/**
 * `back` is photographed after turning the board over about its long axis, so its top edge is the face's bottom edge. Null where the
 * photographs do not say: no clear path, or profiles that do not fit each other or are too narrow.
 */
export function leanFromFaces(face: AcrossProfile, back: AcrossProfile, thickness: Um): LeanReading | null {
  const step = face.stepUm;
  const count = face.values.length;
  if (!(step > 0 && thickness > 0) || back.stepUm !== step || back.values.length !== count) return null;
  const half = Math.max(1, Math.round(SLOW_UM / step / 2));
  const samples = (length: number) => Math.max(1, Math.round(length / step));
  const path = followShift({
    face: withoutSlow(Array.from(face.values), half),
    back: withoutSlow(Array.from(back.values).reverse(), half),
    window: samples(WINDOW_UM),
    next: samples(NEXT_UM),
    most: samples(thickness * Math.tan((STEEPEST_DEG * Math.PI) / 180)),
    bend: Math.ceil((NEXT_UM * MOST_BEND) / step),
    other: samples(OTHER_UM),
  });
  if (path === null || path.windows.length < LEAST_WINDOWS) return null;
  const match = mean(path.windows.map(({ correlation }) => correlation));
  if (match < LEAST_MATCH || match - path.nextBest < CLEAR_BY) return null;
  // At the edges a window may half miss its figure on the back; its shift says little.
  const sure = path.windows.filter(({ correlation }) => correlation >= LEAST_MATCH);
  return sure.length < LEAST_WINDOWS ? null : readingOf(sure, step, thickness, match);
}

function readingOf(windows: readonly WindowShift[], step: number, thickness: Um, match: number): LeanReading {
  const shifts = windows.map(({ shift }) => shift * step);
  const shift = mean(shifts);
  return {
    leanDeg: (Math.atan(shift / thickness) * 180) / Math.PI,
    shift: um(Math.round(shift)),
    shifts: { least: um(Math.round(Math.min(...shifts))), most: um(Math.round(Math.max(...shifts))) },
    match,
  };
}

/** Values less their mean over `half` values on either side. */
function withoutSlow(values: readonly number[], half: number): number[] {
  const sums = [0];
  for (const value of values) sums.push((sums.at(-1) ?? 0) + value);
  return values.map((value, index) => {
    const [from, to] = [Math.max(0, index - half), Math.min(values.length, index + half + 1)];
    return value - ((sums[to] ?? 0) - (sums[from] ?? 0)) / (to - from);
  });
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
