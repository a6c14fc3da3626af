/** Where the marks of a tape stand at a given scale: as fine as can be told apart, figures as close as can be read. Draws nothing. */
import { mmFromUm, printedLength, type Um, umFromMm } from "@/lib/layout";

export interface TapeMark {
  /** From the start of the tape, mm. */
  readonly mm: number;
  readonly size: "short" | "middle" | "long";
  /** On long marks but the first: `200`, `23 1⁄2`. */
  readonly figure: string;
}

/** Closer marks than this run into each other: pixels on the screen, points on paper. */
const nearestMarksPx = 4;
/** Room for the widest figure, `2400` or `23 1⁄2`, likewise. */
const nearestFiguresPx = 46;
const mmPerInch = 25.4;

/** Steps a rule is divided by, each with those it may be divided into, in the unit itself. */
const steps = {
  mm: [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000],
  inch: [1 / 32, 1 / 16, 1 / 8, 1 / 4, 1 / 2, 1, 2, 3, 6, 12, 24, 48, 96, 192, 384],
} as const;

/** Marks from 0 to `length`; `pxPerMm` is the scale on screen or paper. Nothing for a length or scale of 0. */
export function tapeMarks(length: Um, pxPerMm: number, unit: "mm" | "inch"): readonly TapeMark[] {
  if (!(length > 0) || !(pxPerMm > 0)) return [];
  const mmPerUnit = unit === "mm" ? 1 : mmPerInch;
  const { short, middle, long } = divisions(steps[unit], pxPerMm * mmPerUnit);
  const count = Math.floor(mmFromUm(length) / (short * mmPerUnit) + 1e-9);
  const every = (step: number) => Math.round(step / short);
  return Array.from({ length: count + 1 }, (_, index) => {
    const mm = index * short * mmPerUnit;
    if (index % every(long) === 0) return { mm, size: "long", figure: index === 0 ? "" : figureAt(mm, unit) };
    return { mm, size: index % every(middle) === 0 ? "middle" : "short", figure: "" };
  });
}

/** The finest step whose marks can be told apart, the finest that leaves room for figures, and one between that divides the longer one. */
function divisions(ladder: readonly number[], pxPerUnit: number): { short: number; middle: number; long: number } {
  const coarsest = ladder.at(-1) ?? 1;
  const long = ladder.find((step) => step * pxPerUnit >= nearestFiguresPx) ?? coarsest;
  const short = ladder.find((step) => step * pxPerUnit >= nearestMarksPx && divides(step, long)) ?? long;
  const middle = ladder.findLast((step) => step < long && step > short && divides(step, long) && divides(short, step)) ?? long;
  return { short, middle, long };
}

const divides = (step: number, whole: number) => Math.abs(whole / step - Math.round(whole / step)) < 1e-9;

function figureAt(mm: number, unit: "mm" | "inch"): string {
  return unit === "mm" ? String(Math.round(mm)) : printedLength(umFromMm(mm), { unit, denominator: 64 }).figure;
}
