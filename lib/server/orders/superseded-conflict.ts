/** Refuses work on a revision that holds no more, and says what to do instead. */
import "server-only";
import type { Connection } from "@/db/client";
import { findOrder } from "@/db/queries/order";
import type { ShopId } from "@/db/shop-id";
import { revisionLetter } from "@/lib/words/revision-letter";
import { supersededWhy } from "@/lib/words/superseded";
import { conflict } from "../faults";

/** The detail carries the newest revision for the screen. */
export async function supersededConflict(tx: Connection, shopId: ShopId, orderId: string, revision: number) {
  const order = await findOrder(tx, shopId, orderId);
  const newer = order && order.revision > revision;
  const way = newer
    ? `Go on with revision ${revisionLetter(order.revision)}.`
    : "Ask the maker to issue the layout again before anything more is cut.";
  const message = `Revision ${revisionLetter(revision)} is superseded: ${supersededWhy}. ${way}`;
  return conflict(message, { newestRevision: order?.revision ?? revision });
}
