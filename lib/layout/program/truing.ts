/**
 * Which rough edges of the board are trued before the first cut. A cut needs a straight edge to be measured from, a crosscut also
 * a straight long edge to lie against the fence, and an edge that becomes a piece's edge without clean-up must be straight too.
 */
import { furthestOutside } from "./check-placement";
import type { CutRequest } from "./cut-request";
import type { CutProgramOutcome, Edge } from "./program";
import {
  type Axis,
  axisOfEdge,
  edgeAt,
  everyEdge,
  highEdge,
  isFinished,
  isStraight,
  lowEdge,
  type Region,
  sizeOf,
} from "./region";

export interface TruingWay {
  /** In the order of work. */
  readonly edges: readonly Edge[];
  /** The board with them trued. */
  readonly board: Region;
}

export type TruingOutcome =
  | { readonly ok: true; readonly ways: readonly TruingWay[] }
  | Extract<CutProgramOutcome, { reason: "outside" }>;

/** The ways to true no more edges than needed; more than one where either of two rough edges may serve. */
export function truingWays(board: Region, request: CutRequest): TruingOutcome {
  const needed = everyEdge.filter((edge) => !isStraight(board, edge) && leavesRoughPiece(board, edge));
  const ways = choices(board, "y", needed).flatMap((long) => choices(board, "x", needed).map((end) => [...long, ...end]));
  const trued = ways.map((edges) => ({ edges, board: edges.reduce((region, edge) => trueEdge(region, edge, request), board) }));
  const sound: TruingWay[] = [];
  let refusal: Extract<CutProgramOutcome, { reason: "outside" }> | null = null;
  for (const way of trued) {
    const outside = furthestOutside(way.board);
    if (!outside) sound.push(way);
    else if (!refusal || outside.by < refusal.by) refusal = outside;
  }
  return sound.length === 0 && refusal ? refusal : { ok: true, ways: sound };
}

/** µm that truing takes off an edge. */
export function truingTakes(edge: Edge, request: CutRequest): number {
  return axisOfEdge[edge] === "x" ? request.truingTakes.end : request.truingTakes.longEdge;
}

function leavesRoughPiece(board: Region, edge: Edge): boolean {
  return board.blanks.some((blank) => edgeAt(blank, edge) === edgeAt(board, edge) && blank.piece.cleanUp[edge] === 0);
}

/** Sets of edges across one axis to true, the near edge first. */
function choices(board: Region, axis: Axis, needed: readonly Edge[]): (readonly Edge[])[] {
  const pair = [lowEdge[axis], highEdge[axis]];
  const must = pair.filter((edge) => needed.includes(edge));
  const straight = must.length > 0 || pair.some((edge) => isStraight(board, edge));
  return straight || !needsReference(board, axis) ? [must] : pair.map((edge) => [edge]);
}

/** Long edges: as soon as anything is cut. Ends: as soon as anything is cut to length. */
function needsReference(board: Region, axis: Axis): boolean {
  if (axis === "y") return !isFinished(board);
  return board.blanks.some((blank) => sizeOf(blank.x) < sizeOf(board.x));
}

function trueEdge(region: Region, edge: Edge, request: CutRequest): Region {
  const axis = axisOfEdge[edge];
  const takes = truingTakes(edge, request);
  const { from, to } = region[axis];
  const span = edge === lowEdge[axis] ? { from: from + takes, to } : { from, to: to - takes };
  return { ...region, [axis]: span, edges: { ...region.edges, [edge]: "trued" } };
}
