/** What the paper is made from: the order as frozen, and the few things of today that paper needs. */
import "server-only";
import type { Order } from "@/lib/schemas/order";

/** A board's straightened picture as a JPEG, stretched over the board's whole rectangle. */
export interface BoardPicture {
  readonly jpeg: Uint8Array;
}

export interface PrintOrder {
  readonly order: Order;
  /** The zone in which dates are written. */
  readonly timeZone: string;
  /** Where the bench page of this order is. */
  readonly benchUrl: string;
  /** By straightening; a board without one is drawn as a plain rectangle. */
  readonly pictures: ReadonlyMap<string, BoardPicture>;
}

export function printDate(iso: string, timeZone: string): string {
  return new Intl.DateTimeFormat("en-GB", { timeZone, day: "numeric", month: "short", year: "numeric" }).format(new Date(iso));
}

export function printMoment(iso: string, timeZone: string): string {
  const time = new Intl.DateTimeFormat("en-GB", { timeZone, hour: "2-digit", minute: "2-digit" }).format(new Date(iso));
  return `${printDate(iso, timeZone)}, ${time}`;
}

/** The moment this revision was superseded, or null while it holds. */
export function supersededAt({ revisions, revisionId }: Order): string | null {
  return revisions.find(({ id }) => id === revisionId)?.supersededAt ?? null;
}
