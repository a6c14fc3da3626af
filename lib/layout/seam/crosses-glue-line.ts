/**
 * Whether a jump at a seam says anything of figure in a blank glued up of several boards: where the two sides lie on different
 * boards of it, they were never one figure, however little the cut between them took.
 *
 * Both sides are followed along the seam; which board a point lies on is asked half a micrometre inside its piece, so that an edge
 * along a glue line belongs to the board that its piece is cut from.
 */
import type { Isometry } from "../frame/isometry";
import type { Piece, PieceId } from "../piece";
import type { BoardFace } from "../stock/board";
import type { Seam } from "./seam";

/** On how much of the seam the two sides lie on different boards of the blank. */
export type GlueLineCrossing = "nowhere" | "partly" | "everywhere";

/** "nowhere" also where the pieces are not both laid on this stock: then there is no jump to doubt. */
export function crossesGlueLine(
  seam: Pick<Seam, "a" | "b" | "from" | "to" | "facing" | "normal">,
  pieces: ReadonlyMap<PieceId, Piece>,
  board: Pick<BoardFace, "id" | "glueLines">,
): GlueLineCrossing {
  const [a, b] = [pieces.get(seam.a), pieces.get(seam.b)];
  if (a?.stockId !== board.id || b?.stockId !== board.id || board.glueLines.length === 0) return "nowhere";
  const [onA, onB] = [edgeOf(a.stockFromFace, seam, "a"), edgeOf(b.stockFromFace, seam, "b")];
  const ends = [0, 1, ...[onA, onB].flatMap((edge) => crossings(edge, board.glueLines))].sort((p, q) => p - q);
  const apart = ends.slice(1).flatMap((to, index) => {
    const from = ends[index] ?? 0;
    if (to <= from) return [];
    const middle = (from + to) / 2;
    return [memberAt(onA, middle, board.glueLines) !== memberAt(onB, middle, board.glueLines)];
  });
  if (apart.every((differs) => !differs)) return "nowhere";
  return apart.every((differs) => differs) ? "everywhere" : "partly";
}

/** One side of the seam across the grain: y in the wood at its two ends. */
interface EdgeAcross {
  readonly start: number;
  readonly end: number;
}

const INSIDE_UM = 0.5;

function edgeOf(
  { b, d, ty }: Isometry,
  { from, to, facing, normal }: Parameters<typeof crossesGlueLine>[0],
  side: "a" | "b",
): EdgeAcross {
  const inward = side === "a" ? -INSIDE_UM : INSIDE_UM;
  const [x, y] = normal === "right" ? [inward, 0] : [0, inward];
  const start = side === "a" ? from : facing;
  const across = (px: number, py: number) => b * (px + x) + d * (py + y) + ty;
  return { start: across(start.x, start.y), end: across(start.x + to.x - from.x, start.y + to.y - from.y) };
}

/** Where along the edge, 0 to 1, it passes over a glue line. */
function crossings({ start, end }: EdgeAcross, glueLines: readonly number[]): number[] {
  if (start === end) return [];
  return glueLines.map((line) => (line - start) / (end - start)).filter((share) => share > 0 && share < 1);
}

/** Boards of the blank are counted from its top edge. */
function memberAt({ start, end }: EdgeAcross, share: number, glueLines: readonly number[]): number {
  const y = start + share * (end - start);
  return glueLines.filter((line) => line < y).length;
}
