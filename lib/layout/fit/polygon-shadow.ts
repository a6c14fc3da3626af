/**
 * The shadow of a simple polygon, possibly concave: where it reaches along one axis within a band of the other, in as many
 * stretches as it has there. Exact.
 *
 * Every part of the polygon inside the band is bounded from below by its own edges or by the lower end of the band. So the
 * shadow of those, the edges clipped to the band and the stretches of the band's lower end inside the polygon, is the shadow
 * of the whole.
 */
import type { StockPoint } from "../frame/point";
import { coordinateOf, otherAxis, type Span, type StockAxis } from "./span";

/** Stretches along `axis`, in no order and possibly overlapping; a crack drawn as a line throws one of no width. */
export function polygonShadow(points: readonly StockPoint[], axis: StockAxis, band: Span): Span[] {
  if (points.length < 2 || !(band.from < band.to)) return [];
  return [...outlineShadow(points, axis, band), ...stretchesAt(points, axis, band.from)];
}

/** The shadows of the outline alone, without what it encloses. */
export function outlineShadow(points: readonly StockPoint[], axis: StockAxis, band: Span): Span[] {
  const across = otherAxis(axis);
  const shadows: Span[] = [];
  points.forEach((start, index) => {
    const end = points[(index + 1) % points.length] ?? start;
    const v0 = coordinateOf(start, across);
    const v1 = coordinateOf(end, across);
    // An edge that runs along the end of the open band is not inside it.
    if ((v0 <= band.from && v1 <= band.from) || (v0 >= band.to && v1 >= band.to)) return;
    const u0 = coordinateOf(start, axis);
    const u1 = coordinateOf(end, axis);
    const uAt = (v: number) => (v0 === v1 ? u0 : u0 + ((u1 - u0) * (v - v0)) / (v1 - v0));
    const first = v0 < band.from ? uAt(band.from) : v0 > band.to ? uAt(band.to) : u0;
    const last = v1 < band.from ? uAt(band.from) : v1 > band.to ? uAt(band.to) : u1;
    shadows.push(first <= last ? { from: first, to: last } : { from: last, to: first });
  });
  return shadows;
}

/** The stretches inside the polygon of a line just above v: its crossings in order, taken in pairs. */
function stretchesAt(points: readonly StockPoint[], axis: StockAxis, v: number): Span[] {
  const across = otherAxis(axis);
  const crossings: number[] = [];
  points.forEach((start, index) => {
    const end = points[(index + 1) % points.length] ?? start;
    const v0 = coordinateOf(start, across);
    const v1 = coordinateOf(end, across);
    if (v0 <= v === v1 <= v) return;
    const u0 = coordinateOf(start, axis);
    crossings.push(u0 + ((coordinateOf(end, axis) - u0) * (v - v0)) / (v1 - v0));
  });
  crossings.sort((p, q) => p - q);
  const stretches: Span[] = [];
  for (let index = 0; index + 1 < crossings.length; index += 2) {
    stretches.push({ from: crossings[index] ?? 0, to: crossings[index + 1] ?? 0 });
  }
  return stretches;
}
