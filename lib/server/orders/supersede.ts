/** A cut order holds for the layout it was made from; when that moves on, its revision is superseded, on screen, bench and paper. */
import "server-only";
import type { Connection } from "@/db/client";
import { recordHistory } from "@/db/queries/history";
import { lockLiveRevisionsOfFace, setSuperseded } from "@/db/queries/order";
import type { ShopId } from "@/db/shop-id";

/**
 * Marks every revision that still holds of the face's cut orders as superseded, with a history row each. Call it in the transaction
 * that changes the face's layout. Does nothing where no order was issued; answers how many revisions it marked.
 */
export async function markSuperseded(tx: Connection, shopId: ShopId, faceId: string, at: Date): Promise<number> {
  const live = await lockLiveRevisionsOfFace(tx, shopId, faceId);
  await setSuperseded(
    tx,
    shopId,
    live.map(({ id }) => id),
    at,
  );
  for (const { orderId, revision } of live) {
    // By nobody: who changed the layout stands in the layout's own history row of the same transaction.
    const entry = { userId: null, noun: "order", nounId: orderId, verb: "superseded", detail: { revision, faceId } } as const;
    await recordHistory(tx, shopId, entry, at);
  }
  return live.length;
}
