/** From a photo to the wood and back, lens included, once a photo has been brought to scale. */
import { applyHomography, composeHomographies, type Homography, type MmPoint, type PhotoPoint } from "./homography";
import { flatFromPhoto, type Lens, photoFromFlat } from "./lens";
import type { WarpMap } from "./warp";

export interface PhotoGeometry {
  readonly lens: Lens;
  /** Stock mm from flat photo px, and back. */
  readonly stockMmFromFlat: Homography;
  readonly flatFromStockMm: Homography;
}

/** Where on the wood a photo point lies, mm in the stock frame. */
export function stockMmFromPhoto(geometry: PhotoGeometry, p: PhotoPoint): MmPoint {
  return applyHomography(geometry.stockMmFromFlat, flatFromPhoto(geometry.lens, p));
}

/** Where in the photo a point of the wood is seen, px. */
export function photoFromStockMm(geometry: PhotoGeometry, p: MmPoint): PhotoPoint {
  return photoFromFlat(geometry.lens, applyHomography(geometry.flatFromStockMm, p));
}

/** True distance on the wood between two photo points, mm: for holding against a distance known from the board itself. */
export function measureMm(geometry: PhotoGeometry, a: PhotoPoint, b: PhotoPoint): number {
  const from = stockMmFromPhoto(geometry, a);
  const to = stockMmFromPhoto(geometry, b);
  return Math.hypot(to.x - from.x, to.y - from.y);
}

/** What the warp needs to draw the straightened picture at this scale, its origin at the stock's. */
export function warpMapAt(geometry: PhotoGeometry, pxPerMm: number): WarpMap {
  const stockMmFromPicture: Homography = [1 / pxPerMm, 0, 0, 0, 1 / pxPerMm, 0, 0, 0, 1];
  return { flatFromPicture: composeHomographies(geometry.flatFromStockMm, stockMmFromPicture), lens: geometry.lens };
}
