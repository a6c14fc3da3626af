/**
 * Which part of a photo a straightened picture needs, and how fine. A board fills a strip of its photograph, and often the photograph
 * is finer than the picture: what is not needed costs time and memory when it is decoded.
 */
import { type PhotoPoint, stretches } from "./homography";
import type { PhotoSize } from "./lens";
import { type PhotoWindow, sourceOf, stretchAt, type WarpMap } from "./warp-map";

export interface PhotoPart {
  /** px of the whole photo. */
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
  /** px the part is to be made: never more than it has. */
  readonly madeWidth: number;
  readonly madeHeight: number;
}

/** Places along each side of the picture at which its rim is looked up in the photo, and along and across at which its fineness is. */
const RIM_PLACES = 64;
const GRID = 9;
/** px of the photo per px of the picture from which on less is decoded. Below, making it smaller costs more than it saves. */
const WORTH_SHRINKING = 1.1;
/** px round the part: bilinear reads one beyond, and between two places of the rim a lens bends by less than the rest. */
const MARGIN_PX = 16;

/** The part for a picture of this size. Right for maps of the whole photo only. */
export function photoPartFor(map: WarpMap, picture: PhotoSize, photo: PhotoSize): PhotoPart {
  const rim = rimOf(picture).map((p) => sourceOf(map, p));
  const [left, right] = spanOf(rim, (p) => p.x, photo.width);
  const [top, bottom] = spanOf(rim, (p) => p.y, photo.height);
  const [width, height] = [right - left, bottom - top];
  // The picture's finest place still gets a pixel of the photo for each of its own.
  const least = leastStretch(map, picture);
  const scale = least > WORTH_SHRINKING ? 1 / least : 1;
  return { left, top, width, height, madeWidth: Math.ceil(width * scale), madeHeight: Math.ceil(height * scale) };
}

export function windowOf({ left, top, width, height, madeWidth, madeHeight }: PhotoPart): PhotoWindow {
  return { left, top, scaleX: madeWidth / width, scaleY: madeHeight / height };
}

function rimOf({ width, height }: PhotoSize): PhotoPoint[] {
  const shares = Array.from({ length: RIM_PLACES + 1 }, (_, i) => i / RIM_PLACES);
  return shares.flatMap((t) => [
    { x: t * width, y: 0 },
    { x: t * width, y: height },
    { x: 0, y: t * height },
    { x: width, y: t * height },
  ]);
}

/** Whole px with the margin, within 0..size and at least one; all of it where a place is no number. */
function spanOf(rim: readonly PhotoPoint[], of: (p: PhotoPoint) => number, size: number): readonly [number, number] {
  const values = rim.map(of);
  if (!values.every(Number.isFinite)) return [0, size];
  const low = Math.min(size - 1, Math.max(0, Math.floor(Math.min(...values)) - MARGIN_PX));
  const high = Math.max(low + 1, Math.min(size, Math.ceil(Math.max(...values)) + MARGIN_PX));
  return [low, high];
}

/** px of the photo per px of the picture in the direction in which there are fewest, at the place with the fewest. */
function leastStretch(map: WarpMap, picture: PhotoSize): number {
  const shares = Array.from({ length: GRID }, (_, i) => i / (GRID - 1));
  const found = shares.flatMap((u) =>
    shares.map((v) => stretches(stretchAt(map, { x: u * picture.width, y: v * picture.height }))[1]),
  );
  return Math.min(...found);
}
