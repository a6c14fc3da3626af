/** The shop's own species. */
import "server-only";
import { and, asc, count, eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import { species } from "../schema";
import type { ShopId } from "../shop-id";

export type SpeciesFields = Omit<typeof species.$inferInsert, "id" | "shopId">;

export async function listSpecies(db: Connection, shopId: ShopId, limit: number) {
  return db.select().from(species).where(eq(species.shopId, shopId)).orderBy(asc(species.name), asc(species.id)).limit(limit);
}

export async function countSpecies(db: Connection, shopId: ShopId): Promise<number> {
  const [row] = await db.select({ count: count() }).from(species).where(eq(species.shopId, shopId));
  return row?.count ?? 0;
}

export async function findSpecies(db: Connection, shopId: ShopId, speciesId: string) {
  const [row] = await db
    .select()
    .from(species)
    .where(and(eq(species.shopId, shopId), eq(species.id, speciesId)));
  return row;
}

export async function insertSpecies(db: Connection, shopId: ShopId, fields: SpeciesFields): Promise<string> {
  const id = newId();
  await db.insert(species).values({ ...fields, id, shopId });
  return id;
}

export async function updateSpecies(db: Connection, shopId: ShopId, speciesId: string, fields: SpeciesFields) {
  await db
    .update(species)
    .set(fields)
    .where(and(eq(species.shopId, shopId), eq(species.id, speciesId)));
}

export async function deleteSpecies(db: Connection, shopId: ShopId, speciesId: string) {
  await db.delete(species).where(and(eq(species.shopId, shopId), eq(species.id, speciesId)));
}
