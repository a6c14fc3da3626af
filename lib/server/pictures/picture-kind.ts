/** What kind of picture a file holds, from its content; its name and the browser's word count for nothing. */
import "server-only";
import { fileTypeFromBuffer } from "file-type";

export type PictureKind = "jpeg" | "png" | "webp" | "avif" | "heic";

export type IdentifiedKind =
  | { readonly is: "picture"; readonly kind: PictureKind }
  | { readonly is: "animated" }
  /** The content's media type where it has a known one. */
  | { readonly is: "other"; readonly found: string | null };

const kinds: Readonly<Record<string, PictureKind>> = {
  "image/jpeg": "jpeg",
  "image/png": "png",
  "image/webp": "webp",
  "image/avif": "avif",
  "image/heic": "heic",
  "image/heif": "heic",
};
const animated = new Set(["image/apng", "image/heic-sequence", "image/heif-sequence"]);

/** Reads the first bytes only. */
export async function identifyKind(bytes: Uint8Array): Promise<IdentifiedKind> {
  const found = (await fileTypeFromBuffer(bytes))?.mime ?? null;
  if (found === null) return { is: "other", found: null };
  const brands = isoBrands(bytes);
  if (animated.has(found) || brands[0] === "avis" || isAnimatedWebp(bytes)) return { is: "animated" };
  const kind = kinds[found];
  if (kind === undefined) return { is: "other", found };
  // The brand "mif1" only says "a picture in a box file"; whether it is AV1 or HEVC stands among the compatible brands.
  return { is: "picture", kind: kind === "heic" && brands.includes("avif") ? "avif" : kind };
}

/** Major brand, then the compatible ones, of an ISO base media file ("ftyp" box); none of other files. */
function isoBrands(bytes: Uint8Array): string[] {
  if (text(bytes, 4, 8) !== "ftyp") return [];
  const end = Math.min(bytes.length, new DataView(bytes.buffer, bytes.byteOffset, 4).getUint32(0), 256);
  const brands = [text(bytes, 8, 12)];
  for (let at = 16; at + 4 <= end; at += 4) brands.push(text(bytes, at, at + 4));
  return brands;
}

/** The extended header's animation bit (WebP container specification, "VP8X"). */
function isAnimatedWebp(bytes: Uint8Array): boolean {
  return text(bytes, 0, 4) === "RIFF" && text(bytes, 8, 16) === "WEBPVP8X" && ((bytes[20] ?? 0) & 0b10) !== 0;
}

function text(bytes: Uint8Array, from: number, to: number): string {
  return String.fromCharCode(...bytes.subarray(from, to));
}
