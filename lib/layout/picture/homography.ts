/**
 * Plane-to-plane perspective maps as 3 × 3 matrices. Photo points are pixels with the origin at the outer corner of the first
 * pixel, so pixel centres lie at +0.5; stock points are millimetres in the stock frame. y points down in both.
 */

/** A point of the photo, px. */
export interface PhotoPoint {
  readonly x: number;
  readonly y: number;
}

/** A point of the wood, mm. Pictures are reckoned in fractions of a millimetre; whole micrometres begin where a length is kept. */
export interface MmPoint {
  readonly x: number;
  readonly y: number;
}

interface PlanePoint {
  readonly x: number;
  readonly y: number;
}

/** Row by row. Any factor other than zero gives the same map; ours are positive (in front of the camera) at the points they were fitted to. */
export type Homography = readonly [number, number, number, number, number, number, number, number, number];

export const identityHomography: Homography = [1, 0, 0, 0, 1, 0, 0, 0, 1];

/** The depth of p: zero on the vanishing line, of the other sign behind the camera. */
export function depthAt(h: Homography, p: PlanePoint): number {
  return h[6] * p.x + h[7] * p.y + h[8];
}

/** Where the map takes p. Not finite on the vanishing line. */
export function applyHomography(h: Homography, p: PlanePoint): PlanePoint {
  const depth = depthAt(h, p);
  return { x: (h[0] * p.x + h[1] * p.y + h[2]) / depth, y: (h[3] * p.x + h[4] * p.y + h[5]) / depth };
}

/** The map that does `inner` first, then `outer`. */
export function composeHomographies(outer: Homography, inner: Homography): Homography {
  const [a, b, c, d, e, f, g, h, i] = outer;
  const [p, q, r, s, t, u, v, w, x] = inner;
  return [
    a * p + b * s + c * v,
    a * q + b * t + c * w,
    a * r + b * u + c * x,
    d * p + e * s + f * v,
    d * q + e * t + f * w,
    d * r + e * u + f * x,
    g * p + h * s + i * v,
    g * q + h * t + i * w,
    g * r + h * u + i * x,
  ];
}

/** The map back, or null where the matrix flattens the plane. Exact inverse, so depths keep their sign. */
export function invertHomography(m: Homography): Homography | null {
  const [a, b, c, d, e, f, g, h, i] = m;
  const determinant = a * (e * i - f * h) - b * (d * i - f * g) + c * (d * h - e * g);
  if (!Number.isFinite(determinant) || determinant === 0) return null;
  return [
    (e * i - f * h) / determinant,
    (c * h - b * i) / determinant,
    (b * f - c * e) / determinant,
    (f * g - d * i) / determinant,
    (a * i - c * g) / determinant,
    (c * d - a * f) / determinant,
    (d * h - e * g) / determinant,
    (b * g - a * h) / determinant,
    (a * e - b * d) / determinant,
  ];
}

/** First derivatives of the map at a point: how far the image moves per unit step in x and in y. */
export interface Jacobian {
  readonly xx: number;
  readonly xy: number;
  readonly yx: number;
  readonly yy: number;
}

/** ∂(image x, image y)/∂(x, y) at p, by the quotient rule. */
export function jacobianAt(h: Homography, p: PlanePoint): Jacobian {
  const depth = depthAt(h, p);
  const image = applyHomography(h, p);
  return {
    xx: (h[0] - image.x * h[6]) / depth,
    xy: (h[1] - image.x * h[7]) / depth,
    yx: (h[3] - image.y * h[6]) / depth,
    yy: (h[4] - image.y * h[7]) / depth,
  };
}

/** Greatest and least stretch in any direction (the singular values), greatest first. */
export function stretches(j: Jacobian): readonly [number, number] {
  const sum = Math.hypot(j.xx + j.yy, j.yx - j.xy);
  const difference = Math.hypot(j.xx - j.yy, j.yx + j.xy);
  return [(sum + difference) / 2, Math.abs(sum - difference) / 2];
}
