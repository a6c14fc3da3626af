/**
 * Polygons that lie side by side, made into one: where two run along each other in opposite senses the edge between them is gone, and
 * what remains is followed round. Exact but for the rounding of cut corners, because only edges on known level lines are taken apart.
 */
import type { StockPoint } from "../../frame/point";
import type { Um } from "../../units/um";

export interface Ring {
  readonly corners: readonly StockPoint[];
  /** µm², below 0 for a hole. */
  readonly area: number;
}

interface Edge {
  readonly from: StockPoint;
  readonly to: StockPoint;
}

/** Rings of positive area that overlap nowhere, all of whose shared edges lie on the given lines. The largest first, then by corner. */
export function mergedRings(rings: readonly (readonly StockPoint[])[], lines: readonly Um[]): Ring[] {
  const edges = rings.flatMap(edgesOf);
  const onLine = ({ from, to }: Edge) => from.y === to.y && lines.includes(from.y);
  const free = edges.filter((edge) => !onLine(edge));
  const left = lines.flatMap((line) => {
    const stops = edges.flatMap(({ from }) => (from.y === line ? from.x : []));
    return remaining(
      edges.filter((edge) => onLine(edge) && edge.from.y === line),
      [...new Set(stops)].sort((p, q) => p - q),
      line,
    );
  });
  return followed([...free, ...left])
    .map((corners) => ({ corners, area: areaOf(corners) }))
    .filter(({ corners, area }) => corners.length >= 3 && area !== 0)
    .sort((p, q) => q.area - p.area || compared(p.corners[0], q.corners[0]));
}

/** By the shoelace formula, above 0 for a ring that runs clockwise as seen (y points down). */
export function areaOf(corners: readonly StockPoint[]): number {
  const doubled = edgesOf(corners).reduce((sum, { from, to }) => sum + from.x * to.y - to.x * from.y, 0);
  return doubled / 2;
}

function edgesOf(corners: readonly StockPoint[]): Edge[] {
  return corners.map((from, index) => ({ from, to: corners[(index + 1) % corners.length] ?? from }));
}

/**
 * Where along one line edges of one sense are more than those of the other: what bounds wood on one side of it only. `stops`: wherever
 * a ring has a corner on the line, so that rings which touch there touch in corners.
 */
function remaining(edges: readonly Edge[], stops: readonly Um[], y: Um): Edge[] {
  return stops.slice(1).flatMap((end, index) => {
    const start = stops[index] ?? end;
    const net = edges.reduce((sum, { from, to }) => {
      if (Math.min(from.x, to.x) > start || Math.max(from.x, to.x) < end) return sum;
      return sum + Math.sign(to.x - from.x);
    }, 0);
    if (net === 0) return [];
    const [low, high] = [
      { x: start, y },
      { x: end, y },
    ];
    return [net > 0 ? { from: low, to: high } : { from: high, to: low }];
  });
}

const keyOf = ({ x, y }: StockPoint) => `${x} ${y}`;

/** Follows edges from end to start. Where a way comes back to a corner it has been to, the round in between is a ring of its own. */
function followed(edges: readonly Edge[]): StockPoint[][] {
  const waiting = new Map<string, Edge[]>();
  for (const edge of edges) waiting.set(keyOf(edge.from), [...(waiting.get(keyOf(edge.from)) ?? []), edge]);
  const rings: StockPoint[][] = [];
  for (const first of edges) {
    let at = first.from;
    const way: StockPoint[] = [];
    const places = new Map<string, number>();
    for (let next = waiting.get(keyOf(at))?.pop(); next; next = waiting.get(keyOf(at))?.pop()) {
      places.set(keyOf(at), way.length);
      way.push(at);
      at = next.to;
      const seen = places.get(keyOf(at));
      if (seen === undefined) continue;
      const round = way.splice(seen);
      for (const corner of round) places.delete(keyOf(corner));
      rings.push(withoutStraightCorners(round));
    }
  }
  return rings;
}

/** A ring passes no corner twice, so corners in line are those on a straight run. */
function withoutStraightCorners(corners: readonly StockPoint[]): StockPoint[] {
  return corners.filter((corner, index) => {
    const [before, after] = [corners.at(index - 1) ?? corner, corners[(index + 1) % corners.length] ?? corner];
    return (corner.x - before.x) * (after.y - corner.y) !== (corner.y - before.y) * (after.x - corner.x);
  });
}

function compared(p: StockPoint | undefined, q: StockPoint | undefined): number {
  return (p?.y ?? 0) - (q?.y ?? 0) || (p?.x ?? 0) - (q?.x ?? 0);
}
