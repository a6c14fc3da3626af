/** Isometries from isometries: the way back, one after another, a shift, and quarter turns in exact numbers. */
import type { QuarterTurns } from "../pattern/face-layout";
import type { Isometry } from "./isometry";

/** The map that undoes `map`. Exact for quarter turns: the transpose of an orthonormal matrix is its inverse. */
export function inverted(map: Isometry): Isometry {
  return {
    a: map.a,
    b: map.c,
    c: map.b,
    d: map.d,
    tx: plainZero(-(map.a * map.tx + map.b * map.ty)),
    ty: plainZero(-(map.c * map.tx + map.d * map.ty)),
  };
}

/** First `inner`, then `outer`: `composed(cFromB, bFromA)` is `cFromA`. */
export function composed(outer: Isometry, inner: Isometry): Isometry {
  return {
    a: plainZero(outer.a * inner.a + outer.c * inner.b),
    b: plainZero(outer.b * inner.a + outer.d * inner.b),
    c: plainZero(outer.a * inner.c + outer.c * inner.d),
    d: plainZero(outer.b * inner.c + outer.d * inner.d),
    tx: plainZero(outer.a * inner.tx + outer.c * inner.ty + outer.tx),
    ty: plainZero(outer.b * inner.tx + outer.d * inner.ty + outer.ty),
  };
}

const quarterTurnMatrices = [
  { a: 1, b: 0, c: 0, d: 1 },
  { a: 0, b: 1, c: -1, d: 0 },
  { a: -1, b: 0, c: 0, d: -1 },
  { a: 0, b: -1, c: 1, d: 0 },
] as const;

/** Quarter turns about the origin, clockwise as seen (y points down: right turns to down), then a shift in micrometres. */
export function quarterTurn(turns: QuarterTurns, tx = 0, ty = 0): Isometry {
  return { ...quarterTurnMatrices[turns], tx, ty };
}

/** A vector of the inner frame in the outer one: turned, not shifted. */
export function turnedVector(map: Isometry, x: number, y: number): { readonly x: number; readonly y: number } {
  return { x: plainZero(map.a * x + map.c * y), y: plainZero(map.b * x + map.d * y) };
}

/** Products with −1 leave a negative zero behind, which compares equal to 0 but does not print so. */
function plainZero(value: number): number {
  return value + 0;
}
