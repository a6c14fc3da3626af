/** What the bench entered while it cut by a revision. */
import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import { asCut, user } from "../schema";
import type { ShopId } from "../shop-id";

type AsCutRow = typeof asCut.$inferSelect;

/** In the order in which they were entered first. */
export async function listAsCut(db: Connection, shopId: ShopId, revisionId: string) {
  return db
    .select({ id: asCut.id, entry: asCut.entry, version: asCut.version, by: user.name, at: asCut.enteredAt })
    .from(asCut)
    .innerJoin(user, eq(user.id, asCut.enteredBy))
    .where(and(eq(asCut.shopId, shopId), eq(asCut.revisionId, revisionId)))
    .orderBy(asc(asCut.id));
}

export async function findAsCutBySubject(db: Connection, shopId: ShopId, revisionId: string, subject: string) {
  const [row] = await db
    .select()
    .from(asCut)
    .where(and(eq(asCut.shopId, shopId), eq(asCut.revisionId, revisionId), eq(asCut.subject, subject)));
  return row;
}

export async function findAsCut(db: Connection, shopId: ShopId, revisionId: string, id: string): Promise<AsCutRow | undefined> {
  const [row] = await db
    .select()
    .from(asCut)
    .where(and(eq(asCut.shopId, shopId), eq(asCut.revisionId, revisionId), eq(asCut.id, id)));
  return row;
}

/** Call it with the revision locked, as all that write here. */
export async function insertAsCut(
  tx: Connection,
  shopId: ShopId,
  fields: Pick<AsCutRow, "revisionId" | "kind" | "subject" | "entry" | "enteredBy" | "enteredAt">,
): Promise<void> {
  await tx.insert(asCut).values({ ...fields, id: newId(), shopId, version: 1 });
}

export async function correctAsCut(
  tx: Connection,
  shopId: ShopId,
  id: string,
  fields: Pick<AsCutRow, "entry" | "version" | "enteredBy" | "enteredAt">,
): Promise<void> {
  await tx
    .update(asCut)
    .set(fields)
    .where(and(eq(asCut.shopId, shopId), eq(asCut.id, id)));
}

export async function deleteAsCut(tx: Connection, shopId: ShopId, id: string): Promise<void> {
  await tx.delete(asCut).where(and(eq(asCut.shopId, shopId), eq(asCut.id, id)));
}
