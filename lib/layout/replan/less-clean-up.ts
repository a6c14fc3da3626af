/**
 * Takes less off the edges of pieces after sawing, so that they fit into a part in hand. First with every piece where it lies, each edge
 * giving only what is missing at it; else with the edges of one axis capped alike and the pieces slid, after which every edge gets back
 * what there is room for.
 */
import type { CutKind, Edge } from "../program/program";
import { type Um, um } from "../units/um";
import { type InPart, inFewWays, mayFit, slidInPart } from "./fit-in-part";
import type { RestPiece } from "./part-in-hand";
import { blankRect, edgeAt, everyEdge, reachBeyond } from "./rect-edge";
import { stands } from "./stands";

const edgesOf: Readonly<Record<CutKind, readonly Edge[]>> = { crosscut: ["left", "right"], rip: ["top", "bottom"] };

/** The pieces with what is left to clean up; null when that does not help. */
export function cleanedLess(part: InPart): readonly RestPiece[] | null {
  const inPlace = roomMadeInPlace(part);
  if (inPlace && stands(part.held, inPlace, part.sawing)) return inPlace;
  const few = inFewWays(part);
  for (const edges of [edgesOf.crosscut, edgesOf.rip, everyEdge]) {
    const capped = leastCapped(few, edges);
    if (capped) return givenBack(part, capped);
  }
  return null;
}

/** Nothing slides: an edge that reaches over the part, or too near another piece, gives what is missing there. */
function roomMadeInPlace({ held, pieces, sawing, issued }: InPart): readonly RestPiece[] | null {
  let now: RestPiece[] = pieces.map((piece) =>
    everyEdge.reduce((left, edge) => lessAt(left, edge, reachBeyond(blankRect(left), held.part.rect, edge)), piece),
  );
  for (const kind of ["crosscut", "rip"] as const) {
    const [low, high] = edgesOf[kind];
    for (const [a, b] of issued?.[kind === "crosscut" ? "x" : "y"] ?? []) {
      const [before, after] = [now[a], now[b]];
      if (!before || !after || !low || !high) return null;
      const missing = sawing.kerf[kind] - (edgeAt(blankRect(after), low) - edgeAt(blankRect(before), high));
      if (missing <= 0) continue;
      const ofAfter = Math.min(Math.floor(missing / 2), after.cleanUp[low]);
      const ofBefore = Math.min(missing - ofAfter, before.cleanUp[high]);
      now = now.map((piece, i) =>
        i === a ? lessAt(before, high, ofBefore) : i === b ? lessAt(after, low, missing - ofBefore) : piece,
      );
    }
  }
  return now.some((piece) => everyEdge.some((edge) => piece.cleanUp[edge] < 0)) ? null : now;
}

function lessAt(piece: RestPiece, edge: Edge, by: number): RestPiece {
  return by <= 0 ? piece : { ...piece, cleanUp: { ...piece.cleanUp, [edge]: um(piece.cleanUp[edge] - by) } };
}

/** The highest cap on the clean-up of these edges with which the pieces fit, slid as little as can be. */
function leastCapped(part: InPart, edges: readonly Edge[]): readonly RestPiece[] | null {
  const most = Math.max(...part.pieces.flatMap((piece) => edges.map((edge) => piece.cleanUp[edge])));
  const withCap = (cap: number): InPart => ({ ...part, pieces: part.pieces.map((piece) => capped(piece, edges, cap)) });
  if (most <= 0 || !mayFit(withCap(0))) return null;
  let [yes, no] = [0, most];
  while (no - yes > 1) {
    const middle = Math.floor((yes + no) / 2);
    if (mayFit(withCap(middle))) yes = middle;
    else no = middle;
  }
  return slidInPart(withCap(yes));
}

function capped(piece: RestPiece, edges: readonly Edge[], cap: number): RestPiece {
  return edges.reduce((left, edge) => lessAt(left, edge, piece.cleanUp[edge] - cap), piece);
}

/** Every edge gets back as much of its clean-up as there is room for, in the order of the pieces. */
function givenBack({ held, pieces, sawing }: InPart, now: readonly RestPiece[]): readonly RestPiece[] {
  let given = now;
  for (const [i, planned] of pieces.entries()) {
    for (const edge of everyEdge) {
      const withEdge = (amount: Um) =>
        given.map((piece, j) => (i === j ? { ...piece, cleanUp: { ...piece.cleanUp, [edge]: amount } } : piece));
      let [yes, no] = [given[i]?.cleanUp[edge] ?? um(0), planned.cleanUp[edge] + 1];
      while (no - yes > 1) {
        const middle = um(yes + Math.floor((no - yes) / 2));
        if (stands(held, withEdge(middle), sawing)) yes = middle;
        else no = middle;
      }
      given = withEdge(yes);
    }
  }
  return given;
}
