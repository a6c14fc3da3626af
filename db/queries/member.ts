/** People and the shops they belong to. */
import "server-only";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import { membership, shop, user } from "../schema";
import type { ShopId } from "../shop-id";

type ShopFields = Omit<typeof shop.$inferInsert, "id" | "nextBoardNumber" | "nextJobNumber" | "nextOrderNumber" | "revision">;

/** Founds a shop. Its id exists from here on; this is the one place that makes one. */
export async function insertShop(db: Connection, fields: ShopFields): Promise<ShopId> {
  const id = newId() as ShopId;
  await db.insert(shop).values({ ...fields, id, nextBoardNumber: 1, nextJobNumber: 1, nextOrderNumber: 1, revision: 1 });
  return id;
}

export async function insertUser(
  db: Connection,
  fields: { email: string; name: string; passwordHash: string; createdAt: Date },
): Promise<string> {
  const id = newId();
  await db.insert(user).values({ ...fields, id, email: fields.email.toLowerCase() });
  return id;
}

export async function insertMembership(
  db: Connection,
  shopId: ShopId,
  fields: { userId: string; role: "owner" | "maker" | "assistant"; createdAt: Date },
) {
  await db.insert(membership).values({ shopId, ...fields });
}
