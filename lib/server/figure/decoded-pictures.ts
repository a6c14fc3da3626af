/**
 * Pictures decoded in a thread, the last few kept: while a layout is worked on its seams are read again and again from the same boards.
 * A stored level never changes, so what is kept cannot be out of date.
 */
import "server-only";
import sharp from "sharp";
import type { StockPicture } from "@/lib/layout";
import { storage } from "../storage";
import type { StoredPicture } from "./figure-job";

/** Of decoded pixels a thread may keep: the largest picture there is, 40 megapixels, or a few ordinary boards of 8. */
const MOST_BYTES = 130_000_000;

/** The one used longest ago comes first. */
const kept = new Map<string, StockPicture>();

export async function decodedPicture({ key, pxPerMm }: StoredPicture): Promise<StockPicture> {
  const known = kept.get(key);
  const picture = known ?? (await decode(key, pxPerMm));
  kept.delete(key);
  kept.set(key, picture);
  for (const oldest of kept.keys()) {
    if (oldest === key || bytesKept() <= MOST_BYTES) break;
    kept.delete(oldest);
  }
  return picture;
}

async function decode(key: string, pxPerMm: number): Promise<StockPicture> {
  const bytes = await storage().get(key);
  if (!bytes) throw new Error(`the picture ${key} is gone from the storage`);
  const { data, info } = await sharp(bytes).removeAlpha().toColourspace("srgb").raw().toBuffer({ resolveWithObject: true });
  return { pixels: { data, width: info.width, height: info.height, channels: 3 }, pxPerMm };
}

function bytesKept(): number {
  let sum = 0;
  for (const { pixels } of kept.values()) sum += pixels.data.byteLength;
  return sum;
}
