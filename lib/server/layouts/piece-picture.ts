/**
 * The wood under one piece, out of a board's straightened picture. A picture is decoded once and held as plain pixels while all
 * pieces of its board are cut from it. Knows nothing of layouts.
 */
import "server-only";
import sharp from "sharp";
import type { StraighteningRow } from "@/db/queries/straightening";
import { mmFromUm, type QuarterTurns, type StockRect, type Um, um } from "@/lib/layout";
import { storage } from "../storage";

export interface BoxPx {
  readonly width: number;
  readonly height: number;
}

/** RGB, row by row from the upper left. */
export interface Pixels extends BoxPx {
  readonly data: Buffer;
}

/** A straightened picture decoded, with the size of the wood it shows. At most 40 megapixels: no picture is made larger. */
export interface WoodPixels extends Pixels {
  readonly pxPerMmAlong: number;
  readonly pxPerMmAcross: number;
}

export type Colour = { readonly r: number; readonly g: number; readonly b: number };

/** Decodes the smallest level that still has the resolution asked for. */
export async function woodPixels(straightening: StraighteningRow, pxPerMm: number): Promise<WoodPixels> {
  const level = levelFor(straightening, pxPerMm);
  const bytes = await storage().get(level.key);
  if (!bytes) throw new Error(`the picture ${level.key} is gone from the storage`);
  const { data, info } = await sharp(bytes).removeAlpha().toColourspace("srgb").raw().toBuffer({ resolveWithObject: true });
  return {
    data,
    width: info.width,
    height: info.height,
    // Level sizes are rounded up, each side by itself.
    pxPerMmAlong: info.width / mmFromUm(straightening.length),
    pxPerMmAcross: info.height / mmFromUm(straightening.width),
  };
}

/** The wood under `rect`, turned to stand as on the face and `box` large. Where the piece hangs over the picture: `ground`. */
export async function pieceFromWood(
  wood: WoodPixels,
  rect: StockRect,
  turns: QuarterTurns,
  box: BoxPx,
  ground: Colour,
): Promise<Buffer> {
  const along = (x: number) => edgePx(um(x), wood.pxPerMmAlong);
  const across = (y: number) => edgePx(um(y), wood.pxPerMmAcross);
  const wanted = {
    left: along(rect.x),
    right: along(rect.x + rect.width),
    top: across(rect.y),
    bottom: across(rect.y + rect.height),
  };
  const there = {
    left: Math.max(0, wanted.left),
    right: Math.min(wood.width, wanted.right),
    top: Math.max(0, wanted.top),
    bottom: Math.min(wood.height, wanted.bottom),
  };
  if (there.right <= there.left || there.bottom <= there.top) {
    return sharp({ create: { ...box, channels: 3, background: ground } })
      .raw()
      .toBuffer();
  }
  const cut = await ofRgb(wood)
    .extract({ left: there.left, top: there.top, width: there.right - there.left, height: there.bottom - there.top })
    .extend({
      left: there.left - wanted.left,
      right: wanted.right - there.right,
      top: there.top - wanted.top,
      bottom: wanted.bottom - there.bottom,
      background: ground,
    })
    .raw()
    .toBuffer();
  // The turns lead from the face to the stock, so the picture turns back by as many.
  return ofRgb({ data: cut, width: wanted.right - wanted.left, height: wanted.bottom - wanted.top })
    .rotate(((4 - turns) % 4) * 90)
    .resize({ ...box, fit: "fill" })
    .raw()
    .toBuffer();
}

const edgePx = (length: Um, pxPerMm: number) => Math.round(mmFromUm(length) * pxPerMm);

const ofRgb = ({ data, width, height }: Pixels) => sharp(data, { raw: { width, height, channels: 3 } });

/** Level 0 is the largest. */
function levelFor({ levels, length }: StraighteningRow, pxPerMm: number): StraighteningRow["levels"][number] {
  const fine = levels.filter(({ widthPx }) => widthPx / mmFromUm(length) >= pxPerMm);
  const level = fine.at(-1) ?? levels[0];
  if (!level) throw new Error("a finished straightening has no levels");
  return level;
}
