/** Any accepted upload → upright sRGB pixels, 8 bits, RGB. Decoding to the end is also the proof that the file is whole. */
import "server-only";
import sharp, { type Sharp } from "sharp";
import type { PhotoPart, Pixels } from "@/lib/layout";
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
  return outcome.ok ? decodePart(bytes, outcome.header, null) : outcome;
}

/**
 * A part of the upright picture, no finer than asked for; all of it without one. A part is taken of what `canDecodeParts` only. A
 * file may be cut off or spoilt beyond the part without being refused: that it is whole was seen when it was taken in.
 */
export async function decodePart(bytes: Uint8Array, header: PictureHeader, part: PhotoPart | null): Promise<DecodeOutcome> {
  try {
    return { ok: true, header, pixels: await pixelsOf(bytes, header, part) };
  } catch (error) {
    const detail = error instanceof Error ? error.message : String(error);
    const reason = isCutOff(header.kind, bytes) || saysCutOff(detail) ? "truncated" : "corrupt";
    return { ok: false, refusal: { reason, detail } };
  }
}

/** Whether the header tells the size that the decoder will give. */
export function canDecodeParts({ kind }: PictureHeader): boolean {
  return kind !== "heic" && kind !== "avif";
}

async function pixelsOf(bytes: Uint8Array, header: PictureHeader, part: PhotoPart | null): Promise<Pixels> {
  if (header.kind === "heic") return decodeHeic(bytes, header.storedWidth, header.storedHeight, header.profile);
  try {
    return await decodeStrictly(bytes, part, "warning");
  } catch (error) {
    if (error instanceof Error && spoils(error.message)) throw error;
    return decodeStrictly(bytes, part, "error");
  }
}

/** Whether a decoder's warning means spoilt pixels. Bytes too many before the end marker (0xd9) are padding, as some cameras write it. */
function spoils(warning: string): boolean {
  return /Corrupt JPEG data/.test(warning) && !/extraneous bytes before marker 0xd9/.test(warning);
}

async function decodeStrictly(bytes: Uint8Array, part: PhotoPart | null, failOn: "warning" | "error"): Promise<Pixels> {
  const upright = sharp(bytes, { failOn, limitInputPixels: maxUploadPixels }).timeout({ seconds: decodeSeconds }).autoOrient();
  const { data, info } = await (part === null ? upright : cutTo(upright, part))
    .flatten({ background: "#ffffff" })
    .toColourspace("srgb")
    .raw({ depth: "uchar" })
    .toBuffer({ resolveWithObject: true });
  if (info.channels !== 3) throw new Error(`expected three channels, found ${info.channels}`);
  return { data, width: info.width, height: info.height, channels: 3 };
}

function cutTo(upright: Sharp, { left, top, width, height, madeWidth, madeHeight }: PhotoPart): Sharp {
  const cut = upright.extract({ left, top, width, height });
  if (madeWidth === width && madeHeight === height) return cut;
  // Weights of a triangle: no light and dark rims along edges, and quicker than the wider default.
  return cut.resize({ width: madeWidth, height: madeHeight, fit: "fill", kernel: "linear" });
}
