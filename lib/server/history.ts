/** Reading what happened. */
import "server-only";
import { listHistory } from "@/db/queries/history";
import { labelsOf } from "@/db/queries/labels";
import type { ShopId } from "@/db/shop-id";
import type { HistoryRow } from "@/lib/schemas/history";
import { database } from "./database";

interface Filter {
  readonly noun?: string | undefined;
  readonly nounId?: string | undefined;
  readonly limit: number;
}

export async function readHistory(shopId: ShopId, filter: Filter): Promise<HistoryRow[]> {
  const rows = await listHistory(database(), shopId, filter);
  const labels = await labelsOf(database(), shopId, rows);
  return rows.map((row) => {
    const { label = null, path = null } = labels.get(row.nounId) ?? {};
    return { ...row, at: row.at.toISOString(), label, path };
  });
}
