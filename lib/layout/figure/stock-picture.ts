/** A board's straightened picture as the core reads it: pixels with a scale, and nothing of files or formats. */
import type { Pixels } from "../picture/warp";

/** Stock frame = picture frame: the stock's origin is the outer corner of the first pixel, x along the grain. sRGB bytes. */
export interface StockPicture {
  readonly pixels: Pixels;
  readonly pxPerMm: number;
}

/**
 * Luminance weights of the primaries (Rec. ITU-R BT.709), taken on the display values as they are: figure is judged as the eye
 * sees it, and display values are about even steps to it.
 */
export const LUMINANCE = { r: 0.2126, g: 0.7152, b: 0.0722 } as const;
