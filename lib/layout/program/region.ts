/**
 * The rectangle in hand while a program is being worked out: its spans, the state of its edges and the blanks still in it.
 * Plain numbers in µm, stock frame; branded lengths come back when the program is written down.
 */
import type { StockRect } from "../frame/point";
import { um } from "../units/um";
import type { CutRequest, PlacedPiece } from "./cut-request";
import type { CutKind, Edge, EdgeState } from "./program";

/** x runs along the grain and is parted by crosscuts, y across it and is parted by rips. */
export type Axis = "x" | "y";

export interface Span {
  readonly from: number;
  readonly to: number;
}

/** A piece as it must leave the saw: finished rectangle grown by its clean-up. */
export interface Blank {
  readonly piece: PlacedPiece;
  readonly x: Span;
  readonly y: Span;
}

export interface Region {
  readonly x: Span;
  readonly y: Span;
  readonly edges: Readonly<Record<Edge, EdgeState>>;
  readonly blanks: readonly Blank[];
}

export const kindAcross: Readonly<Record<Axis, CutKind>> = { x: "crosscut", y: "rip" };
export const lowEdge: Readonly<Record<Axis, Edge>> = { x: "left", y: "top" };
export const highEdge: Readonly<Record<Axis, Edge>> = { x: "right", y: "bottom" };
export const axisOfEdge: Readonly<Record<Edge, Axis>> = { left: "x", right: "x", top: "y", bottom: "y" };
export const everyEdge: readonly Edge[] = ["left", "right", "top", "bottom"];

export const sizeOf = (span: Span): number => span.to - span.from;
export const areaOf = (rect: { readonly x: Span; readonly y: Span }): number => sizeOf(rect.x) * sizeOf(rect.y);
export const isStraight = (region: Region, edge: Edge): boolean => region.edges[edge] !== "rough";

/** Tells the rectangles of one program apart: no two that are ever in hand have the same spans. */
export function regionKey(region: Region): string {
  return `${region.x.from} ${region.x.to} ${region.y.from} ${region.y.to}`;
}

/** Equal for rectangles that are cut alike: sizes, where the blanks lie in it, which edges are rough and of which blanks they may stay so. */
export function shapeKey(region: Region): string {
  const { x, y } = region;
  const rough = everyEdge.filter((edge) => !isStraight(region, edge));
  const blanks = region.blanks.map((blank) => {
    const place = [blank.x.from - x.from, blank.x.to - x.from, blank.y.from - y.from, blank.y.to - y.from];
    return [...place, ...rough.filter((edge) => blank.piece.cleanUp[edge] > 0)].join(" ");
  });
  return `${sizeOf(x)} ${sizeOf(y)} ${rough.join(" ")}:${blanks.sort().join(",")}`;
}

/** The coordinate at which an edge lies. */
export function edgeAt(rect: { readonly x: Span; readonly y: Span }, edge: Edge): number {
  const span = rect[axisOfEdge[edge]];
  return edge === "left" || edge === "top" ? span.from : span.to;
}

export function stockRectOf({ x, y }: { readonly x: Span; readonly y: Span }): StockRect {
  return { x: um(x.from), y: um(y.from), width: um(sizeOf(x)), height: um(sizeOf(y)) };
}

export function blankOf(piece: PlacedPiece): Blank {
  const { rect, cleanUp } = piece;
  return {
    piece,
    x: { from: rect.x - cleanUp.left, to: rect.x + rect.width + cleanUp.right },
    y: { from: rect.y - cleanUp.top, to: rect.y + rect.height + cleanUp.bottom },
  };
}

/** The whole board with everything in it, before truing. */
export function wholeBoard(request: CutRequest): Region {
  return {
    x: { from: 0, to: request.board.length },
    y: { from: 0, to: request.board.width },
    edges: request.boardEdges,
    blanks: request.pieces.map(blankOf),
  };
}

/** Nothing left to saw: no piece in it, or one that fills it with every edge fit to leave (straight, or cleaned up later). */
export function isFinished(region: Region): boolean {
  const [blank, second] = region.blanks;
  if (!blank) return true;
  if (second) return false;
  return everyEdge.every(
    (edge) => edgeAt(region, edge) === edgeAt(blank, edge) && (isStraight(region, edge) || blank.piece.cleanUp[edge] > 0),
  );
}

export interface Halves {
  /** The wood turned to dust: the blade's width as far as it runs in wood. */
  readonly kerf: Span;
  /** What lies on either side; null where the blade takes everything. */
  readonly low: Region | null;
  readonly high: Region | null;
}

/** Parts a region by a blade that covers `blade` on the axis. The caller knows that no blank lies under the blade. */
export function part(region: Region, axis: Axis, blade: Span): Halves {
  const whole = region[axis];
  const kerf = { from: Math.max(blade.from, whole.from), to: Math.min(blade.to, whole.to) };
  const side = (span: Span, sawn: Edge): Region | null =>
    sizeOf(span) <= 0
      ? null
      : {
          ...region,
          [axis]: span,
          edges: { ...region.edges, [sawn]: "sawn" },
          blanks: region.blanks.filter((blank) => blank[axis].from >= span.from && blank[axis].to <= span.to),
        };
  return {
    kerf,
    low: side({ from: whole.from, to: kerf.from }, highEdge[axis]),
    high: side({ from: kerf.to, to: whole.to }, lowEdge[axis]),
  };
}
