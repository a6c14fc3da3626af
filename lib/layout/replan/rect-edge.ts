/** Edges of upright rectangles in the stock frame: where they lie, and rectangles with one of them moved. */
import type { StockRect } from "../frame/point";
import type { PlacedPiece } from "../program/cut-request";
import type { Edge } from "../program/program";
import { um } from "../units/um";

export const everyEdge = ["left", "right", "top", "bottom"] as const satisfies readonly Edge[];
export const oppositeOf: Readonly<Record<Edge, Edge>> = { left: "right", right: "left", top: "bottom", bottom: "top" };

/** Left and top: coordinates grow away from them. */
export const isLow = (edge: Edge): boolean => edge === "left" || edge === "top";
/** Left and right: ends of the board, parted by crosscuts. */
export const isEnd = (edge: Edge): boolean => edge === "left" || edge === "right";

export const areaOf = (rect: StockRect): number => rect.width * rect.height;

/** The coordinate at which an edge lies. */
export function edgeAt(rect: StockRect, edge: Edge): number {
  switch (edge) {
    case "left":
      return rect.x;
    case "right":
      return rect.x + rect.width;
    case "top":
      return rect.y;
    case "bottom":
      return rect.y + rect.height;
  }
}

/** µm between an edge and the one opposite. */
export const depthFrom = (rect: StockRect, edge: Edge): number => (isEnd(edge) ? rect.width : rect.height);

/** The rectangle with so much more wood at one edge; negative: so much less. Never less than nothing. */
export function grownAt(rect: StockRect, edge: Edge, by: number): StockRect {
  const more = Math.max(by, -depthFrom(rect, edge));
  const shift = isLow(edge) ? more : 0;
  return isEnd(edge)
    ? { ...rect, x: um(rect.x - shift), width: um(rect.width + more) }
    : { ...rect, y: um(rect.y - shift), height: um(rect.height + more) };
}

/** The slice of a rectangle between two distances from one of its edges. */
export function sliceOf(rect: StockRect, edge: Edge, from: number, to: number): StockRect {
  const depth = depthFrom(rect, edge);
  return grownAt(grownAt(rect, oppositeOf[edge], to - depth), edge, -from);
}

/** Touching is not overlapping. */
export function overlap(a: StockRect, b: StockRect): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

export function isInside(inner: StockRect, outer: StockRect): boolean {
  return everyEdge.every((edge) => reachBeyond(inner, outer, edge) <= 0);
}

/** µm by which `inner` reaches over one edge of `outer`; negative while it stays inside. */
export function reachBeyond(inner: StockRect, outer: StockRect, edge: Edge): number {
  const beyond = edgeAt(inner, edge) - edgeAt(outer, edge);
  return isLow(edge) ? -beyond : beyond;
}

export function sameRect(a: StockRect, b: StockRect): boolean {
  return a.x === b.x && a.y === b.y && a.width === b.width && a.height === b.height;
}

/** A piece as it must leave the saw: finished rectangle and clean-up. */
export function blankRect({ rect, cleanUp }: PlacedPiece): StockRect {
  return everyEdge.reduce((grown, edge) => grownAt(grown, edge, cleanUp[edge]), rect);
}

export function movedBy(rect: StockRect, by: { readonly x: number; readonly y: number }): StockRect {
  return { ...rect, x: um(rect.x + by.x), y: um(rect.y + by.y) };
}
