/** Versions of boards' straightened pictures with their zones. */
import "server-only";
import { and, asc, eq } from "drizzle-orm";
import type { Connection } from "../client";
import { keepClear, straightening } from "../schema";
import type { ShopId } from "../shop-id";

export type StraighteningRow = typeof straightening.$inferSelect;

export async function findStraightening(db: Connection, shopId: ShopId, straighteningId: string) {
  const [row] = await db
    .select()
    .from(straightening)
    .where(and(eq(straightening.shopId, shopId), eq(straightening.id, straighteningId)));
  return row;
}

export async function listKeepClear(db: Connection, shopId: ShopId, straighteningId: string) {
  return db
    .select({ id: keepClear.id, kind: keepClear.kind, area: keepClear.area, note: keepClear.note })
    .from(keepClear)
    .where(and(eq(keepClear.shopId, shopId), eq(keepClear.straighteningId, straighteningId)))
    .orderBy(asc(keepClear.id));
}
