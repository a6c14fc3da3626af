/** Slanting lines over a box, under whatever clip is set: what stops you is never told by colour alone. */
import type { Box } from "../sketch";

export function hatch(context: CanvasRenderingContext2D, box: Box, colour: string, apart: number): void {
  const { left, top, width, height } = box;
  context.beginPath();
  for (let x = left - height; x < left + width; x += apart) {
    context.moveTo(x, top + height);
    context.lineTo(x + height, top);
  }
  context.strokeStyle = colour;
  context.lineWidth = 1.5;
  context.stroke();
}
