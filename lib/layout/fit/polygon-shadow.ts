/**
 * The shadow of a simple polygon, possibly concave: where it reaches along one axis within a band of the other, in as many stretches as it
 * has there. Exact.
 *
 * Every part of the polygon inside the band is bounded from below by its own edges or by the lower end of the band. So the shadow of those, the
 * edges clipped to the band and the stretches of the band's lower end inside the polygon, is the shadow of the whole.
 */
import type { StockPoint } from "../frame/point";
import { coordinateOf, otherAxis, type Span, type StockAxis } from "./span";

/** An edge in the coordinates of the shadow: u along the axis asked for, v along the other. */
interface Edge {
  readonly u0: number;
  readonly v0: number;
  readonly u1: number;
  readonly v1: number;
}

/** Stretches along `axis`, in no order and possibly overlapping; a crack drawn as a line throws one of no width. */
export function polygonShadow(points: readonly StockPoint[], axis: StockAxis, band: Span): Span[] {
  if (points.length < 2 || !(band.from < band.to)) return [];
  const edges = edgesOf(points, axis);
  return [...edges.flatMap((edge) => edgeShadow(edge, band) ?? []), ...stretchesAt(edges, band.from)];
}

/** The shadows of the outline alone, without what it encloses. */
export function outlineShadow(points: readonly StockPoint[], axis: StockAxis, band: Span): Span[] {
  return edgesOf(points, axis).flatMap((edge) => edgeShadow(edge, band) ?? []);
}

function edgesOf(points: readonly StockPoint[], axis: StockAxis): Edge[] {
  const across = otherAxis(axis);
  return points.map((point, index) => {
    const next = points[(index + 1) % points.length] ?? point;
    return {
      u0: coordinateOf(point, axis),
      v0: coordinateOf(point, across),
      u1: coordinateOf(next, axis),
      v1: coordinateOf(next, across),
    };
  });
}

/** The reach of the part of an edge inside the open band; an edge that runs along the band's end is not inside. */
function edgeShadow({ u0, v0, u1, v1 }: Edge, band: Span): Span | null {
  if (Math.max(v0, v1) <= band.from || Math.min(v0, v1) >= band.to) return null;
  const uAt = (v: number) => (v0 === v1 ? u0 : u0 + ((u1 - u0) * (v - v0)) / (v1 - v0));
  const start = v0 < band.from ? uAt(band.from) : v0 > band.to ? uAt(band.to) : u0;
  const end = v1 < band.from ? uAt(band.from) : v1 > band.to ? uAt(band.to) : u1;
  return { from: Math.min(start, end), to: Math.max(start, end) };
}

/** The stretches inside the polygon of a line just above v: its crossings in order, taken in pairs. */
function stretchesAt(edges: readonly Edge[], v: number): Span[] {
  const crossings = edges
    .filter(({ v0, v1 }) => v0 <= v !== v1 <= v)
    .map(({ u0, v0, u1, v1 }) => u0 + ((u1 - u0) * (v - v0)) / (v1 - v0))
    .sort((p, q) => p - q);
  const stretches: Span[] = [];
  for (let index = 0; index + 1 < crossings.length; index += 2) {
    stretches.push({ from: crossings[index] ?? 0, to: crossings[index + 1] ?? 0 });
  }
  return stretches;
}
