/** HEVC pictures from phones, decoded by libheif in WebAssembly: the image library reads their headers, but holds no HEVC decoder. */
import "server-only";
import decode from "heic-decode";
import sharp from "sharp";
import type { Pixels } from "@/lib/layout";
import { pngWithProfile } from "./tag-profile";

/** Rows converted at once where a colour profile asks for it; keeps the copies small beside a 48-megapixel picture. */
const stripRows = 512;

/**
 * The main picture, upright (the file's own turns are applied by the decoder), as sRGB. `width` and `height` are those of the
 * header; nothing larger is decoded. Throws where the file is not whole.
 */
export async function decodeHeic(
  bytes: Uint8Array,
  width: number,
  height: number,
  profile: Uint8Array | undefined,
): Promise<Pixels> {
  const images = await decode.all({ buffer: bytes });
  try {
    // A file may hold further pictures; the header that was checked speaks of the main one.
    const image = images.find((candidate) => candidate.width * candidate.height === width * height);
    if (image === undefined) throw new Error("no picture of the size the header tells");
    const { data, ...size } = await image.decode();
    return toRgb(new Uint8Array(data.buffer, data.byteOffset, data.byteLength), size.width, size.height, profile);
  } finally {
    images.dispose();
  }
}

async function toRgb(rgba: Uint8Array, width: number, height: number, profile: Uint8Array | undefined): Promise<Pixels> {
  const rgb = new Uint8Array(width * height * 3);
  for (let row = 0; row < height; row += stripRows) {
    const rows = Math.min(stripRows, height - row);
    const strip = rgba.subarray(row * width * 4, (row + rows) * width * 4);
    const source =
      profile === undefined
        ? sharp(strip, { raw: { width, height: rows, channels: 4 } })
        : sharp(await pngWithProfile(strip, width, rows, profile));
    rgb.set(await source.flatten({ background: "#ffffff" }).toColourspace("srgb").raw().toBuffer(), row * width * 3);
  }
  return { data: rgb, width, height, channels: 3 };
}
