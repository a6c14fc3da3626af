/** The label of a piece in a small box, as it is written on the wood: as large as reads well, smaller on a piece that leaves no room for that. */
import type { Palette } from "../palette";
import type { Box } from "../sketch";

const LARGEST_PX = 20;
/** Below this a label is a smudge, and the list of fronts tells which is which. */
const SMALLEST_PX = 8;
const AWAY_FROM_EDGE_PX = 4;

/** Writes the label in the top left corner of a piece. */
export function chip(
  context: CanvasRenderingContext2D,
  piece: Box,
  label: string,
  colours: { readonly fill: string; readonly ink: string },
  palette: Palette,
): void {
  const edge = piece.height > 3 * LARGEST_PX ? AWAY_FROM_EDGE_PX : 1;
  const height = Math.min(LARGEST_PX, piece.height - 2 * edge, (piece.width - 2 * edge) * 0.9);
  if (height < SMALLEST_PX) return;
  context.font = `700 ${Math.round(height * 0.78)}px ${palette.measure}`;
  const width = Math.max(height, context.measureText(label).width + height / 2);
  const [left, top] = [piece.left + edge, piece.top + edge];
  context.fillStyle = colours.fill;
  context.fillRect(left, top, width, height);
  context.fillStyle = colours.ink;
  context.textAlign = "center";
  context.textBaseline = "middle";
  context.fillText(label, left + width / 2, top + height / 2 + 1);
  context.textAlign = "start";
}
