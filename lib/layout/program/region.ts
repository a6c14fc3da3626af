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
  /** Its clean-up, edge by edge, as one word. */
  readonly allowed: string;
}

export interface Region {
  readonly x: Span;
  readonly y: Span;
  readonly edges: Readonly<Record<Edge, EdgeState>>;
  /** µm that have to come off an edge after sawing because of the machine that made it; 0 where the layout reckoned with it. */
  readonly owes: Readonly<Record<Edge, number>>;
  /** A crosscut has made it shorter than the board, or than the rough part, it comes from. */
  readonly shortened: boolean;
  readonly blanks: readonly Blank[];
}

export const kindAcross: Readonly<Record<Axis, CutKind>> = { x: "crosscut", y: "rip" };
export const lowEdge: Readonly<Record<Axis, Edge>> = { x: "left", y: "top" };
export const highEdge: Readonly<Record<Axis, Edge>> = { x: "right", y: "bottom" };
export const axisOfEdge: Readonly<Record<Edge, Axis>> = { left: "x", right: "x", top: "y", bottom: "y" };
export const everyEdge: readonly Edge[] = ["left", "right", "top", "bottom"];
export const isLow = (edge: Edge): boolean => edge === "left" || edge === "top";
export const owesNothing: Region["owes"] = { left: 0, right: 0, top: 0, bottom: 0 };

export const sizeOf = (span: Span): number => span.to - span.from;
export const areaOf = (rect: { readonly x: Span; readonly y: Span }): number => sizeOf(rect.x) * sizeOf(rect.y);

/** Fit to lie against a fence or a stop, and to be an edge of a piece. */
export function isStraight(region: Region, edge: Edge): boolean {
  const state = region.edges[edge];
  return state === "sawn" || state === "trued";
}

/** Tells the rectangles of one program apart: no two that are ever in hand have the same spans. */
export function regionKey(region: Pick<Region, Axis>): string {
  return `${region.x.from} ${region.x.to} ${region.y.from} ${region.y.to}`;
}

/**
 * Equal for rectangles that are cut alike: sizes, where the blanks lie in it and what is cleaned off them, which edges are not fit or
 * owe something, and whether rips come late in it. Blanks that came in order of place keep it in every rectangle.
 */
export function shapeKey(region: Region): string {
  const { x, y, edges, owes, blanks } = region;
  let key = `${sizeOf(x)} ${sizeOf(y)}${region.shortened ? " short" : ""}`;
  for (const edge of everyEdge) if (!isStraight(region, edge) || owes[edge] > 0) key += ` ${edge} ${edges[edge]} ${owes[edge]}`;
  for (const blank of blanks)
    key += `,${blank.x.from - x.from} ${blank.x.to - x.from} ${blank.y.from - y.from} ${blank.y.to - y.from} ${blank.allowed}`;
  return key;
}

/** The coordinate at which an edge lies. */
export function edgeAt(rect: { readonly x: Span; readonly y: Span }, edge: Edge): number {
  const span = rect[axisOfEdge[edge]];
  return isLow(edge) ? span.from : span.to;
}

/** µm of wood between an edge and the nearest blank; infinite where there is none. */
export function roomAt(region: Region, edge: Edge): number {
  const distances = region.blanks.map((blank) => Math.abs(edgeAt(blank, edge) - edgeAt(region, edge)));
  return Math.min(...distances);
}

export function stockRectOf({ x, y }: { readonly x: Span; readonly y: Span }): StockRect {
  return { x: um(x.from), y: um(y.from), width: um(sizeOf(x)), height: um(sizeOf(y)) };
}

export function blankOf(piece: PlacedPiece): Blank {
  const { rect, cleanUp } = piece;
  return {
    piece,
    allowed: `${cleanUp.left} ${cleanUp.right} ${cleanUp.top} ${cleanUp.bottom}`,
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
    owes: owesNothing,
    shortened: false,
    blanks: request.pieces.map(blankOf),
  };
}

/** Nothing left to saw or plane: no piece in it, or one that fills it with every edge fit to leave (straight, or cleaned up later). */
export function isFinished(region: Region): boolean {
  const [blank, second] = region.blanks;
  if (!blank) return true;
  if (second) return false;
  return everyEdge.every(
    (edge) => edgeAt(region, edge) === edgeAt(blank, edge) && (isStraight(region, edge) || blank.piece.cleanUp[edge] > 0),
  );
}
