/**
 * A camera over a flat thing: where each millimetre of it falls in the picture.
 *
 * Pixel frame: origin at the outer corner of the first pixel, x right, y down; the centre of the first pixel is (0.5, 0.5).
 */

/** Row-major 3 × 3 matrix on points (x, y, 1). */
export type Homography = readonly [number, number, number, number, number, number, number, number, number];

export type PointXy = readonly [number, number];

/** One radial term: undistorted = center + (p − center) · (1 + k1 · |p − center|² / norm²), p a pixel of the picture. */
export interface LensTruth {
  readonly k1: number;
  readonly center: PointXy;
  readonly norm: number;
}

export interface View {
  /** Lean of the camera towards the thing's far long edge. */
  readonly tiltDeg: number;
  /** Lean towards one end of it. */
  readonly panDeg: number;
  /** Turn of the picture. */
  readonly rollDeg: number;
  /** Share of the picture's width or height, whichever is reached first, that the thing takes up. */
  readonly fill: number;
}

export interface Frame {
  readonly widthPx: number;
  readonly heightPx: number;
}

/** A camera set up over one thing: pictures of its top plane and of the bench it lies on, before the lens bends them. */
export interface Camera {
  readonly topPxFromMm: Homography;
  readonly benchPxFromMm: Homography;
  readonly lens: LensTruth;
}

// A phone's main camera sees about 70° across: focal length 0.72 of the picture's width.
const FOCAL_SHARE = 0.72;

/** Sets the camera up so that the thing (top face `lengthMm` × `widthMm`, `thicknessMm` above the bench) fills the frame as asked. */
export function setUpCamera(
  size: { readonly lengthMm: number; readonly widthMm: number; readonly thicknessMm: number },
  frame: Frame,
  view: View,
  k1: number,
): Camera {
  const lens: LensTruth = {
    k1,
    center: [frame.widthPx / 2, frame.heightPx / 2],
    norm: Math.hypot(frame.widthPx, frame.heightPx) / 2,
  };
  const corners = cornersOf(size.lengthMm, size.widthMm);
  const at = (distanceMm: number): Camera => ({
    topPxFromMm: planeToPixels(size, 0, frame, view, distanceMm),
    benchPxFromMm: planeToPixels(size, size.thicknessMm, frame, view, distanceMm),
    lens,
  });
  const fits = (camera: Camera) =>
    corners.every((corner) => {
      const [x, y] = toPixel(camera, corner);
      return (
        Math.abs(x / frame.widthPx - 0.5) <= view.fill / 2 &&
        Math.abs(y / frame.heightPx - 0.5) <= view.fill / 2 &&
        inFront(camera.topPxFromMm, corner)
      );
    });
  // Halving the bracket 60 times settles the distance beyond any rounding that follows.
  let close = 0.2 * Math.hypot(size.lengthMm, size.widthMm);
  let far = 40 * close;
  for (let i = 0; i < 60; i++) {
    const middle = (close + far) / 2;
    if (fits(at(middle))) far = middle;
    else close = middle;
  }
  return at(far);
}

/** Corners of a face in the order (0, 0), (L, 0), (L, W), (0, W). */
export function cornersOf(lengthMm: number, widthMm: number): readonly [PointXy, PointXy, PointXy, PointXy] {
  return [
    [0, 0],
    [lengthMm, 0],
    [lengthMm, widthMm],
    [0, widthMm],
  ];
}

function planeToPixels(
  size: { readonly lengthMm: number; readonly widthMm: number },
  depthMm: number,
  frame: Frame,
  view: View,
  distanceMm: number,
): Homography {
  const radians = Math.PI / 180;
  const [ct, st] = [Math.cos(view.tiltDeg * radians), Math.sin(view.tiltDeg * radians)];
  const [cp, sp] = [Math.cos(view.panDeg * radians), Math.sin(view.panDeg * radians)];
  const [cr, sr] = [Math.cos(view.rollDeg * radians), Math.sin(view.rollDeg * radians)];
  // Roll · tilt · pan, applied to points about the middle of the top face; x right, y down, z away from the camera.
  const rotate = (x: number, y: number, z: number): [number, number, number] => {
    const [x1, z1] = [cp * x + sp * z, cp * z - sp * x];
    const [y2, z2] = [ct * y - st * z1, ct * z1 + st * y];
    return [cr * x1 - sr * y2, cr * y2 + sr * x1, z2];
  };
  const ex = rotate(1, 0, 0);
  const ey = rotate(0, 1, 0);
  const at = rotate(-size.lengthMm / 2, -size.widthMm / 2, depthMm);
  const focal = FOCAL_SHARE * frame.widthPx;
  const rows = (column: readonly [number, number, number], extra: number): [number, number, number] => {
    const w = column[2] + extra;
    return [focal * column[0] + (frame.widthPx / 2) * w, focal * column[1] + (frame.heightPx / 2) * w, w];
  };
  const [a, b, c] = [rows(ex, 0), rows(ey, 0), rows(at, distanceMm)];
  const w = c[2];
  return [a[0] / w, b[0] / w, c[0] / w, a[1] / w, b[1] / w, c[1] / w, a[2] / w, b[2] / w, 1];
}

function inFront(h: Homography, [x, y]: PointXy): boolean {
  return h[6] * x + h[7] * y + h[8] > 0;
}

/** A point through a homography. */
export function through(h: Homography, [x, y]: PointXy): PointXy {
  const w = h[6] * x + h[7] * y + h[8];
  return [(h[0] * x + h[1] * y + h[2]) / w, (h[3] * x + h[4] * y + h[5]) / w];
}

/** The inverse of a homography, up to scale. */
export function inverse(h: Homography): Homography {
  const [a, b, c, d, e, f, g, i, j] = h;
  return [
    e * j - f * i,
    c * i - b * j,
    b * f - c * e,
    f * g - d * j,
    a * j - c * g,
    c * d - a * f,
    d * i - e * g,
    b * g - a * i,
    a * e - b * d,
  ];
}

/** Where the straight picture has what the lens shows at `p`. */
export function undistort(lens: LensTruth, [x, y]: PointXy): PointXy {
  const dx = x - lens.center[0];
  const dy = y - lens.center[1];
  const factor = 1 + (lens.k1 * (dx * dx + dy * dy)) / (lens.norm * lens.norm);
  return [lens.center[0] + dx * factor, lens.center[1] + dy * factor];
}

/** Where the lens shows a point of the straight picture: the radius solved by Newton's steps, for |k1| up to about 0.1. */
export function distort(lens: LensTruth, [x, y]: PointXy): PointXy {
  const dx = x - lens.center[0];
  const dy = y - lens.center[1];
  const straight = Math.hypot(dx, dy) / lens.norm;
  if (straight === 0) return [x, y];
  let bent = straight;
  for (let i = 0; i < 12; i++) bent -= (bent + lens.k1 * bent ** 3 - straight) / (1 + 3 * lens.k1 * bent * bent);
  return [lens.center[0] + (dx * bent) / straight, lens.center[1] + (dy * bent) / straight];
}

/** The picture's pixel of a point of the top face, mm. */
export function toPixel(camera: Camera, mm: PointXy): PointXy {
  return distort(camera.lens, through(camera.topPxFromMm, mm));
}
