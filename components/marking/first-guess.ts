/**
 * Where the corner handles lie before anybody has moved them: a plain rectangle in the middle of the photograph, within reach. Nothing is recognised in the
 * picture. Pure.
 */
import type { FourCorners, PhotoSize } from "@/lib/layout";

/** Share of the photograph that the rectangle takes up at most, one way and the other. */
const MOST = 0.8;
/** Length to width of a board that nobody has measured. */
const USUAL_RATIO = 6;

/**
 * `ratio`: length to width, null when unknown. In a photograph that stands upright the board is taken to stand too, its left end at the bottom, because people
 * turn the phone along the board.
 */
export function firstBoardGuess(photo: PhotoSize, ratio: number | null): FourCorners {
  const standing = photo.height > photo.width;
  const along = standing ? photo.height : photo.width;
  const across = standing ? photo.width : photo.height;
  const { length, width } = fitted(along * MOST, across * MOST, ratio ?? USUAL_RATIO);
  const [cx, cy] = [photo.width / 2, photo.height / 2];
  if (!standing) return rectangle(cx, cy, length, width);
  const [a, b, c, d] = rectangle(cx, cy, width, length);
  return [d, a, b, c];
}

/** A sheet in the middle, a third of the photograph. */
export function firstSheetGuess(photo: PhotoSize, ratio: number): FourCorners {
  const { length, width } = fitted(photo.width / 3, photo.height / 3, ratio);
  return rectangle(photo.width / 2, photo.height / 2, length, width);
}

function fitted(mostLength: number, mostWidth: number, ratio: number): { length: number; width: number } {
  const length = Math.min(mostLength, mostWidth * ratio);
  return { length, width: length / ratio };
}

function rectangle(cx: number, cy: number, width: number, height: number): FourCorners {
  const [left, right, top, bottom] = [cx - width / 2, cx + width / 2, cy - height / 2, cy + height / 2];
  return [
    { x: left, y: top },
    { x: right, y: top },
    { x: right, y: bottom },
    { x: left, y: bottom },
  ];
}
