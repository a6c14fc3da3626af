/** The straightened picture, true to scale, in levels, from a photograph and its marks. Runs in a worker thread. */
import "server-only";
import {
  fitMarking,
  type LensOutcome,
  type Marking,
  type MarksRefusal,
  type OutputScale,
  type PhotoGeometry,
  type Pixels,
  type Um,
  warpInBands,
  warpMapAt,
} from "@/lib/layout";
import { decodeUpright } from "./decode-upright";
import { type EncodedLevel, encodeLevels } from "./encode-levels";
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
const decoded = 0.3;
const warped = 0.55;

/** `source`: the stored original or its upright level 0; the marks are in the pixels of its upright, full size. */
export async function straightenInThread(source: Uint8Array, marking: Marking, step: Step): Promise<StraightenOutcome> {
  step(0);
  const photo = await decodeUpright(source);
  if (!photo.ok) return { ok: false, of: "photo", refusal: photo.refusal };
  step(decoded);
  const fit = fitMarking(marking, photo.pixels);
  if (!fit.ok) return { ok: false, of: "marks", refusal: fit.refusal };

  const picture = straightened(photo.pixels, fit.geometry, fit.scale, (share) => step(decoded + (warped - decoded) * share));
  const levels = await encodeLevels(picture, (share) => step(warped + (1 - warped) * share));
  const { widthPx, heightPx, pxPerMm } = fit.scale;
  const { length, width, rmsMm, lens } = fit;
  return { ok: true, widthPx, heightPx, pxPerMm, length, width, rmsMm, lens, levels };
}

function straightened(photo: Pixels, geometry: PhotoGeometry, scale: OutputScale, step: Step): Pixels {
  const { widthPx, heightPx, pxPerMm } = scale;
  const data = new Uint8Array(widthPx * heightPx * photo.channels);
  const picture: Pixels = { data, width: widthPx, height: heightPx, channels: photo.channels };
  for (const share of warpInBands(photo, picture, warpMapAt(geometry, pxPerMm))) step(share);
  return picture;
}
