/** Luminance of a picture, made no finer than it needs to be: every pixel the mean of a square of whole pixels. */
import { LUMINANCE, type StockPicture } from "./stock-picture";

export interface GreyPicture {
  /** 0…255, row by row. */
  readonly light: Float32Array;
  readonly width: number;
  readonly height: number;
  readonly pxPerMm: number;
}

/**
 * At the coarsest whole division of the picture's scale that is still at least `leastPxPerMm`; a coarser picture stays as it is.
 * Columns and rows that fill no whole square at the far ends are left out: less than a pixel of the result.
 */
export function greyPicture({ pixels, pxPerMm }: StockPicture, leastPxPerMm: number): GreyPicture {
  const { data, width: fineWidth, height: fineHeight, channels } = pixels;
  const square = Math.max(1, Math.min(Math.floor(pxPerMm / leastPxPerMm + 1e-9), fineWidth, fineHeight));
  const width = Math.floor(fineWidth / square);
  const height = Math.floor(fineHeight / square);
  const light = new Float32Array(width * height);
  const share = 1 / (square * square);
  for (let y = 0; y < height * square; y++) {
    const first = Math.floor(y / square) * width;
    let at = y * fineWidth * channels;
    for (let x = 0; x < width; x++) {
      let sum = 0;
      for (let i = 0; i < square; i++, at += channels) {
        sum +=
          LUMINANCE.r * (data[at] as number) + LUMINANCE.g * (data[at + 1] as number) + LUMINANCE.b * (data[at + 2] as number);
      }
      light[first + x] = (light[first + x] as number) + sum * share;
    }
  }
  return { light, width, height, pxPerMm: pxPerMm / square };
}
