/** The shop's settings, saws and counters. */
import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { z } from "zod";
import { usualLimits } from "@/lib/schemas/saw-limits";
import type { Saw, saveSawSchema } from "@/lib/schemas/shop";
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

export async function listSaws(db: Connection, shopId: ShopId): Promise<Saw[]> {
  const rows = await db.select().from(saw).where(eq(saw.shopId, shopId)).orderBy(asc(saw.name), asc(saw.id));
  return rows.map(sawOf);
}

export async function findSaw(db: Connection, shopId: ShopId, sawId: string): Promise<Saw | undefined> {
  const [row] = await db
    .select()
    .from(saw)
    .where(and(eq(saw.shopId, shopId), eq(saw.id, sawId)));
  return row && sawOf(row);
}

export type SawFields = z.output<typeof saveSawSchema>;

/** With the limits usual for its kind where none are given. */
export async function insertSaw(db: Connection, shopId: ShopId, { limits, ...fields }: SawFields): Promise<string> {
  const id = newId();
  await db.insert(saw).values({ ...fields, ...(limits ?? usualLimits[fields.kind]), id, shopId });
  return id;
}

/** Limits stay where none are given. */
export async function updateSaw(db: Connection, shopId: ShopId, sawId: string, { limits, ...fields }: SawFields) {
  await db
    .update(saw)
    .set({ ...fields, ...limits })
    .where(and(eq(saw.shopId, shopId), eq(saw.id, sawId)));
}

function sawOf({ id, name, kind, kerf, cleanUp, ...row }: typeof saw.$inferSelect): Saw {
  const { rips, crosscuts, widestRip, longestCrosscut, shortest, narrowest } = row;
  return { id, name, kind, kerf, cleanUp, limits: { rips, crosscuts, widestRip, longestCrosscut, shortest, narrowest } };
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
