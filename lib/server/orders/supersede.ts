/**
 * A cut order holds for the layout and the wood it was made from; when either moves on, its revision is superseded, on screen, bench
 * and paper.
 */
import "server-only";
import type { Connection } from "@/db/client";
import { recordHistory } from "@/db/queries/history";
import { lockLiveRevisionsOfFace, setSuperseded } from "@/db/queries/order";
import type { ShopId } from "@/db/shop-id";
import type { SupersedeReason } from "@/lib/words/history-line";

/** Who made an order out of date, and by what: `reason` is kept in the history and read by lib/words/history-line.ts. */
export interface SupersedeCause {
  readonly userId: string;
  readonly reason: SupersedeReason;
}

/**
 * Marks every revision that still holds of the face's cut orders as superseded, with a history row each. Call it in the transaction
 * that changes what the orders were made from. Does nothing where no order was issued; answers how many revisions it marked.
 */
export async function markSuperseded(
  tx: Connection,
  shopId: ShopId,
  faceId: string,
  { userId, reason }: SupersedeCause,
  at: Date,
): Promise<number> {
  const live = await lockLiveRevisionsOfFace(tx, shopId, faceId);
  await setSuperseded(
    tx,
    shopId,
    live.map(({ id }) => id),
    at,
  );
  for (const { orderId, revision } of live) {
    const detail = { revision, faceId, reason };
    await recordHistory(tx, shopId, { userId, noun: "order", nounId: orderId, verb: "superseded", detail }, at);
  }
  return live.length;
}
