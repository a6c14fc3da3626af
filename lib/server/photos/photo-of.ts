/** A photograph as the browser sees it: addresses of its upright levels, nothing of the original but its size and name. */
import "server-only";
import type { PhotoRow } from "@/db/queries/photo";
import type { Photo } from "@/lib/schemas/photo";

export function photoOf(row: PhotoRow): Photo {
  return {
    id: row.id,
    fileName: row.fileName,
    kind: row.kind,
    bytes: row.bytes,
    widthPx: row.widthPx,
    heightPx: row.heightPx,
    takenAt: row.takenAt?.toISOString() ?? null,
    camera: row.camera,
    focalLengthMm: row.focalLengthHundredths === null ? null : row.focalLengthHundredths / 100,
    levels: row.levels.map(({ level, widthPx, heightPx }) => ({
      widthPx,
      heightPx,
      url: `/api/photos/${row.id}/levels/${level}`,
    })),
    createdAt: row.createdAt.toISOString(),
  };
}
