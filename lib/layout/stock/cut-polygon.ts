/** A polygon cut along upright and level lines, one after the other, each taking off what lies beyond it (Sutherland and Hodgman). */
import type { StockPoint } from "../frame/point";
import { type Um, um } from "../units/um";

/** What lies at the limit or beyond it that way is kept. */
export interface CutLine {
  readonly axis: "x" | "y";
  readonly limit: Um;
  readonly keeps: "above" | "below";
}

/**
 * Fewer than three corners where nothing is left. A polygon that falls into parts stays one ring: its parts hang together by edges that
 * run there and back along the lines.
 */
export function cutPolygon(corners: readonly StockPoint[], lines: readonly CutLine[]): readonly StockPoint[] {
  return lines.reduce<readonly StockPoint[]>((points, line) => withoutDoubles(cutAt(points, line)), corners);
}

function cutAt(points: readonly StockPoint[], line: CutLine): StockPoint[] {
  const inside = (p: StockPoint) => (line.keeps === "above" ? p[line.axis] >= line.limit : p[line.axis] <= line.limit);
  return points.flatMap((point, index) => {
    const before = points.at(index - 1) ?? point;
    if (inside(point)) return inside(before) ? [point] : [onLine(before, point, line), point];
    return inside(before) ? [onLine(before, point, line)] : [];
  });
}

function onLine(from: StockPoint, to: StockPoint, { axis, limit }: CutLine): StockPoint {
  const t = (limit - from[axis]) / (to[axis] - from[axis]);
  return axis === "x"
    ? { x: limit, y: um(Math.round(from.y + t * (to.y - from.y))) }
    : { x: um(Math.round(from.x + t * (to.x - from.x))), y: limit };
}

function withoutDoubles(points: readonly StockPoint[]): readonly StockPoint[] {
  return points.filter(({ x, y }, index) => {
    const before = points.at(index - 1);
    return points.length === 1 || before?.x !== x || before.y !== y;
  });
}
