/**
 * Whether a piece lies inside the usable outline of a board, a simple polygon that may be concave. Touching from inside is
 * inside.
 *
 * A rectangle lies inside a simple polygon when no edge of the polygon passes through its open interior and its middle is inside.
 */
import type { StockPoint } from "../frame/point";
import type { BoardFace } from "../stock/board";
import { um } from "../units/um";
import { movesInto, unionOf } from "./forbidden-moves";
import { outlineShadow } from "./polygon-shadow";
import { otherAxis, type Span, type Spans, type StockAxis } from "./span";

/** The outline to stay in: the traced one, or the rectangle of the board. */
export function usableOutline(board: Pick<BoardFace, "length" | "width" | "outline">): readonly StockPoint[] {
  const zero = um(0);
  return (
    board.outline ?? [
      { x: zero, y: zero },
      { x: board.length, y: zero },
      { x: board.length, y: board.width },
      { x: zero, y: board.width },
    ]
  );
}

/**
 * How far a piece reaches over the outline: the larger of how far its worst corner lies outside, and how deep the outline
 * cuts into it (a notch can do that while all corners are inside). 0 when it is inside or touches.
 */
export function outsideBy(piece: Spans, outline: readonly StockPoint[]): number {
  const overCorners = cornersOf(piece).map((corner) => (isInside(corner, outline) ? 0 : distanceTo(corner, outline)));
  const cutInto = edgesOf(outline).reduce((deepest, edge) => Math.max(deepest, depthInside(piece, edge)), 0);
  return Math.max(cutInto, ...overCorners);
}

/** Moves along one axis after which the piece is not inside the outline, as open intervals, infinite at both ends. */
export function movesOutside(piece: Spans, outline: readonly StockPoint[], axis: StockAxis): Span[] {
  const band = piece[otherAxis(axis)];
  const onEdges = unionOf(outlineShadow(outline, axis, band).map((shadow) => movesInto(piece[axis], shadow)));
  const allowed = gapsBetween(onEdges).filter(({ from, to }) => isInside(middleOf(piece, axis, (from + to) / 2), outline));
  const ends = [Number.NEGATIVE_INFINITY, ...allowed.flatMap(({ from, to }) => [from, to]), Number.POSITIVE_INFINITY];
  const forbidden: Span[] = [];
  for (let index = 0; index + 1 < ends.length; index += 2) forbidden.push({ from: ends[index] ?? 0, to: ends[index + 1] ?? 0 });
  return forbidden;
}

interface Place {
  readonly x: number;
  readonly y: number;
}

interface Edge {
  readonly start: Place;
  readonly end: Place;
}

function edgesOf(outline: readonly StockPoint[]): Edge[] {
  return outline.map((start, index) => ({ start, end: outline[(index + 1) % outline.length] ?? start }));
}

function cornersOf({ along, across }: Spans): Place[] {
  return [along.from, along.to].flatMap((x) => [across.from, across.to].map((y) => ({ x, y })));
}

function gapsBetween(union: readonly Span[]): Span[] {
  return union.slice(1).map((next, index) => ({ from: union[index]?.to ?? 0, to: next.from }));
}

function middleOf({ along, across }: Spans, axis: StockAxis, move: number): Place {
  const middle = { x: (along.from + along.to) / 2, y: (across.from + across.to) / 2 };
  return axis === "along" ? { ...middle, x: middle.x + move } : { ...middle, y: middle.y + move };
}

/** Even-odd rule; either answer may come for a point on the outline, whose distance to it is 0 anyway. */
function isInside({ x, y }: Place, outline: readonly StockPoint[]): boolean {
  let inside = false;
  outline.forEach((start, index) => {
    const end = outline[(index + 1) % outline.length] ?? start;
    if (start.y > y === end.y > y) return;
    if (x < start.x + ((end.x - start.x) * (y - start.y)) / (end.y - start.y)) inside = !inside;
  });
  return inside;
}

function distanceTo(point: Place, outline: readonly StockPoint[]): number {
  return Math.min(...edgesOf(outline).map((edge) => distanceToEdge(point, edge)));
}

function distanceToEdge({ x, y }: Place, { start, end }: Edge): number {
  const dx = end.x - start.x;
  const dy = end.y - start.y;
  const square = dx * dx + dy * dy;
  const t = square === 0 ? 0 : Math.min(1, Math.max(0, ((x - start.x) * dx + (y - start.y) * dy) / square));
  return Math.hypot(x - start.x - t * dx, y - start.y - t * dy);
}

/**
 * The greatest depth below the piece's sides that an edge reaches. The depth of a point is the least of its four distances to
 * the sides, each linear in t along the edge; the least of linear functions is largest at an end or where two of them meet.
 */
function depthInside({ along, across }: Spans, { start, end }: Edge): number {
  // Most edges lie wholly beyond one side.
  if (Math.max(start.x, end.x) <= along.from || Math.min(start.x, end.x) >= along.to) return 0;
  if (Math.max(start.y, end.y) <= across.from || Math.min(start.y, end.y) >= across.to) return 0;
  const dx = end.x - start.x;
  const dy = end.y - start.y;
  const sides = [
    { at: start.x - along.from, slope: dx },
    { at: along.to - start.x, slope: -dx },
    { at: start.y - across.from, slope: dy },
    { at: across.to - start.y, slope: -dy },
  ];
  const meetings = sides.flatMap((p, index) => sides.slice(index + 1).map((q) => (q.at - p.at) / (p.slope - q.slope)));
  const depths = [0, 1, ...meetings.filter((t) => t > 0 && t < 1)].map((t) =>
    Math.min(...sides.map(({ at, slope }) => at + slope * t)),
  );
  return Math.max(0, ...depths);
}
