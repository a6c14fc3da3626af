/**
 * The width of one gap at another moisture. Fronts are held at their middles; the places where they are held, and the edges of their
 * opening, are carried by the surround. With reaches r_A and r_B from the holding places to the edges at the gap g, and strains ε of
 * the fronts and of the surround along the line across the gap:
 *
 *   g' = (r_A + g + r_B)·(1 + ε_surround) − r_A·(1 + ε_A) − r_B·(1 + ε_B)
 *
 * so that fronts and surround that move alike keep their gap but for the movement over the gap itself. Strains are linear in the
 * moisture they end at, so the least and the greatest gap of a year stand at its ends.
 */
import { type Um, um } from "../units/um";
import type { FaceGap } from "./face-gaps";

/** Share by which each grows between today and another day, along the line across the gap. */
export interface Strains {
  readonly a: number;
  readonly b: number;
  readonly surround: number;
}

type Reaches = Pick<FaceGap, "reachA" | "reachB">;

/** To the nearest micrometre; nothing or less: the fronts bind. */
export function gapAfter(gap: Um, reaches: Reaches, strains: Strains): Um {
  return um(Math.round(gap * (1 + strains.surround) + movedApart(reaches, strains)));
}

/** The least gap today that is at least `leastGap` after all of these strains, and at least nothing. */
export function gapToCut(leastGap: Um, reaches: Reaches, days: readonly Strains[]): Um {
  const needed = days.map((strains) => (leastGap - movedApart(reaches, strains)) / (1 + strains.surround));
  return um(Math.max(0, ...needed.map((gap) => Math.ceil(gap))));
}

/** By how much the edges move away from one another, the movement over the gap itself left out. */
function movedApart({ reachA, reachB }: Reaches, { a, b, surround }: Strains): number {
  return reachA * (surround - a) + reachB * (surround - b);
}
