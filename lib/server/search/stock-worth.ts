/**
 * How glad the shop is to use a board, 0 to 1: old boards before new ones, cheap ones before dear ones, each half of it. A year in the rack is as
 * old as counts; cost is compared by area with the dearest board in question, and a board without a price counts as middling. Our own choice.
 */
import "server-only";
import type { Um } from "@/lib/layout";

const YEAR_MS = 365 * 24 * 3600 * 1000;

export interface PricedBoard {
  readonly length: Um;
  readonly width: Um;
  readonly costMinor: number | null;
  readonly createdAt: Date;
}

/** In the order given. */
export function stockWorths(boards: readonly PricedBoard[], now: Date): number[] {
  const prices = boards.map(priceByArea);
  const dearest = Math.max(0, ...prices.map((price) => price ?? 0));
  return boards.map(({ createdAt }, index) => {
    const age = Math.min(1, Math.max(0, (now.getTime() - createdAt.getTime()) / YEAR_MS));
    const price = prices[index] ?? null;
    const cheap = price === null || dearest === 0 ? 0.5 : 1 - price / dearest;
    return (age + cheap) / 2;
  });
}

function priceByArea({ length, width, costMinor }: PricedBoard): number | null {
  return costMinor === null ? null : costMinor / (length * width);
}
