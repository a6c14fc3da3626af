/** A label in a small box, as it is written on the wood. */
import type { Palette } from "../palette";

export const CHIP_HEIGHT = 20;

export function chip(
  context: CanvasRenderingContext2D,
  at: { readonly x: number; readonly y: number },
  text: string,
  colours: { readonly fill: string; readonly ink: string },
  palette: Palette,
): void {
  context.font = `700 15px ${palette.measure}`;
  const width = Math.max(CHIP_HEIGHT, context.measureText(text).width + 10);
  context.fillStyle = colours.fill;
  context.fillRect(at.x, at.y, width, CHIP_HEIGHT);
  context.fillStyle = colours.ink;
  context.textAlign = "center";
  context.textBaseline = "middle";
  context.fillText(text, at.x + width / 2, at.y + CHIP_HEIGHT / 2 + 1);
  context.textAlign = "start";
}
