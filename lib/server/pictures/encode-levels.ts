/** A picture as JPEGs of falling size. They are made from bare pixels, so nothing of the camera's tags can be in them. */
import "server-only";
import sharp, { type Sharp } from "sharp";
import { type LevelSize, type Pixels, pyramidLevels } from "@/lib/layout";

export interface EncodedLevel {
  /** 0 is the full size, each next one half of it. */
  readonly level: number;
  readonly widthPx: number;
  readonly heightPx: number;
  /** JPEG, sRGB. */
  readonly bytes: Uint8Array;
}

/** Fine figure survives; a 12-megapixel photograph of wood takes 3 to 5 MB. */
const quality = 90;

/** Every level from the full picture down, each made from the one before; `onShare` gets the share of pixels done after each. */
export async function encodeLevels(pixels: Pixels, onShare: (share: number) => void): Promise<readonly EncodedLevel[]> {
  const sizes = pyramidLevels(pixels.width, pixels.height);
  const total = sizes.reduce((sum, { width, height }) => sum + width * height, 0);
  const levels: EncodedLevel[] = [];
  let current = pixels;
  let done = 0;
  for (const size of sizes) {
    if (size.level > 0) current = await halve(current, size);
    levels.push(await encode(current, size.level));
    done += size.width * size.height;
    onShare(done / total);
  }
  return levels;
}

async function encode(pixels: Pixels, level: number): Promise<EncodedLevel> {
  const bytes = await bare(pixels).jpeg({ quality }).toBuffer();
  return { level, widthPx: pixels.width, heightPx: pixels.height, bytes };
}

async function halve(pixels: Pixels, { width, height }: LevelSize): Promise<Pixels> {
  const data = await bare(pixels).resize({ width, height, fit: "fill" }).raw().toBuffer();
  return { data, width, height, channels: pixels.channels };
}

function bare({ data, width, height, channels }: Pixels): Sharp {
  return sharp(data, { raw: { width, height, channels } });
}
