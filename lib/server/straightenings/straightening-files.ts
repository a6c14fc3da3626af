/** Where the levels of a straightened picture lie. Keys come from the version's id alone, so work done twice writes the same files. */
import "server-only";
import type { StraighteningRow } from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import type { EncodedLevel } from "../pictures/encode-levels";
import { storage } from "../storage";

const prefixOf = (shopId: ShopId, straighteningId: string) => `shops/${shopId}/straightenings/${straighteningId}`;

/** Where something read from a finished picture is kept beside it, and goes with it. */
export const straighteningFileKey = (shopId: ShopId, straighteningId: string, name: string) =>
  `${prefixOf(shopId, straighteningId)}/${name}`;

export async function putStraighteningFiles(
  shopId: ShopId,
  straighteningId: string,
  levels: readonly EncodedLevel[],
  signal: AbortSignal,
): Promise<StraighteningRow["levels"]> {
  const stored: StraighteningRow["levels"] = [];
  for (const { level, widthPx, heightPx, bytes } of levels) {
    signal.throwIfAborted();
    const key = `${prefixOf(shopId, straighteningId)}/level-${level}.jpg`;
    await storage().put(key, bytes);
    stored.push({ level, widthPx, heightPx, key });
  }
  return stored;
}

export async function removeStraighteningFiles(shopId: ShopId, straighteningId: string): Promise<void> {
  await storage().removePrefix(prefixOf(shopId, straighteningId));
}
