/** Reading what happened. */
import "server-only";
import { listHistory } from "@/db/queries/history";
import type { ShopId } from "@/db/shop-id";
import { database } from "./database";

export async function readHistory(
  shopId: ShopId,
  filter: { noun?: string | undefined; nounId?: string | undefined; limit: number },
) {
  const rows = await listHistory(database(), shopId, filter);
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
}
