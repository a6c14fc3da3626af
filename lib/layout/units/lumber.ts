/**
 * Lumber measure in board feet. Source: an export council's account of the NHLA rules: a board foot is 1 ft × 1 ft × 1 in, so
 * BF = W(in)·L(ft)·T(in)/12; surface measure = W·L/12 rounded to the whole number; BF = surface measure × thickness; stock
 * under 1 in counts as 1 in; in a tally widths go to the nearest whole inch, exact halves up and down by turns, and lengths
 * down to the whole foot.
 */
import { INCHES_PER_FOOT, UM_PER_INCH } from "./length-style";
import { type Um, um } from "./um";

/** Which way an exact half goes. The rule takes turns within a tally, so the caller keeps count. */
export type HalfGoes = "up" | "down";

const UM_PER_FOOT = UM_PER_INCH * INCHES_PER_FOOT;

/** The volume in board feet by plain measures: nothing is rounded, and thin stock counts as thick as it is. */
export function boardFeet(width: Um, length: Um, thickness: Um): number {
  return ((width / UM_PER_INCH) * (length / UM_PER_FOOT) * (thickness / UM_PER_INCH)) / INCHES_PER_FOOT;
}

/** Surface measure: square feet of one face to the nearest whole one. */
export function surfaceMeasure(width: Um, length: Um, halfGoes: HalfGoes): number {
  return wholeOf((width / UM_PER_INCH) * (length / UM_PER_FOOT), INCHES_PER_FOOT, halfGoes);
}

/**
 * Board feet by the rule, as a board is bought and counted: the surface measure of the tallied width and length, times the thickness in
 * inches, under 1 in counted as 1 in. 0 for a board shorter than a foot.
 */
export function boardFeetByRule(width: Um, length: Um, thickness: Um, halfGoes: HalfGoes): number {
  const tallied = {
    width: um(tallyWidth(width, halfGoes) * UM_PER_INCH),
    length: um(tallyLength(length) * UM_PER_FOOT),
  };
  return surfaceMeasure(tallied.width, tallied.length, halfGoes) * Math.max(1, thickness / UM_PER_INCH);
}

/** A width as it is tallied: whole inches. */
export function tallyWidth(width: Um, halfGoes: HalfGoes): number {
  return wholeOf(width, UM_PER_INCH, halfGoes);
}

/** A length as it is tallied: whole feet, never rounded up. */
export function tallyLength(length: Um): number {
  return Math.floor(length / UM_PER_FOOT);
}

/** `amount / unit` to the nearest whole number; exact halves as told. */
function wholeOf(amount: number, unit: number, halfGoes: HalfGoes): number {
  const whole = Math.floor(amount / unit);
  const rest = 2 * (amount - whole * unit) - unit;
  // Halves are exact in the inputs that have them (whole µm, quarter inches); this only absorbs the division before.
  if (Math.abs(rest) < unit * 1e-12) return halfGoes === "up" ? whole + 1 : whole;
  return rest > 0 ? whole + 1 : whole;
}
