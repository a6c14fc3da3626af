/**
 * The rack's boards in the order of what they are worth for a group, as they come in one by one. What a board can be worth at the most is
 * known before its picture is read, so that the most promising come first and a search may say when nothing better can come.
 */
import type { StockId } from "../piece";
import type { NoPlace } from "./no-place";
import { partNames, totalOf, type Weights } from "./objective";
import type { FoundPlace, PlaceSearch } from "./search-places";
import type { StockLeftOut } from "./stock-left-out";

export type StockResult =
  | { readonly stockId: StockId; readonly place: FoundPlace; readonly leftOut: null }
  | { readonly stockId: StockId; readonly place: null; readonly leftOut: readonly StockLeftOut[] };

/** What the search of one board for the best place came to. */
export function stockResult(stockId: StockId, search: PlaceSearch): StockResult {
  const [place] = search.places;
  if (place !== undefined) return { stockId, place, leftOut: null };
  return { stockId, place: null, leftOut: search.none === null ? [] : reasonsFor(search.none) };
}

function reasonsFor(none: NoPlace): StockLeftOut[] {
  switch (none.reason) {
    case "too-large": {
      const { tooShortBy, tooNarrowBy } = none;
      return [
        ...(tooShortBy > 0 ? [{ reason: "too-short", by: tooShortBy } as const] : []),
        ...(tooNarrowBy > 0 ? [{ reason: "too-narrow", by: tooNarrowBy } as const] : []),
      ];
    }
    case "in-the-way":
      return [{ reason: "no-place", obstacles: none.obstacles }];
    case "no-side":
      return [{ reason: "no-picture" }];
  }
}

/**
 * What a board can be worth at the most, 0..1: everything perfect but how glad the shop is to use it. Holds also where parts do not apply,
 * since leaving a perfect part out only lowers a mean with one that is not.
 */
export function stockBound(weights: Weights, stock: number): number {
  const perfect = Object.fromEntries(partNames.map((name) => [name, 1])) as Record<(typeof partNames)[number], number>;
  return totalOf({ ...perfect, stock }, weights);
}

/** Boards in the order to search them: those that can be worth most first, of equal ones by id. */
export function searchOrder<Candidate extends { readonly stockId: StockId; readonly stock: number }>(
  candidates: readonly Candidate[],
  weights: Weights,
): Candidate[] {
  return [...candidates].sort(
    (p, q) => stockBound(weights, q.stock) - stockBound(weights, p.stock) || compareIds(p.stockId, q.stockId),
  );
}

/** Best first, of equal ones by id; boards without a place after them, by id. */
export function rankStock(results: readonly StockResult[]): StockResult[] {
  const worth = ({ place }: StockResult) => place?.value.total ?? -1;
  return [...results].sort((p, q) => worth(q) - worth(p) || compareIds(p.stockId, q.stockId));
}

/** Whether no board that is still to be searched can come before what was found: `waiting` are their bounds. */
export function isSettled(results: readonly StockResult[], waiting: readonly number[]): boolean {
  const best = Math.max(-1, ...results.map(({ place }) => place?.value.total ?? -1));
  return waiting.every((bound) => bound <= best);
}

function compareIds(p: StockId, q: StockId): number {
  return p < q ? -1 : p > q ? 1 : 0;
}
