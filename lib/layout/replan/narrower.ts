/** Leaves one piece of a part in hand a little shorter or narrower than planned, so that all of them fit. */
import type { Edge } from "../program/program";
import { um } from "../units/um";
import { type InPart, inFewWays, mayFit, slidInPart } from "./fit-in-part";
import type { RestPiece } from "./part-in-hand";
import { blankRect, depthFrom, grownAt, reachBeyond } from "./rect-edge";

/** More is a piece of another size, no mended one. Half of a usual gap: common practice, no source. */
export const NARROWER_AT_MOST_UM = 1_500;

/** The pieces with one of them smaller: one that need not keep its size before all others, then the one that loses least. */
export function leftNarrower(asItIs: InPart): readonly RestPiece[] | null {
  const part = inFewWays(asItIs);
  const found = part.pieces.flatMap((piece, i) =>
    (["x", "y"] as const).flatMap((axis) => {
      const edge = edgeToTakeFrom(piece, part, axis);
      const by = leastTaken(part, i, edge);
      return by === null ? [] : [{ i, edge, by, keepsSize: piece.keepsSize }];
    }),
  );
  found.sort((a, b) => Number(a.keepsSize) - Number(b.keepsSize) || a.by - b.by || a.i - b.i);
  for (const { i, edge, by } of found) {
    const slid = slidInPart(without(part, i, edge, by));
    if (slid) return slid;
  }
  return null;
}

/** Where it reaches over the part, else at its end or edge farther from the origin. */
function edgeToTakeFrom(piece: RestPiece, { held }: InPart, axis: "x" | "y"): Edge {
  const [low, high]: readonly [Edge, Edge] = axis === "x" ? ["left", "right"] : ["top", "bottom"];
  return reachBeyond(blankRect(piece), held.part.rect, low) > 0 ? low : high;
}

function leastTaken(part: InPart, index: number, edge: Edge): number | null {
  const piece = part.pieces[index];
  const most = piece ? Math.min(NARROWER_AT_MOST_UM, depthFrom(piece.rect, edge) - 1) : 0;
  if (most <= 0 || !mayFit(without(part, index, edge, most))) return null;
  let [no, yes] = [0, most];
  while (yes - no > 1) {
    const middle = Math.floor((no + yes) / 2);
    if (mayFit(without(part, index, edge, middle))) yes = middle;
    else no = middle;
  }
  return yes;
}

function without(part: InPart, index: number, edge: Edge, by: number): InPart {
  const smaller = (piece: RestPiece): RestPiece => ({ ...piece, rect: grownAt(piece.rect, edge, um(-by)) });
  return { ...part, pieces: part.pieces.map((piece, i) => (i === index ? smaller(piece) : piece)) };
}
