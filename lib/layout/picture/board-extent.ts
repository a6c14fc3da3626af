/** The board's own rectangle where a sheet gives the scale: how its corners lie, measured, and the frame laid along its edge. */
import type { Homography, MmPoint } from "./homography";

export interface BoardExtent {
  /** Moves the sheet's frame on to the stock frame, lengths kept. */
  readonly stockMmFromSheetMm: Homography;
  /** Of the smallest rectangle along the longer of the two long edges that holds all four corners, mm. */
  readonly lengthMm: number;
  readonly widthMm: number;
}

/**
 * The board's corners in the sheet's frame, in the order of `FourCorners`. x runs along the longer of top and bottom edge (the
 * top where they are equal), the surer of the two; the origin is where the bounding rectangle begins.
 */
export function boardExtent(cornersMm: readonly MmPoint[]): BoardExtent {
  const [topLeft, topRight, bottomRight, bottomLeft] = cornersMm as readonly [MmPoint, MmPoint, MmPoint, MmPoint];
  const top = { x: topRight.x - topLeft.x, y: topRight.y - topLeft.y };
  const bottom = { x: bottomRight.x - bottomLeft.x, y: bottomRight.y - bottomLeft.y };
  const along = Math.hypot(top.x, top.y) >= Math.hypot(bottom.x, bottom.y) ? top : bottom;
  const length = Math.hypot(along.x, along.y);
  const cos = along.x / length;
  const sin = along.y / length;
  const turned = cornersMm.map((p) => ({ x: cos * p.x + sin * p.y, y: -sin * p.x + cos * p.y }));
  const left = Math.min(...turned.map((p) => p.x));
  const above = Math.min(...turned.map((p) => p.y));
  return {
    stockMmFromSheetMm: [cos, sin, -left, -sin, cos, -above, 0, 0, 1],
    lengthMm: Math.max(...turned.map((p) => p.x)) - left,
    widthMm: Math.max(...turned.map((p) => p.y)) - above,
  };
}
