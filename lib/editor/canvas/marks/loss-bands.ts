/** The wood that sawing and cleaning turn to dust around the pieces of a board, darkened. Where the bands of neighbours lie on each other it is one cut. */
import type { Box, Paint } from "../sketch";

export interface LossBand {
  readonly piece: Box;
  /** The piece with what its own cuts take off around it. */
  readonly grown: Box;
}

export function paintLoss(bands: readonly LossBand[]): Paint {
  return (context, { left, top }) => {
    context.beginPath();
    for (const { grown } of bands) context.rect(grown.left - left, grown.top - top, grown.width, grown.height);
    context.fillStyle = "rgb(32 38 42 / 0.62)";
    context.fill();
    context.globalCompositeOperation = "destination-out";
    context.beginPath();
    for (const { piece } of bands) context.rect(piece.left - left, piece.top - top, piece.width, piece.height);
    context.fillStyle = "#000000";
    context.fill();
    context.globalCompositeOperation = "source-over";
  };
}
