/** Puts a colour profile on bare pixels, as an uncompressed PNG, because the image library converts only what a file carries. */
import "server-only";
import { crc32, deflateSync } from "node:zlib";
import sharp from "sharp";

/** A PNG of RGBA pixels with this ICC profile in an iCCP chunk (PNG specification, 11.3.3.3) right behind its header. */
export async function pngWithProfile(rgba: Uint8Array, width: number, height: number, profile: Uint8Array): Promise<Buffer> {
  const png = await sharp(rgba, { raw: { width, height, channels: 4 } })
    .png({ compressionLevel: 0 })
    .toBuffer();
  const headerEnd = 8 + 25;
  return Buffer.concat([png.subarray(0, headerEnd), chunk("iCCP", iccData(profile)), png.subarray(headerEnd)]);
}

function iccData(profile: Uint8Array): Buffer {
  // Name, its end, method 0 (deflate), the profile.
  return Buffer.concat([Buffer.from("icc\0\0", "latin1"), deflateSync(profile)]);
}

function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, "latin1"), data]);
  const framed = Buffer.alloc(body.length + 8);
  framed.writeUInt32BE(data.length, 0);
  body.copy(framed, 4);
  framed.writeUInt32BE(crc32(body), body.length + 4);
  return framed;
}
