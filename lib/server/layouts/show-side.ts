/**
 * The show side as a picture: every piece cut out of its board's straightened photograph and put where it will stand, true to scale.
 * The image library does its work on threads of its own.
 */
import "server-only";
import sharp from "sharp";
import { findLayout, listLayoutBoards } from "@/db/queries/layout";
import type { StraighteningRow } from "@/db/queries/straightening";
import {
  facePieces,
  faceSize,
  groupOf,
  layOut,
  mmFromUm,
  type QuarterTurns,
  rectToStock,
  type StockRect,
  type Um,
  um,
} from "@/lib/layout";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { storage } from "../storage";

/** Gaps and pieces not laid on wood yet. */
const ground = { r: 21, g: 23, b: 24 };
/** A picture longer than this opens in no viewer worth the name. */
const maxSidePx = 16_000;
const maxPixels = 60_000_000;

export async function showSidePng(access: ShopAccess, faceId: string, pxPerMm: number): Promise<Uint8Array> {
  const db = database();
  const found = await findLayout(db, access.shopId, faceId);
  if (!found) throw notFound("face");
  const { document } = found.layout;
  const boards = await listLayoutBoards(db, access.shopId, found.layout.id);
  const toPx = (length: Um) => Math.round(mmFromUm(length) * pxPerMm);

  const { width, height } = faceSize(document.face);
  const size = { width: Math.max(1, toPx(width)), height: Math.max(1, toPx(height)) };
  if (Math.max(size.width, size.height) > maxSidePx || size.width * size.height > maxPixels) {
    throw refused(
      `At ${pxPerMm} pixels a millimetre the picture would have ${size.width} × ${size.height} pixels. Ask for fewer.`,
    );
  }

  const rects = new Map(facePieces(document).map(({ id, rect }) => [id, rect]));
  const layers = layOut(document).map(async (piece) => {
    const straightening = boards.find(({ board }) => board.id === piece.stockId)?.straightening;
    const rect = rects.get(piece.id);
    if (!straightening || !rect) throw new Error(`piece ${piece.id} lies on a board that is not on the table`);
    // Both edges are rounded, not the size: neighbours keep their gap to the pixel.
    const left = toPx(rect.x);
    const top = toPx(rect.y);
    const box = {
      width: Math.max(1, toPx(um(rect.x + rect.width)) - left),
      height: Math.max(1, toPx(um(rect.y + rect.height)) - top),
    };
    const turns = groupOf(document, piece.id)?.placement?.turns ?? 0;
    return { input: await cutOut(straightening, rectToStock(piece.stockFromFace, rect), turns, box, pxPerMm), left, top };
  });
  return sharp({ create: { ...size, channels: 3, background: ground } })
    .composite(await Promise.all(layers))
    .png({ compressionLevel: 6 })
    .toBuffer();
}

interface Box {
  readonly width: number;
  readonly height: number;
}

/** The wood under a piece, turned to stand as on the face, in pixels of the face. Where the piece hangs over the picture: ground. */
async function cutOut(
  straightening: StraighteningRow,
  rect: StockRect,
  turns: QuarterTurns,
  box: Box,
  pxPerMm: number,
): Promise<Buffer> {
  const level = levelFor(straightening, pxPerMm);
  const bytes = await storage().get(level.key);
  if (!bytes) throw new Error(`the picture ${level.key} is gone from the storage`);
  const scale = level.widthPx / mmFromUm(straightening.length);
  const edge = (length: number) => Math.round(mmFromUm(um(length)) * scale);
  const wanted = { left: edge(rect.x), top: edge(rect.y), right: edge(rect.x + rect.width), bottom: edge(rect.y + rect.height) };
  const there = {
    left: Math.max(0, wanted.left),
    top: Math.max(0, wanted.top),
    right: Math.min(level.widthPx, wanted.right),
    bottom: Math.min(level.heightPx, wanted.bottom),
  };
  if (there.right <= there.left || there.bottom <= there.top) {
    return sharp({ create: { ...box, channels: 3, background: ground } })
      .png()
      .toBuffer();
  }
  const { data, info } = await sharp(bytes)
    .extract({ left: there.left, top: there.top, width: there.right - there.left, height: there.bottom - there.top })
    .extend({
      left: there.left - wanted.left,
      top: there.top - wanted.top,
      right: wanted.right - there.right,
      bottom: wanted.bottom - there.bottom,
      background: ground,
    })
    .raw()
    .toBuffer({ resolveWithObject: true });
  const raw = { width: info.width, height: info.height, channels: info.channels };
  // The turns lead from the face to the stock, so the picture turns back by as many.
  return sharp(data, { raw })
    .rotate(((4 - turns) % 4) * 90)
    .resize({ ...box, fit: "fill" })
    .png({ compressionLevel: 1 })
    .toBuffer();
}

/** The smallest level that still has the resolution asked for. Level 0 is the largest. */
function levelFor({ levels, length }: StraighteningRow, pxPerMm: number): StraighteningRow["levels"][number] {
  const fine = levels.filter(({ widthPx }) => widthPx / mmFromUm(length) >= pxPerMm);
  const level = fine.at(-1) ?? levels[0];
  if (!level) throw new Error("a finished straightening has no levels");
  return level;
}
