/**
 * Front sizes from an opening: so many fronts, the gaps between and around them, and how they grow from the first (top, or
 * left) to the last. What the sizes cannot take up without a fraction is left over and said: it widens the last outer gap, so
 * that opening = outer gap + fronts + gaps + outer gap to the last micrometre, fronts meant to be equal are equal, and
 * constant steps are constant.
 */
import { type Um, um } from "../units/um";

export type Graduation =
  | { readonly kind: "equal" }
  /** Each front is larger than the one before by `step` (negative: smaller). */
  | { readonly kind: "step"; readonly step: Um }
  /** Each front is `ratio` times the one before. */
  | { readonly kind: "ratio"; readonly ratio: number };

/**
 * A division of the rule that sizes are brought down to: `um` parted into `parts`. Half a millimetre is 500/1, 1/64 in
 * 25400/64.
 */
export interface SizeStep {
  readonly um: number;
  readonly parts: number;
}

export const WHOLE_MICROMETRES: SizeStep = { um: 1, parts: 1 };

export interface Opening {
  readonly opening: Um;
  readonly count: number;
  readonly gap: Um;
  readonly outerBefore: Um;
  readonly outerAfter: Um;
  readonly graduation: Graduation;
  readonly sizeStep?: SizeStep;
}

export type Graduated =
  | {
      readonly ok: true;
      readonly sizes: readonly Um[];
      readonly gaps: readonly Um[];
      readonly outerBefore: Um;
      /** As asked for, plus the remainder. */
      readonly outerAfter: Um;
      readonly remainder: Um;
    }
  /** The sizes come to nothing or less: the smallest front would be this large (µm, rounded down). */
  | { readonly ok: false; readonly reason: "no-room"; readonly smallest: number }
  | { readonly ok: false; readonly reason: "bad-count" | "bad-ratio" | "bad-size-step" };

/** More fronts in one line than any piece of furniture has. */
export const MOST_FRONTS = 1_000;

export function sizesFromOpening(wish: Opening): Graduated {
  const { count, gap, graduation, sizeStep = WHOLE_MICROMETRES } = wish;
  if (!Number.isInteger(count) || count < 1 || count > MOST_FRONTS) return { ok: false, reason: "bad-count" };
  if (!(sizeStep.um > 0 && Number.isInteger(sizeStep.parts) && sizeStep.parts > 0)) return { ok: false, reason: "bad-size-step" };
  if (graduation.kind === "ratio" && !(graduation.ratio > 0 && Number.isFinite(graduation.ratio))) {
    return { ok: false, reason: "bad-ratio" };
  }

  const room = wish.opening - wish.outerBefore - wish.outerAfter - gap * (count - 1);
  const sizes = exactSizes(room, count, graduation).map((size) => roundedDown(size, sizeStep));
  const smallest = Math.min(...sizes);
  if (!(smallest > 0)) return { ok: false, reason: "no-room", smallest };
  const remainder = um(room - sizes.reduce((sum, size) => sum + size, 0));
  return {
    ok: true,
    sizes: sizes.map(um),
    gaps: Array.from({ length: count - 1 }, () => gap),
    outerBefore: wish.outerBefore,
    outerAfter: um(wish.outerAfter + remainder),
    remainder,
  };
}

/** Sizes in whole micrometres, rounded down, before they are brought to the steps of the rule. */
function exactSizes(room: number, count: number, graduation: Graduation): number[] {
  const indices = Array.from({ length: count }, (_, index) => index);
  if (graduation.kind === "ratio") {
    const weights = indices.map((index) => graduation.ratio ** index);
    const total = weights.reduce((sum, weight) => sum + weight, 0);
    return weights.map((weight) => Math.floor((room * weight) / total));
  }
  // n·a + d·n(n−1)/2 = room for first size a and step d; rounding a down keeps every step exactly d.
  const step = graduation.kind === "step" ? graduation.step : 0;
  const first = Math.floor((room - (step * count * (count - 1)) / 2) / count);
  return indices.map((index) => first + index * step);
}

function roundedDown(size: number, { um: whole, parts }: SizeStep): number {
  const steps = Math.floor((size * parts) / whole);
  return Math.round((steps * whole) / parts);
}
