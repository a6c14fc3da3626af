/** The story of the shop: written with the change, read for Today and for one thing. */
import "server-only";
import { and, desc, eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import { history, user } from "../schema";
import type { ShopId } from "../shop-id";

type Detail = typeof history.$inferInsert.detail;

export interface HistoryEntry {
  readonly userId: string | null;
  readonly noun: "board" | "photo" | "straightening" | "job" | "face" | "layout" | "order" | "shop" | "saw" | "species";
  readonly nounId: string;
  readonly verb: string;
  readonly detail?: Detail;
}

/** Call it with the transaction that makes the change, never outside one. */
export async function recordHistory(db: Connection, shopId: ShopId, entry: HistoryEntry, at: Date) {
  await db.insert(history).values({
    id: newId(),
    shopId,
    at,
    userId: entry.userId,
    noun: entry.noun,
    nounId: entry.nounId,
    verb: entry.verb,
    detail: entry.detail ?? {},
  });
}

export async function listHistory(db: Connection, shopId: ShopId, filter: { noun?: string; nounId?: string; limit: number }) {
  return db
    .select({
      id: history.id,
      at: history.at,
      by: user.name,
      noun: history.noun,
      nounId: history.nounId,
      verb: history.verb,
      detail: history.detail,
    })
    .from(history)
    .leftJoin(user, eq(user.id, history.userId))
    .where(
      and(
        eq(history.shopId, shopId),
        filter.noun === undefined ? undefined : eq(history.noun, filter.noun),
        filter.nounId === undefined ? undefined : eq(history.nounId, filter.nounId),
      ),
    )
    .orderBy(desc(history.at), desc(history.id))
    .limit(filter.limit);
}
