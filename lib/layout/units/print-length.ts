/**
 * Prints a length for people: millimetres to 0.1, or inches to the nearest 1/32 or 1/64, reduced. What is printed reads back
 * (`parseLength`) to the value it stands for, and the sign of the rounding says on which side of it the true length lies.
 */
import { type LengthStyle, UM_PER_INCH } from "./length-style";
import { DOUBLE_PRIME, FRACTION_SLASH, MINUS } from "./length-text";
import { type Um, um } from "./um";

export interface PrintedLength {
  /** Without a unit in mm (`12.7`), without the inch mark in inches (`23 5⁄16`). For tables with the unit in the heading. */
  readonly figure: string;
  /** With its unit: `12.7 mm`, `23 5⁄16″`. */
  readonly text: string;
  /** What the text stands for: the length the saw is set to when someone follows the paper. */
  readonly stands: Um;
  /** `+`: the true length is a little more than printed; `−`: a little less; empty: printed exactly. */
  readonly rounding: "+" | typeof MINUS | "";
}

/** The length as the shop writes it. */
export function printLength(value: Um, style: LengthStyle): string {
  return printedLength(value, style).text;
}

/** The length as the shop writes it, taken apart. Halves round away from zero, so that −x prints as x does. */
export function printedLength(value: Um, style: LengthStyle): PrintedLength {
  // One unit is `umPerUnit` and is divided into `parts`; whole-number arithmetic, since 1/64 in is 396.875 µm.
  const umPerUnit = style.unit === "mm" ? 1_000 : UM_PER_INCH;
  const parts = style.unit === "mm" ? 10 : style.denominator;
  const count = Math.floor((2 * Math.abs(value) * parts + umPerUnit) / (2 * umPerUnit));
  const size = Math.round((count * umPerUnit) / parts);
  const stands = um(value < 0 ? -size : size);

  const sign = stands < 0 ? MINUS : "";
  const figure = sign + (style.unit === "mm" ? tenths(count) : mixedNumber(count, parts));
  const text = style.unit === "mm" ? `${figure} mm` : figure + DOUBLE_PRIME;
  return { figure, text, stands, rounding: value > stands ? "+" : value < stands ? MINUS : "" };
}

function tenths(count: number): string {
  return `${Math.floor(count / 10)}.${count % 10}`;
}

/** `count` parts of a unit as a whole number and a reduced fraction, the whole apart: `23 5⁄16`, `1⁄2`, `7`, `0`. */
function mixedNumber(count: number, parts: number): string {
  const whole = Math.floor(count / parts);
  const rest = count % parts;
  if (rest === 0) return String(whole);
  const divisor = greatestCommonDivisor(rest, parts);
  const fraction = `${rest / divisor}${FRACTION_SLASH}${parts / divisor}`;
  return whole === 0 ? fraction : `${whole} ${fraction}`;
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
