/**
 * What makes a drawn polygon useless as an outline or an area: it crosses itself, has doubled corners, or leaves the board. Exact:
 * coordinates are whole µm below 3e7, so every cross product stays below 2^53.
 */
import type { StockPoint } from "../frame/point";
import { type Um, um } from "../units/um";

export interface BoardSize {
  readonly length: Um;
  readonly width: Um;
}

export type PolygonFault =
  /** Two neighbouring corners lie on the same place. */
  | { readonly fault: "doubled"; readonly corner: number; readonly at: StockPoint }
  /** Two edges that are no neighbours meet, or two neighbours run back over each other. Edge i begins at corner i. */
  | { readonly fault: "crosses"; readonly edges: readonly [number, number]; readonly at: StockPoint }
  /** The corner farthest outside the board, and by how much. */
  | { readonly fault: "outside"; readonly corner: number; readonly at: StockPoint; readonly by: Um };

/** The first fault of a polygon of three or more corners, or null. */
export function polygonFault(corners: readonly StockPoint[]): PolygonFault | null {
  return doubledCorner(corners) ?? crossing(corners);
}

/** The corner of a polygon that reaches farthest out of the board's rectangle, or null; touching is inside. */
export function outsideFault(corners: readonly StockPoint[], { length, width }: BoardSize): PolygonFault | null {
  const over = corners.map(({ x, y }) => Math.max(-x, x - length, -y, y - width, 0));
  const by = Math.max(0, ...over);
  const corner = over.indexOf(by);
  const at = corners[corner];
  return by > 0 && at ? { fault: "outside", corner, at, by: um(by) } : null;
}

function doubledCorner(corners: readonly StockPoint[]): PolygonFault | null {
  for (const [corner, at] of corners.entries()) {
    const next = corners[(corner + 1) % corners.length];
    if (next && next.x === at.x && next.y === at.y) return { fault: "doubled", corner, at };
  }
  return null;
}

interface Edge {
  readonly from: StockPoint;
  readonly to: StockPoint;
}

function crossing(corners: readonly StockPoint[]): PolygonFault | null {
  const edges = corners.map((from, index): Edge => ({ from, to: corners[(index + 1) % corners.length] ?? from }));
  for (const [first, edge] of edges.entries()) {
    for (let second = first + 1; second < edges.length; second++) {
      const other = edges[second];
      if (!other) continue;
      const at = meeting(edge, other, first, second, edges.length);
      if (at) return { fault: "crosses", edges: [first, second], at };
    }
  }
  return null;
}

/** Where two edges meet that should not: neighbours may share their corner, and nothing else. */
function meeting(a: Edge, b: Edge, first: number, second: number, count: number): StockPoint | null {
  if (second === first + 1) return foldsBack(a.from, a.to, b.to) ? a.to : null;
  if (first === 0 && second === count - 1) return foldsBack(b.from, b.to, a.to) ? b.to : null;
  return crossingOf(a, b);
}

const cross = (o: StockPoint, p: StockPoint, q: StockPoint): number => (p.x - o.x) * (q.y - o.y) - (p.y - o.y) * (q.x - o.x);

function foldsBack(from: StockPoint, corner: StockPoint, to: StockPoint): boolean {
  const dot = (corner.x - from.x) * (to.x - corner.x) + (corner.y - from.y) * (to.y - corner.y);
  return cross(from, corner, to) === 0 && dot < 0;
}

function crossingOf(a: Edge, b: Edge): StockPoint | null {
  const a1 = cross(b.from, b.to, a.from);
  const a2 = cross(b.from, b.to, a.to);
  const b1 = cross(a.from, a.to, b.from);
  const b2 = cross(a.from, a.to, b.to);
  if (a1 === 0 && within(b, a.from)) return a.from;
  if (a2 === 0 && within(b, a.to)) return a.to;
  if (b1 === 0 && within(a, b.from)) return b.from;
  if (b2 === 0 && within(a, b.to)) return b.to;
  if (Math.sign(a1) * Math.sign(a2) >= 0 || Math.sign(b1) * Math.sign(b2) >= 0) return null;
  const t = a1 / (a1 - a2);
  return {
    x: um(Math.round(a.from.x + t * (a.to.x - a.from.x))),
    y: um(Math.round(a.from.y + t * (a.to.y - a.from.y))),
  };
}

/** For a point on the edge's line: whether it lies between its ends. */
function within({ from, to }: Edge, p: StockPoint): boolean {
  return (
    Math.min(from.x, to.x) <= p.x &&
    p.x <= Math.max(from.x, to.x) &&
    Math.min(from.y, to.y) <= p.y &&
    p.y <= Math.max(from.y, to.y)
  );
}
