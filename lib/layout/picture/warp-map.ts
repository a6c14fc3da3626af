/** Where each point of the straightened picture is read from. Knows no pixels. */
import { type Homography, type Jacobian, jacobianAt, type PhotoPoint } from "./homography";
import { type Lens, photoFromFlat } from "./lens";

/** The part of a photo that is at hand, and how much smaller it was made. */
export interface PhotoWindow {
  /** px of the whole photo from its outer corner to the part's. */
  readonly left: number;
  readonly top: number;
  /** px of the part at hand per px of the whole photo. */
  readonly scaleX: number;
  readonly scaleY: number;
}

/** Picture px → flat photo px by the homography, then bent as the lens bends; then into the window, where only a part is at hand. */
export interface WarpMap {
  readonly flatFromPicture: Homography;
  readonly lens: Lens;
  readonly window?: PhotoWindow;
}

/** A point of the picture, px from its outer corner. */
interface PicturePoint {
  readonly x: number;
  readonly y: number;
}

/** Where a picture point lies in the photo at hand, px. */
export function sourceOf(map: WarpMap, p: PicturePoint): PhotoPoint {
  const source = new Float64Array(2);
  sourceInto(map, p.x, p.y, source, 0);
  return { x: source[0] as number, y: source[1] as number };
}

/** The same as numbers, without an object a place: writes x and y to `into` from index `at` on. */
export function sourceInto(
  { flatFromPicture: h, lens, window }: WarpMap,
  x: number,
  y: number,
  into: Float64Array,
  at: number,
): void {
  const depth = h[6] * x + h[7] * y + h[8];
  let px = (h[0] * x + h[1] * y + h[2]) / depth;
  let py = (h[3] * x + h[4] * y + h[5]) / depth;
  if (lens.k1 !== 0) {
    const bent = photoFromFlat(lens, { x: px, y: py });
    px = bent.x;
    py = bent.y;
  }
  into[at] = window === undefined ? px : (px - window.left) * window.scaleX;
  into[at + 1] = window === undefined ? py : (py - window.top) * window.scaleY;
}

/** How many px of the photo at hand a picture pixel spans there, each way. The lens, which changes it by some per cent, is left out. */
export function stretchAt({ flatFromPicture, window }: WarpMap, p: PicturePoint): Jacobian {
  const flat = jacobianAt(flatFromPicture, p);
  if (window === undefined) return flat;
  const { scaleX, scaleY } = window;
  return { xx: flat.xx * scaleX, xy: flat.xy * scaleX, yx: flat.yx * scaleY, yy: flat.yy * scaleY };
}
