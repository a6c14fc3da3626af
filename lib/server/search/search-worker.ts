/** The program of a search thread. Bundled on its own, because threads load plain JavaScript. */
import "server-only";
import sharp from "sharp";
import { type BoardFace, searchPicture, searchPlaces } from "@/lib/layout";
import type { StoredPicture } from "../figure/figure-job";
import { stopIfCancelled } from "../pictures/cancel-flag";
import { storage } from "../storage";
import type { SearchAnswer, SearchTask } from "./search-job";

// A rack is looked through board by board; kept pictures would only hold memory.
sharp.cache(false);

/** Shares of progress smaller than this are not worth a message. */
const TOLD_SHARE = 0.02;

export default async function search({ asked, cancel, progress }: SearchTask): Promise<SearchAnswer> {
  const { request, sides, neighbours } = asked;
  const slices = searchPlaces({
    ...request,
    sides: await Promise.all(
      sides.map(async ({ side, board, picture }) => ({ side, board, picture: await read(picture, board) })),
    ),
    neighbours: await Promise.all(
      neighbours.map(async ({ stockId, board, picture }) => ({ stockId, picture: await read(picture, board) })),
    ),
  });
  let told = 0;
  for (let slice = slices.next(); ; slice = slices.next()) {
    if (slice.done) return slice.value;
    stopIfCancelled(cancel);
    if (slice.value < told + TOLD_SHARE) continue;
    told = slice.value;
    progress.postMessage(told);
  }
}

async function read({ key, pxPerMm }: StoredPicture, board: Pick<BoardFace, "length" | "width">) {
  const bytes = await storage().get(key);
  if (!bytes) throw new Error(`the picture ${key} is gone from the storage`);
  const { data, info } = await sharp(bytes).removeAlpha().toColourspace("srgb").raw().toBuffer({ resolveWithObject: true });
  return searchPicture({ data, width: info.width, height: info.height, channels: 3 }, pxPerMm, board);
}
