/** The shop's settings, saws and counters. */
import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import { saw, shop } from "../schema";
import type { ShopId } from "../shop-id";

export async function readShop(db: Connection, shopId: ShopId) {
  const [row] = await db.select().from(shop).where(eq(shop.id, shopId));
  return row;
}

/** Saves settings from a base revision; false when somebody saved in between. */
export async function updateShop(
  db: Connection,
  shopId: ShopId,
  baseRevision: number,
  fields: Partial<typeof shop.$inferInsert>,
) {
  const [result] = await db
    .update(shop)
    .set({ ...fields, revision: baseRevision + 1 })
    .where(and(eq(shop.id, shopId), eq(shop.revision, baseRevision)));
  return result.affectedRows === 1;
}

export async function listSaws(db: Connection, shopId: ShopId) {
  return db.select().from(saw).where(eq(saw.shopId, shopId)).orderBy(asc(saw.name), asc(saw.id));
}

export async function findSaw(db: Connection, shopId: ShopId, sawId: string) {
  const [row] = await db
    .select()
    .from(saw)
    .where(and(eq(saw.shopId, shopId), eq(saw.id, sawId)));
  return row;
}

export async function insertSaw(db: Connection, shopId: ShopId, fields: Omit<typeof saw.$inferInsert, "id" | "shopId">) {
  const id = newId();
  await db.insert(saw).values({ ...fields, id, shopId });
  return id;
}

export async function updateSaw(
  db: Connection,
  shopId: ShopId,
  sawId: string,
  fields: Omit<typeof saw.$inferInsert, "id" | "shopId">,
) {
  await db
    .update(saw)
    .set(fields)
    .where(and(eq(saw.shopId, shopId), eq(saw.id, sawId)));
}

type Counter = "nextBoardNumber" | "nextJobNumber" | "nextOrderNumber";

/** Takes the next number of a counter. The shop's row stays locked until the transaction ends, so no number is given twice. */
export async function takeNumber(tx: Connection, shopId: ShopId, counter: Counter): Promise<number> {
  const [row] = await tx.select({ next: shop[counter] }).from(shop).where(eq(shop.id, shopId)).for("update");
  if (!row) throw new Error("the shop of an open session is gone");
  await tx
    .update(shop)
    .set({ [counter]: row.next + 1 })
    .where(eq(shop.id, shopId));
  return row.next;
}
