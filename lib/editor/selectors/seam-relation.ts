/** How the wood on the two sides of a seam is related, which decides what there is to say about it. */
import type { Piece, PieceId, Seam } from "@/lib/layout";

export type SeamRelation =
  | "no-wood"
  /** From different boards: figures that have nothing to do with each other. */
  | "other-wood"
  /** From one board, one of the two turned: the figure cannot run on, and a distance would mean nothing. */
  | "turned"
  /** From one board and lying alike: the jump says how well the figure runs on. */
  | "runs-on";

export function seamRelation({ a, b }: Pick<Seam, "a" | "b">, pieces: ReadonlyMap<PieceId, Piece>): SeamRelation {
  const [first, second] = [pieces.get(a), pieces.get(b)];
  if (!first || !second) return "no-wood";
  if (first.stockId !== second.stockId) return "other-wood";
  const [p, q] = [first.stockFromFace, second.stockFromFace];
  return p.a === q.a && p.b === q.b && p.c === q.c && p.d === q.d ? "runs-on" : "turned";
}
