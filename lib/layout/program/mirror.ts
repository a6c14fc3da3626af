/**
 * Seeing the board from its other end or its other edge. A layout is always worked out as seen from the corner nearest its first
 * piece, so that a mirrored layout gets the mirrored program and work starts at the first piece.
 */
import type { StockRect } from "../frame/point";
import { um } from "../units/um";
import type { CutRequest, PlacedPiece } from "./cut-request";
import type { CutProgram, CutStep, Edge, Part } from "./program";

/** Which axes are seen from the other side, and the board's size. */
export interface View {
  readonly x: boolean;
  readonly y: boolean;
  readonly board: CutRequest["board"];
}

/** The view in which the pieces, in order of their ids, come nearest to the origin; as it is where both views look the same. */
export function viewFromFirstPiece(request: CutRequest): View {
  const { board } = request;
  const asIs = { x: false, y: false, board };
  return {
    x: isLess(signature(mirrorRequest(request, { ...asIs, x: true }), "x"), signature(request, "x")),
    y: isLess(signature(mirrorRequest(request, { ...asIs, y: true }), "y"), signature(request, "y")),
    board,
  };
}

/** Everything of a request that a mirror along one axis can change. */
function signature(request: CutRequest, axis: "x" | "y"): number[] {
  const pieces = [...request.pieces].sort(byId);
  const near = axis === "x" ? "left" : "top";
  const edge = ["trued", "marked", "rough"].indexOf(request.boardEdges[near]);
  return [...pieces.map((piece) => piece.rect[axis]), ...pieces.map((piece) => piece.cleanUp[near]), edge];
}

/** "p2" before "p10". */
function byId(a: PlacedPiece, b: PlacedPiece): number {
  return a.pieceId.length - b.pieceId.length || (a.pieceId < b.pieceId ? -1 : Number(a.pieceId > b.pieceId));
}

function isLess(a: readonly number[], b: readonly number[]): boolean {
  const at = a.findIndex((value, i) => value !== b[i]);
  return at >= 0 && (a[at] ?? 0) < (b[at] ?? 0);
}

export function mirrorRect(rect: StockRect, view: View): StockRect {
  return {
    ...rect,
    x: view.x ? um(view.board.length - rect.x - rect.width) : rect.x,
    y: view.y ? um(view.board.width - rect.y - rect.height) : rect.y,
  };
}

const across: Readonly<Record<Edge, Edge>> = { left: "right", right: "left", top: "bottom", bottom: "top" };

export function mirrorEdge(edge: Edge, view: View): Edge {
  const turned = edge === "left" || edge === "right" ? view.x : view.y;
  return turned ? across[edge] : edge;
}

function mirrorEdges<T>(edges: Readonly<Record<Edge, T>>, view: View): Record<Edge, T> {
  return {
    left: edges[mirrorEdge("left", view)],
    right: edges[mirrorEdge("right", view)],
    top: edges[mirrorEdge("top", view)],
    bottom: edges[mirrorEdge("bottom", view)],
  };
}

export function mirrorRequest(request: CutRequest, view: View): CutRequest {
  return {
    ...request,
    boardEdges: mirrorEdges(request.boardEdges, view),
    pieces: request.pieces.map((piece) => ({
      ...piece,
      rect: mirrorRect(piece.rect, view),
      cleanUp: mirrorEdges(piece.cleanUp, view),
    })),
  };
}

export function mirrorProgram(program: CutProgram, view: View): CutProgram {
  const part = (one: Part): Part => ({ ...one, rect: mirrorRect(one.rect, view) });
  const step = (one: CutStep): CutStep => ({
    ...one,
    part: part(one.part),
    fromEdge: mirrorEdge(one.fromEdge, view),
    kerf: mirrorRect(one.kerf, view),
    yields: one.yields.map(part),
  });
  return {
    ...program,
    steps: program.steps.map(step),
    cleanUps: program.cleanUps.map((cleanUp) => ({ ...cleanUp, edge: mirrorEdge(cleanUp.edge, view) })),
    pieces: program.pieces.map(part),
    offcuts: program.offcuts.map(part),
    waste: program.waste.map(part),
  };
}
