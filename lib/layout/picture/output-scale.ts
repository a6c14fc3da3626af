/** How many pixels per millimetre a straightened picture gets: as fine as wanted, as the photo holds, and as memory allows. */
import type { MmPoint } from "./homography";
import { type PhotoGeometry, photoFromStockMm } from "./photo-geometry";

/** A saw line of 0.25 mm is one pixel. */
export const WANTED_PX_PER_MM = 4;
/** Enlarging beyond this adds bytes and no figure. */
const GREATEST_ENLARGEMENT = 1.5;
/** The picture and the photo lie in a worker's memory together: 40 megapixels are 120 MB of RGB beside a photo of up to 180 MB. */
const MOST_PIXELS = 40_000_000;
/** Browsers draw no canvas with a longer side (16,384 px), JPEG holds 65,535. */
const LONGEST_SIDE_PX = 16_000;
/** Places along and across at which the photo's resolution is taken. */
const GRID = 9;

export interface OutputScale {
  readonly pxPerMm: number;
  readonly widthPx: number;
  readonly heightPx: number;
  /** px of the photo per mm of wood at the middle of its range, along and across taken together. */
  readonly photoPxPerMm: number;
  /** What holds the scale down. */
  readonly limitedBy: "wanted" | "photo" | "memory";
}

/** The scale for a board rectangle of this size with its origin at the stock's. Whole thousandths of px/mm. */
export function outputScale(geometry: PhotoGeometry, lengthMm: number, widthMm: number): OutputScale {
  const photoPxPerMm = typicalResolution(geometry, lengthMm, widthMm);
  const memory = largestScale(lengthMm, widthMm);
  const photo = photoPxPerMm * GREATEST_ENLARGEMENT;
  const pxPerMm = Math.max(0.001, Math.floor(Math.min(WANTED_PX_PER_MM, photo, memory) * 1000) / 1000);
  return {
    pxPerMm,
    widthPx: Math.max(1, Math.round(lengthMm * pxPerMm)),
    heightPx: Math.max(1, Math.round(widthMm * pxPerMm)),
    photoPxPerMm,
    limitedBy: WANTED_PX_PER_MM <= Math.min(photo, memory) ? "wanted" : photo <= memory ? "photo" : "memory",
  };
}

/** As fine as memory and browsers take a picture of a rectangle of this size, px/mm. */
export function largestScale(lengthMm: number, widthMm: number): number {
  return Math.min(Math.sqrt(MOST_PIXELS / (lengthMm * widthMm)), LONGEST_SIDE_PX / Math.max(lengthMm, widthMm));
}

/** The photo's px/mm (root of px² per mm²) at a place of the wood, lens included. */
export function photoPxPerMmAt(geometry: PhotoGeometry, p: MmPoint): number {
  const half = 0.5;
  const left = photoFromStockMm(geometry, { x: p.x - half, y: p.y });
  const right = photoFromStockMm(geometry, { x: p.x + half, y: p.y });
  const above = photoFromStockMm(geometry, { x: p.x, y: p.y - half });
  const below = photoFromStockMm(geometry, { x: p.x, y: p.y + half });
  return Math.sqrt(Math.abs((right.x - left.x) * (below.y - above.y) - (right.y - left.y) * (below.x - above.x)));
}

/** The median over the board: one far end must not cost the near end its detail. */
function typicalResolution(geometry: PhotoGeometry, lengthMm: number, widthMm: number): number {
  const found: number[] = [];
  for (let i = 0; i < GRID; i++) {
    for (let j = 0; j < GRID; j++) {
      found.push(photoPxPerMmAt(geometry, { x: (lengthMm * (i + 0.5)) / GRID, y: (widthMm * (j + 0.5)) / GRID }));
    }
  }
  found.sort((a, b) => a - b);
  return found[Math.floor(found.length / 2)] as number;
}
