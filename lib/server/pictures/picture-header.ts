/** What a file says about itself before any pixel is decoded: kind, size, turn, profile; and whether it may be decoded at all. */
import "server-only";
import sharp, { type Metadata } from "sharp";
import type { PhotoSize } from "@/lib/layout";
import { maxUploadBytes, maxUploadPixels } from "@/lib/schemas/upload-limits";
import { isCutOff } from "./cut-off";
import { identifyKind, type PictureKind } from "./picture-kind";
import type { UploadRefusal } from "./upload-refusal";

export interface PictureHeader {
  readonly kind: PictureKind;
  /** px as stored, before the turn. */
  readonly storedWidth: number;
  readonly storedHeight: number;
  /** EXIF orientation 1 to 8; 1 where the decoder turns the picture by itself (AVIF, HEIC). */
  readonly orientation: number;
  readonly exif: Uint8Array | undefined;
  readonly profile: Uint8Array | undefined;
}

export type HeaderOutcome =
  | { readonly ok: true; readonly header: PictureHeader }
  | { readonly ok: false; readonly refusal: UploadRefusal };

const refused = (refusal: UploadRefusal): HeaderOutcome => ({ ok: false, refusal });

export async function readHeader(bytes: Uint8Array): Promise<HeaderOutcome> {
  if (bytes.length === 0) return refused({ reason: "empty" });
  if (bytes.length > maxUploadBytes) return refused({ reason: "too-large", bytes: bytes.length, limitBytes: maxUploadBytes });
  const identified = await identifyKind(bytes);
  if (identified.is === "animated") return refused({ reason: "animated" });
  if (identified.is === "other") return refused({ reason: "wrong-type", found: identified.found });
  const { kind } = identified;
  // These tell their own length. Their decoders would take a file whose main picture is there and something after it is not.
  if ((kind === "avif" || kind === "heic" || kind === "webp") && isCutOff(kind, bytes)) {
    return refused({ reason: "truncated", detail: "the file is shorter than it says" });
  }
  return judge(bytes, kind);
}

async function judge(bytes: Uint8Array, kind: PictureKind): Promise<HeaderOutcome> {
  const described = await metadata(bytes);
  if ("failure" in described) {
    const reason = isCutOff(kind, bytes) || saysCutOff(described.failure) ? "truncated" : "corrupt";
    return refused({ reason, detail: described.failure });
  }
  const { width, height, pages, orientation, exif, icc } = described;
  if (width * height > maxUploadPixels)
    return refused({ reason: "too-many-pixels", width, height, limitPixels: maxUploadPixels });
  // A HEIC file may hold several still pictures; its sequences have a type of their own.
  if ((pages ?? 1) > 1 && kind !== "heic") return refused({ reason: "animated" });
  const turnedByDecoder = kind === "avif" || kind === "heic";
  return {
    ok: true,
    header: {
      kind,
      storedWidth: width,
      storedHeight: height,
      orientation: turnedByDecoder ? 1 : (orientation ?? 1),
      exif,
      profile: icc,
    },
  };
}

/** The upright picture's size, px, as the header tells it. */
export function uprightSize({ storedWidth, storedHeight, orientation }: PictureHeader): PhotoSize {
  // Orientations from 5 on lie on their side (EXIF 2.3, tag 274).
  return orientation >= 5 ? { width: storedHeight, height: storedWidth } : { width: storedWidth, height: storedHeight };
}

/** The decoders' words for a file that ends too early. */
export function saysCutOff(failure: string): boolean {
  return /premature end|unexpected end|end of file/i.test(failure);
}

async function metadata(bytes: Uint8Array): Promise<Metadata | { failure: string }> {
  try {
    // Only the header is read here, so the size may be told without a limit; no pixel is decoded before it has been judged.
    return await sharp(bytes, { limitInputPixels: false }).metadata();
  } catch (error) {
    return { failure: error instanceof Error ? error.message : String(error) };
  }
}
