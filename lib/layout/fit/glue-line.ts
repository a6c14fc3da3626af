/**
 * Glue lines of a blank near the long edge of a piece: the narrow strip beyond the line may part at the edge when it is worked, and is
 * seen there as a strip of other wood. A line along the very edge, or beside the piece, is none in it.
 */
import type { BoardFace } from "../stock/board";
import { type Um, um } from "../units/um";
import type { LyingPiece } from "./lying-piece";

/** From the long edge of a piece to the nearest glue line in it: 10 mm (common practice, no source). */
export const LEAST_GLUE_LINE: Um = um(10_000);

export interface NearGlueLine {
  /** Where it lies on the board, from its top edge. */
  readonly at: Um;
  readonly fromEdge: Um;
}

/** The glue lines in a piece that lie nearer a long edge than `least`, in the order of the board. */
export function nearGlueLines({ spans }: LyingPiece, { glueLines }: Pick<BoardFace, "glueLines">, least: Um): NearGlueLine[] {
  const { from, to } = spans.across;
  return glueLines.flatMap((at) => {
    const fromEdge = um(Math.min(at - from, to - at));
    return fromEdge > 0 && fromEdge < least ? [{ at, fromEdge }] : [];
  });
}
