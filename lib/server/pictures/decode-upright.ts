/** Any accepted upload → upright sRGB pixels, 8 bits, RGB. Decoding to the end is also the proof that the file is whole. */
import "server-only";
import sharp from "sharp";
import type { Pixels } from "@/lib/layout";
import { maxUploadPixels } from "@/lib/schemas/upload-limits";
import { isCutOff } from "./cut-off";
import { decodeHeic } from "./decode-heic";
import { type PictureHeader, readHeader, saysCutOff } from "./picture-header";
import type { UploadRefusal } from "./upload-refusal";

export type DecodeOutcome =
  | { readonly ok: true; readonly header: PictureHeader; readonly pixels: Pixels }
  | { readonly ok: false; readonly refusal: UploadRefusal };

/** A sound file of the largest size takes a few seconds; one that takes longer is made to. */
const decodeSeconds = 60;

export async function decodeUpright(bytes: Uint8Array): Promise<DecodeOutcome> {
  const outcome = await readHeader(bytes);
  if (!outcome.ok) return outcome;
  const { header } = outcome;
  try {
    return { ok: true, header, pixels: await pixelsOf(bytes, header) };
  } catch (error) {
    const detail = error instanceof Error ? error.message : String(error);
    const reason = isCutOff(header.kind, bytes) || saysCutOff(detail) ? "truncated" : "corrupt";
    return { ok: false, refusal: { reason, detail } };
  }
}

async function pixelsOf(bytes: Uint8Array, header: PictureHeader): Promise<Pixels> {
  if (header.kind === "heic") return decodeHeic(bytes, header.storedWidth, header.storedHeight, header.profile);
  try {
    return await decodeStrictly(bytes, "warning");
  } catch (error) {
    if (error instanceof Error && spoils(error.message)) throw error;
    return decodeStrictly(bytes, "error");
  }
}

/** Whether a decoder's warning means spoilt pixels. Bytes too many before the end marker (0xd9) are padding, as some cameras write it. */
function spoils(warning: string): boolean {
  return /Corrupt JPEG data/.test(warning) && !/extraneous bytes before marker 0xd9/.test(warning);
}

async function decodeStrictly(bytes: Uint8Array, failOn: "warning" | "error"): Promise<Pixels> {
  const { data, info } = await sharp(bytes, { failOn, limitInputPixels: maxUploadPixels })
    .timeout({ seconds: decodeSeconds })
    .autoOrient()
    .flatten({ background: "#ffffff" })
    .toColourspace("srgb")
    .raw({ depth: "uchar" })
    .toBuffer({ resolveWithObject: true });
  if (info.channels !== 3) throw new Error(`expected three channels, found ${info.channels}`);
  return { data, width: info.width, height: info.height, channels: 3 };
}
