/** Cut orders, their frozen revisions and the ticks of the bench. */
import "server-only";
import { and, eq, inArray, isNull } from "drizzle-orm";
import type { Connection } from "../client";
import { cutOrderFace, orderRevision } from "../schema";
import type { ShopId } from "../shop-id";

/** The revisions that still hold of every order that cuts this face, locked until the transaction ends. */
export async function lockLiveRevisionsOfFace(tx: Connection, shopId: ShopId, faceId: string) {
  return tx
    .select({ id: orderRevision.id, orderId: orderRevision.orderId, revision: orderRevision.revision })
    .from(orderRevision)
    .innerJoin(cutOrderFace, eq(cutOrderFace.orderId, orderRevision.orderId))
    .where(and(eq(orderRevision.shopId, shopId), eq(cutOrderFace.faceId, faceId), isNull(orderRevision.supersededAt)))
    .orderBy(orderRevision.id)
    .for("update");
}

export async function setSuperseded(tx: Connection, shopId: ShopId, revisionIds: readonly string[], at: Date) {
  if (revisionIds.length === 0) return;
  await tx
    .update(orderRevision)
    .set({ supersededAt: at })
    .where(and(eq(orderRevision.shopId, shopId), inArray(orderRevision.id, [...revisionIds])));
}
