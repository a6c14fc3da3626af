/**
 * The one radial term that makes straight edges straight. Knows nothing of marks: it is given the residuals at any k1 and looks
 * for the k1 that makes their squares least, then says whether that is worth having.
 */
import { rootMeanSquare } from "./fit-homography";
import { STRONGEST_K1 } from "./lens";

export type LensOutcome =
  /** No points along edges were marked. */
  | { readonly kind: "not-asked" }
  /** Too few edge points to tell bending from a shaky hand. */
  | { readonly kind: "too-few"; readonly points: number; readonly needed: number }
  /** The best term would bend more than any camera's lens: the edge is not straight or the points are not on it. */
  | { readonly kind: "implausible"; readonly beforeMm: number }
  /** The best term straightens nothing worth speaking of; none was used. */
  | { readonly kind: "no-help"; readonly beforeMm: number; readonly afterMm: number }
  /** Used. Root mean square distance of the edge points from straight, without and with the term. */
  | { readonly kind: "taken-out"; readonly k1: number; readonly beforeMm: number; readonly afterMm: number };

/** What a fit at one k1 leaves over. */
export interface ResidualsMm {
  /** Of the edge points from their edges. */
  readonly edges: readonly number[];
  /** Of all marks that say where they lie, along and across. */
  readonly marks: readonly number[];
}

/** Fewer say nothing beyond the perspective that they fix. */
export const FEWEST_EDGE_POINTS = 3;
/** Steps each way of the scan before closing in, in case the sum of squares has more than one valley. */
const SCAN_STEPS = 8;
const GOLDEN = (Math.sqrt(5) - 1) / 2;
/** 1e-8 of k1 moves the corner of a 12-megapixel photo by 0.000025 px. */
const K1_TOLERANCE = 1e-8;
/** The usual bound at which one more unknown has earned its place (F of 4, about 95 % with many points). */
const WORTH_HAVING_F = 4;

/**
 * Best k1 within ±0.25 by a scan and golden section. `residualsAt` gives null where nothing can be fitted; `spare` is the number
 * of conditions beyond those that the fit without a lens uses up, ≥ 1.
 */
export function fitLens(residualsAt: (k1: number) => ResidualsMm | null, spare: number): LensOutcome {
  const costAt = (k1: number): number => {
    const residuals = residualsAt(k1);
    return residuals === null ? Number.POSITIVE_INFINITY : sumOfSquares(residuals);
  };
  const without = residualsAt(0);
  if (without === null) return { kind: "implausible", beforeMm: Number.POSITIVE_INFINITY };
  const beforeMm = rootMeanSquare(without.edges);
  const k1 = leastCost(costAt);
  const withTerm = residualsAt(k1);
  if (withTerm === null || Math.abs(k1) > STRONGEST_K1 * 0.98) return { kind: "implausible", beforeMm };

  const afterMm = rootMeanSquare(withTerm.edges);
  const left = sumOfSquares(withTerm);
  const gained = sumOfSquares(without) - left;
  const helps = gained > 0 && gained * Math.max(1, spare - 1) >= WORTH_HAVING_F * left;
  return helps ? { kind: "taken-out", k1, beforeMm, afterMm } : { kind: "no-help", beforeMm, afterMm };
}

function leastCost(costAt: (k1: number) => number): number {
  const at = (step: number): number => (STRONGEST_K1 * step) / SCAN_STEPS;
  let best = 0;
  let bestCost = costAt(0);
  for (let step = -SCAN_STEPS; step <= SCAN_STEPS; step++) {
    const cost = costAt(at(step));
    if (cost < bestCost) {
      best = step;
      bestCost = cost;
    }
  }
  let low = at(best - 1);
  let high = at(best + 1);
  let inner = high - GOLDEN * (high - low);
  let outer = low + GOLDEN * (high - low);
  let innerCost = costAt(inner);
  let outerCost = costAt(outer);
  while (high - low > K1_TOLERANCE) {
    if (innerCost < outerCost) {
      high = outer;
      outer = inner;
      outerCost = innerCost;
      inner = high - GOLDEN * (high - low);
      innerCost = costAt(inner);
    } else {
      low = inner;
      inner = outer;
      innerCost = outerCost;
      outer = low + GOLDEN * (high - low);
      outerCost = costAt(outer);
    }
  }
  return (low + high) / 2;
}

function sumOfSquares({ edges, marks }: ResidualsMm): number {
  return [...edges, ...marks].reduce((sum, mm) => sum + mm * mm, 0);
}
