/** Which stored level of a straightened picture figure is read from. */
import "server-only";
import type { StraighteningRow } from "@/db/queries/straightening";
import type { StoredPicture } from "./figure-job";

/** The default scale of a straightened picture; finer pixels say nothing more about grain and cost time. */
const ENOUGH_PX_PER_MM = 4;

/** The smallest level with four pixels to the millimetre, else the largest; null before the picture is made. */
export function figureLevel({ levels, pxPerMm }: Pick<StraighteningRow, "levels" | "pxPerMm">): StoredPicture | null {
  // Every level halves the one before.
  const scaled = levels.map(({ key, level }) => ({ key, pxPerMm: pxPerMm / 2 ** level }));
  const enough = scaled.filter((level) => level.pxPerMm >= ENOUGH_PX_PER_MM).sort((p, q) => p.pxPerMm - q.pxPerMm)[0];
  return enough ?? scaled.sort((p, q) => q.pxPerMm - p.pxPerMm)[0] ?? null;
}
