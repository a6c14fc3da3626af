/**
 * Reads a length as people write it in a shop: `12.7`, `12.7 mm`, `1/2`, `23 5⁄16"`, `23-5/16`, `3.125 in`, `7' 6 1/2"`.
 * Never guesses: what can be read in two ways, or not at all, comes back as a refusal that names the input.
 */
import { INCHES_PER_FOOT, UM_PER_INCH } from "./length-style";
import { plainLengthText } from "./length-text";
import { type Um, um } from "./um";

/** What a bare number such as `12.7` is counted in. A bare fraction is always inches: nobody writes half a millimetre so. */
export type BareUnit = "mm" | "inch";

export type ParsedLength =
  | { readonly ok: true; readonly value: Um }
  | {
      readonly ok: false;
      /** `ambiguous-comma`: 1,200 may be 1.2 or 1200. `out-of-range`: longer than any stock, see `LONGEST_UM`. */
      readonly reason: "empty" | "not-a-length" | "zero-denominator" | "ambiguous-comma" | "out-of-range";
      readonly input: string;
    };

/** One kilometre: far beyond any board, near enough to catch a slipped decimal point or a pasted telephone number. */
export const LONGEST_UM = 1_000_000_000;

const UM_PER_METRIC_UNIT: Readonly<Record<string, number>> = { mm: 1_000, cm: 10_000, m: 1_000_000 };

const DECIMAL = String.raw`\d+(?:\.\d*)?|\.\d+`;
const FRACTION = String.raw`(?<top>\d+) ?/ ?(?<bottom>\d+)`;
/** A decimal, a fraction, or a whole number with a fraction after a space or a hyphen. */
const INCHES = String.raw`(?:(?:(?<whole>\d+)(?: ?- ?| ))?${FRACTION}|(?<decimal>${DECIMAL}))`;
const INCH_MARK = String.raw`(?:"|in\.?|inch|inches)`;
const FOOT_MARK = String.raw`(?:'|ft\.?|foot|feet)`;

const metricPattern = new RegExp(`^(?<decimal>${DECIMAL}) ?(?<unit>mm|cm|m)$`);
const barePattern = new RegExp(`^(?<decimal>${DECIMAL})$`);
const inchPattern = new RegExp(`^${INCHES} ?${INCH_MARK}?$`);
const footPattern = new RegExp(`^(?<feet>${DECIMAL}) ?${FOOT_MARK}(?:(?: ?- ?| )?${INCHES} ?${INCH_MARK}?)?$`);

type Magnitude = { readonly um: number } | { readonly refused: "not-a-length" | "zero-denominator" };

/** A length in whole micrometres, rounded to the nearest. */
export function parseLength(input: string, bareUnit: BareUnit): ParsedLength {
  const text = plainLengthText(input);
  if (text === "") return { ok: false, reason: "empty", input };
  const negative = text.startsWith("-");
  const unsigned = /^[-+]/.test(text) ? text.slice(1).trimStart() : text;
  if (/\d,\d{3}(?!\d)/.test(unsigned)) return { ok: false, reason: "ambiguous-comma", input };

  const magnitude = magnitudeOf(unsigned.replace(",", "."), bareUnit);
  if ("refused" in magnitude) return { ok: false, reason: magnitude.refused, input };
  const rounded = Math.round(magnitude.um);
  if (!(rounded <= LONGEST_UM)) return { ok: false, reason: "out-of-range", input };
  return { ok: true, value: um(negative ? -rounded : rounded) };
}

function magnitudeOf(text: string, bareUnit: BareUnit): Magnitude {
  const bare = barePattern.exec(text)?.groups;
  if (bare) return { um: Number(bare.decimal) * (bareUnit === "mm" ? 1_000 : UM_PER_INCH) };

  const metric = metricPattern.exec(text)?.groups;
  if (metric) return { um: Number(metric.decimal) * (UM_PER_METRIC_UNIT[metric.unit ?? ""] ?? Number.NaN) };

  const inches = inchPattern.exec(text)?.groups;
  if (inches) return inchesFrom(inches);

  const feet = footPattern.exec(text)?.groups;
  if (!feet) return { refused: "not-a-length" };
  const footPart = Number(feet.feet) * INCHES_PER_FOOT * UM_PER_INCH;
  if (feet.decimal === undefined && feet.bottom === undefined) return { um: footPart };
  const inchPart = inchesFrom(feet);
  return "refused" in inchPart ? inchPart : { um: footPart + inchPart.um };
}

function inchesFrom(groups: Readonly<Record<string, string | undefined>>): Magnitude {
  if (groups.decimal !== undefined) return { um: Number(groups.decimal) * UM_PER_INCH };
  const top = Number(groups.top);
  const bottom = Number(groups.bottom);
  if (bottom === 0) return { refused: "zero-denominator" };
  // 1 7/4 is a slip of the pen more often than it is 2 3/4.
  if (groups.whole !== undefined && top >= bottom) return { refused: "not-a-length" };
  return { um: ((Number(groups.whole ?? 0) * bottom + top) * UM_PER_INCH) / bottom };
}
