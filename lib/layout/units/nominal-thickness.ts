/**
 * Nominal thickness of rough lumber in quarters of an inch, and the least it comes to when surfaced on two sides. Source: two
 * published tables of rough and surfaced hardwood thickness that agree (NHLA grading minimums). They are grading minimums:
 * real 4/4 stock may be anything from 3/4 to 15/16 in, so the board's own measured thickness decides wherever a saw is set.
 */
import { UM_PER_INCH } from "./length-style";
import { type Um, um } from "./um";

export interface NominalThickness {
  /** As the trade writes it, in quarters of an inch; 3/4 is the one thin size that is kept in the same tables. */
  readonly name: "3/4" | "4/4" | "5/4" | "6/4" | "8/4" | "12/4" | "16/4";
  readonly rough: Um;
  /** Least thickness surfaced on two sides. */
  readonly surfaced: Um;
}

export const nominalThicknesses: readonly NominalThickness[] = [
  { name: "3/4", rough: inches(3, 4), surfaced: inches(9, 16) },
  { name: "4/4", rough: inches(4, 4), surfaced: inches(13, 16) },
  { name: "5/4", rough: inches(5, 4), surfaced: inches(17, 16) },
  { name: "6/4", rough: inches(6, 4), surfaced: inches(21, 16) },
  { name: "8/4", rough: inches(8, 4), surfaced: inches(7, 4) },
  { name: "12/4", rough: inches(12, 4), surfaced: inches(11, 4) },
  { name: "16/4", rough: inches(16, 4), surfaced: inches(15, 4) },
];

/** The nominal size that a measured rough board passes for: the thickest it is not thinner than, or null under 3/4 in. */
export function nominalThicknessOf(measuredRough: Um): NominalThickness | null {
  return nominalThicknesses.findLast(({ rough }) => rough <= measuredRough) ?? null;
}

function inches(top: number, bottom: number): Um {
  return um(Math.round((top * UM_PER_INCH) / bottom));
}
