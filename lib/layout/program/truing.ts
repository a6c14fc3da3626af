/**
 * Which edges of the board, or of a rough part, are trued before the first fine cut. A cut needs a straight edge to be measured from, a
 * crosscut also a straight long edge to lie against the fence, and an edge that becomes a piece's edge without clean-up must be
 * straight too. A line can be marked from an end as it is, where some of it falls off anyway.
 */
import { furthestOutside } from "./check-placement";
import { worked } from "./part";
import type { CutProgramOutcome, Edge } from "./program";
import { type Axis, edgeAt, everyEdge, highEdge, isFinished, isStraight, lowEdge, type Region, roomAt, sizeOf } from "./region";

export interface TruingWay {
  /** In the order of work. */
  readonly edges: readonly Edge[];
  readonly takes: TruingTakes;
  /** Before any of them is trued. */
  readonly from: Region;
  /** The board with them trued. */
  readonly board: Region;
}

export type TruingOutcome =
  | { readonly ok: true; readonly ways: readonly TruingWay[] }
  | Extract<CutProgramOutcome, { reason: "outside" }>;

/** µm that truing takes off an edge. */
export type TruingTakes = (edge: Edge) => number;

/** The ways to true no more edges than needed; more than one where either of two rough edges may serve. */
export function truingWays(board: Region, takes: TruingTakes): TruingOutcome {
  const needed = everyEdge.filter((edge) => !isStraight(board, edge) && leavesRoughPiece(board, edge));
  const ways = choices(board, "y", needed).flatMap((long) => choices(board, "x", needed).map((end) => [...long, ...end]));
  const trued = ways.map((edges) => ({
    edges,
    takes,
    from: board,
    board: edges.reduce((region, edge) => worked(region, edge, takes(edge)), board),
  }));
  const sound: TruingWay[] = [];
  let refusal: Extract<CutProgramOutcome, { reason: "outside" }> | null = null;
  for (const way of trued) {
    const outside = furthestOutside(way.board);
    if (!outside) sound.push(way);
    else if (!refusal || outside.by < refusal.by) refusal = outside;
  }
  return sound.length === 0 && refusal ? refusal : { ok: true, ways: sound };
}

function leavesRoughPiece(board: Region, edge: Edge): boolean {
  return board.blanks.some((blank) => edgeAt(blank, edge) === edgeAt(board, edge) && blank.piece.cleanUp[edge] === 0);
}

/** Sets of edges across one axis to true, the near edge first. */
function choices(board: Region, axis: Axis, needed: readonly Edge[]): (readonly Edge[])[] {
  const pair = [lowEdge[axis], highEdge[axis]];
  const must = pair.filter((edge) => needed.includes(edge));
  const serves = must.length > 0 || pair.some((edge) => isStraight(board, edge) || isMarkedFrom(board, edge));
  return serves || !needsReference(board, axis) ? [must] : pair.map((edge) => [edge]);
}

const isMarkedFrom = (board: Region, edge: Edge): boolean => board.edges[edge] === "marked" && roomAt(board, edge) > 0;

/** Long edges: as soon as anything is cut. Ends: as soon as anything is cut to length. */
function needsReference(board: Region, axis: Axis): boolean {
  if (axis === "y") return !isFinished(board);
  return board.blanks.some((blank) => sizeOf(blank.x) < sizeOf(board.x));
}
