/** Which stored size of a picture to draw from: the smallest that still has a pixel for every pixel of the screen, else the largest. */
import type { PictureLevel } from "../table-board";

/** `levels` largest first, all of a board `lengthMm` long; `screenPxPerMm` in device pixels. Null when there is no picture. */
export function levelFor(levels: readonly PictureLevel[], lengthMm: number, screenPxPerMm: number): PictureLevel | null {
  const sharp = levels.filter(({ widthPx }) => widthPx / lengthMm >= screenPxPerMm * 0.999);
  return sharp.at(-1) ?? levels[0] ?? null;
}
