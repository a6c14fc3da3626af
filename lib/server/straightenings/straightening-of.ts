/** A version of a board's picture as the browser sees it: addresses of its levels instead of storage keys, and its zones. */
import "server-only";
import type { Connection } from "@/db/client";
import { listKeepClear, type StraighteningRow } from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import type { Straightening } from "@/lib/schemas/straightening";

export async function straighteningOf(db: Connection, shopId: ShopId, row: StraighteningRow): Promise<Straightening> {
  return {
    id: row.id,
    boardId: row.boardId,
    photoId: row.photoId,
    version: row.version,
    marking: row.marking,
    state: row.state,
    failure: row.failure,
    taskId: row.state === "waiting" ? row.taskId : null,
    length: row.length,
    width: row.width,
    pxPerMm: row.pxPerMm,
    residual: row.residual,
    levels: row.levels.map(({ level, widthPx, heightPx }) => ({
      widthPx,
      heightPx,
      url: `/api/straightenings/${row.id}/levels/${level}`,
    })),
    zones: { outline: row.outline, keepClear: await listKeepClear(db, shopId, row.id), revision: row.zonesRevision },
    createdAt: row.createdAt.toISOString(),
  };
}
