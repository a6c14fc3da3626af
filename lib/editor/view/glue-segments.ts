/** Where glue lines run over the fronts as they will hang. Pure. */
import { type FacePoint, type FaceRect, type Piece, rectToStock, toFace, type Um, um } from "@/lib/layout";

export interface GlueSegment {
  readonly from: FacePoint;
  readonly to: FacePoint;
}

/** The lines that run through the wood of one front, from edge to edge of it, in the face's frame. One along its edge is not seen. */
export function glueSegments(
  { stockFromFace }: Pick<Piece, "stockFromFace">,
  rect: FaceRect,
  glueLines: readonly Um[],
): readonly GlueSegment[] {
  const wood = rectToStock(stockFromFace, rect);
  return glueLines
    .filter((across) => across > wood.y && across < wood.y + wood.height)
    .map((across) => ({
      from: toFace(stockFromFace, { x: wood.x, y: across }),
      to: toFace(stockFromFace, { x: um(wood.x + wood.width), y: across }),
    }));
}
