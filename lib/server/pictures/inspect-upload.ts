/** Whether an uploaded file is a picture that can be taken in, and what it tells of itself. Runs in a worker thread. */
import "server-only";
import type { Pixels } from "@/lib/layout";
import { decodeUpright } from "./decode-upright";
import { type ExifFacts, readExifFacts } from "./exif-facts";
import type { PictureHeader } from "./picture-header";
import type { PictureKind } from "./picture-kind";
import type { UploadRefusal } from "./upload-refusal";

export interface UploadFacts extends ExifFacts {
  readonly kind: PictureKind;
  /** px of the upright picture. */
  readonly width: number;
  readonly height: number;
  /** EXIF orientation 1 to 8 as stored. */
  readonly orientation: number;
}

export type InspectOutcome = ({ readonly ok: true } & UploadFacts) | { readonly ok: false; readonly refusal: UploadRefusal };

export async function inspectInThread(bytes: Uint8Array): Promise<InspectOutcome> {
  const decoded = await decodeUpright(bytes);
  if (!decoded.ok) return decoded;
  return { ok: true, ...(await factsOf(decoded.header, decoded.pixels)) };
}

export async function factsOf(header: PictureHeader, pixels: Pixels): Promise<UploadFacts> {
  const { kind, orientation } = header;
  return { kind, width: pixels.width, height: pixels.height, orientation, ...(await readExifFacts(header.exif)) };
}
