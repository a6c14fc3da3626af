/** The straightened picture, true to scale, in levels, from a photograph and its marks. Runs in a worker thread. */
import "server-only";
import {
  fitMarking,
  type LensOutcome,
  type Marking,
  type MarkingFit,
  type MarksRefusal,
  type OutputScale,
  type Pixels,
  photoPartFor,
  plainSampler,
  type Um,
  type WarpMap,
  warpInBands,
  warpMapAt,
  windowOf,
} from "@/lib/layout";
import { canDecodeParts, decodePart } from "./decode-upright";
import { type EncodedLevel, encodeLevels } from "./encode-levels";
import { type PictureHeader, readHeader, uprightSize } from "./picture-header";
import { type WarpRoom, warpRoom } from "./simd/warp-room";
import type { UploadRefusal } from "./upload-refusal";

export type StraightenOutcome =
  | {
      readonly ok: true;
      readonly widthPx: number;
      readonly heightPx: number;
      readonly pxPerMm: number;
      /** The board as given or, by a sheet, as measured. */
      readonly length: Um;
      readonly width: Um;
      /** Of corners and extra points, mm. */
      readonly rmsMm: number;
      readonly lens: LensOutcome;
      /** At least one; level 0 is the full picture. */
      readonly levels: readonly EncodedLevel[];
    }
  | { readonly ok: false; readonly of: "photo"; readonly refusal: UploadRefusal }
  | { readonly ok: false; readonly of: "marks"; readonly refusal: MarksRefusal };

/** Called with the share done, 0 to 1, never falling; throws to end the work. */
export type Step = (share: number) => void;

/** Rough shares of the time on a 12-megapixel photograph. */
const decoded = 0.45;
const warped = 0.7;

/** `source`: the stored original or its upright level 0; the marks are in the pixels of its upright, full size. */
export async function straightenInThread(source: Uint8Array, marking: Marking, step: Step): Promise<StraightenOutcome> {
  step(0);
  const photo = await photoFor(source, marking);
  if (!photo.ok) return photo;
  step(decoded);
  const { fit, map, pixels } = photo;
  const picture = straightened(pixels, fit.scale, map, (share) => step(decoded + (warped - decoded) * share));
  const levels = await encodeLevels(picture, (share) => step(warped + (1 - warped) * share));
  const { widthPx, heightPx, pxPerMm } = fit.scale;
  const { length, width, rmsMm, lens } = fit;
  return { ok: true, widthPx, heightPx, pxPerMm, length, width, rmsMm, lens, levels };
}

type PhotoOutcome =
  | {
      readonly ok: true;
      readonly fit: Extract<MarkingFit, { ok: true }>;
      readonly pixels: Pixels;
      readonly map: WarpMap;
    }
  | Extract<StraightenOutcome, { ok: false }>;

/** What of the photo the marks ask for, and where it lies. */
async function photoFor(source: Uint8Array, marking: Marking): Promise<PhotoOutcome> {
  const read = await readHeader(source);
  if (!read.ok) return { ok: false, of: "photo", refusal: read.refusal };
  return canDecodeParts(read.header) ? partFor(source, marking, read.header) : wholeFor(source, marking, read.header);
}

async function partFor(source: Uint8Array, marking: Marking, header: PictureHeader): Promise<PhotoOutcome> {
  const size = uprightSize(header);
  const fit = fitMarking(marking, size);
  if (!fit.ok) return { ok: false, of: "marks", refusal: fit.refusal };
  const { widthPx: width, heightPx: height, pxPerMm } = fit.scale;
  const map = warpMapAt(fit.geometry, pxPerMm);
  const part = photoPartFor(map, { width, height }, size);
  const decoding = await decodePart(source, header, part);
  if (!decoding.ok) return { ok: false, of: "photo", refusal: decoding.refusal };
  return { ok: true, fit, pixels: decoding.pixels, map: { ...map, window: windowOf(part) } };
}

async function wholeFor(source: Uint8Array, marking: Marking, header: PictureHeader): Promise<PhotoOutcome> {
  const decoding = await decodePart(source, header, null);
  if (!decoding.ok) return { ok: false, of: "photo", refusal: decoding.refusal };
  const { pixels } = decoding;
  const fit = fitMarking(marking, pixels);
  if (!fit.ok) return { ok: false, of: "marks", refusal: fit.refusal };
  return { ok: true, fit, pixels, map: warpMapAt(fit.geometry, fit.scale.pxPerMm) };
}

function straightened(photo: Pixels, { widthPx, heightPx }: OutputScale, map: WarpMap, step: Step): Pixels {
  const room = warpRoom(photo, widthPx, heightPx) ?? plainRoom(photo, widthPx, heightPx);
  for (const share of warpInBands(room.photo, room.picture, map, room.sampler)) step(share);
  return room.picture;
}

function plainRoom(photo: Pixels, width: number, height: number): WarpRoom {
  const data = new Uint8Array(width * height * photo.channels);
  return { photo, picture: { data, width, height, channels: photo.channels }, sampler: plainSampler(photo) };
}
