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

/**
 * Fine figure survives; a 12-megapixel photograph of wood takes 3 to 5 MB. Coding tables made for each picture would save a twentieth
 * of the bytes and take more than twice the time.
 */
export const levelJpeg = { quality: 90, optimiseCoding: false } as const;

/** Every level from the full picture down, each made from the one before; `onShare` gets the share of pixels done after each, and may throw to end the work. */
export async function encodeLevels(pixels: Pixels, onShare: (share: number) => void): Promise<readonly EncodedLevel[]> {
  const [, ...smaller] = pyramidLevels(pixels.width, pixels.height);
  const total = smaller.reduce((sum, { width, height }) => sum + width * height, pixels.width * pixels.height);
  let done = 0;
  const encoded = async (level: number, of: Pixels): Promise<EncodedLevel> => {
    const bytes = await bare(of).jpeg(levelJpeg).toBuffer();
    done += of.width * of.height;
    onShare(done / total);
    return { level, widthPx: of.width, heightPx: of.height, bytes };
  };
  // The full picture takes about as long as all the others together. Both ways are waited for, also when one fails: they read the same pixels.
  const [full, others] = await Promise.allSettled([encoded(0, pixels), smallerLevels(pixels, smaller, encoded)]);
  if (full.status === "rejected") throw full.reason;
  if (others.status === "rejected") throw others.reason;
  return [full.value, ...others.value];
}

async function smallerLevels(
  pixels: Pixels,
  sizes: readonly LevelSize[],
  encoded: (level: number, of: Pixels) => Promise<EncodedLevel>,
): Promise<readonly EncodedLevel[]> {
  const levels: EncodedLevel[] = [];
  let current = pixels;
  for (const size of sizes) {
    current = await halve(current, size);
    levels.push(await encoded(size.level, current));
  }
  return levels;
}

/** Weights of 1, 3, 3, 1 eighths each way: for halving as good as wider kernels, and quicker. */
async function halve(pixels: Pixels, { width, height }: LevelSize): Promise<Pixels> {
  const data = await bare(pixels).resize({ width, height, fit: "fill", kernel: "linear" }).raw().toBuffer();
  return { data, width, height, channels: pixels.channels };
}

function bare({ data, width, height, channels }: Pixels): Sharp {
  return sharp(data, { raw: { width, height, channels } });
}
