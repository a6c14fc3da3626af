/** Where the files of a photograph lie, and putting them there. */
import "server-only";
import type { PhotoRow } from "@/db/queries/photo";
import type { ShopId } from "@/db/shop-id";
import type { EncodedLevel } from "../pictures/encode-levels";
import { storage } from "../storage";

/** Everything of one photograph lies under this prefix. */
const prefixOf = (shopId: ShopId, photoId: string) => `shops/${shopId}/photos/${photoId}`;

type StoredFiles = Pick<PhotoRow, "originalKey" | "levels">;

/** Stores the untouched file, which is never served, and the upright levels. */
export async function putPhotoFiles(
  shopId: ShopId,
  photoId: string,
  original: Uint8Array,
  levels: readonly EncodedLevel[],
): Promise<StoredFiles> {
  const prefix = prefixOf(shopId, photoId);
  const originalKey = `${prefix}/original`;
  await storage().put(originalKey, original);
  const stored: PhotoRow["levels"] = [];
  for (const { level, widthPx, heightPx, bytes } of levels) {
    const key = `${prefix}/level-${level}.jpg`;
    await storage().put(key, bytes);
    stored.push({ level, widthPx, heightPx, key });
  }
  return { originalKey, levels: stored };
}

export async function removePhotoFiles(shopId: ShopId, photoId: string): Promise<void> {
  await storage().removePrefix(prefixOf(shopId, photoId));
}
