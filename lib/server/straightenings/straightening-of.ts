/** A version of a board's picture as the browser sees it: addresses of its levels instead of storage keys, and its zones. */
import "server-only";
import type { Connection } from "@/db/client";
import { listGlueLines } from "@/db/queries/glue-line";
import { listKeepClear, type StraighteningRow } from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import type { ServedLevel } from "@/lib/schemas/photo";
import type { Straightening } from "@/lib/schemas/straightening";

export async function straighteningOf(db: Connection, shopId: ShopId, row: StraighteningRow): Promise<Straightening> {
  return {
    id: row.id,
    boardId: row.boardId,
    photoId: row.photoId,
    side: row.side,
    version: row.version,
    marking: row.marking,
    state: row.state,
    failure: row.failure,
    taskId: row.state === "waiting" ? row.taskId : null,
    length: row.length,
    width: row.width,
    pxPerMm: row.pxPerMm,
    residual: row.residual,
    levels: row.levels.map((level) => servedLevel(row.id, level)),
    zones: {
      outline: row.outline,
      keepClear: await listKeepClear(db, shopId, row.id),
      glueLines: await listGlueLines(db, shopId, row.id),
      revision: row.zonesRevision,
    },
    createdAt: row.createdAt.toISOString(),
  };
}

export function servedLevel(straighteningId: string, level: StraighteningRow["levels"][number]): ServedLevel {
  const { widthPx, heightPx } = level;
  return { widthPx, heightPx, url: `/api/straightenings/${straighteningId}/levels/${level.level}` };
}
