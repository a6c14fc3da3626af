/** A piece on the stock side: its outline, its label, its part of the triangle, and whether it is chosen or in trouble. */
import type { Palette } from "../palette";
import type { Paint } from "../sketch";
import { chip } from "./chip";
import { hatch } from "./hatch";

/** Lines in px from the corner of the piece. */
export interface LinePx {
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
}

export interface PieceLook {
  readonly label: string;
  readonly chosen: boolean;
  readonly trouble: boolean;
  readonly triangle: readonly LinePx[];
}

export function paintPiece({ label, chosen, trouble, triangle }: PieceLook, palette: Palette): Paint {
  return (context, box) => {
    const { width, height } = box;
    if (chosen) {
      context.fillStyle = "rgb(29 79 145 / 0.16)";
      context.fillRect(0, 0, width, height);
    }
    if (trouble) {
      context.save();
      context.beginPath();
      context.rect(0, 0, width, height);
      context.clip();
      context.globalAlpha = 0.7;
      hatch(context, { left: 0, top: 0, width, height }, palette.crayon, 12);
      context.restore();
    }
    // White below, so that the line stands out from dark and light wood alike.
    context.strokeStyle = palette.white;
    context.lineWidth = chosen ? 5 : 3;
    context.strokeRect(0, 0, width, height);
    context.strokeStyle = trouble ? palette.crayon : palette.chalk;
    context.lineWidth = chosen ? 3 : 1.5;
    context.strokeRect(0, 0, width, height);
    chalkLines(context, triangle, [7, 5], palette);
    chip(
      context,
      { left: 0, top: 0, width, height },
      label,
      { fill: trouble ? palette.crayon : palette.chalk, ink: palette.white },
      palette,
    );
  };
}

/** White chalk with a dark rim, which shows on every wood. */
export function chalkLines(
  context: CanvasRenderingContext2D,
  lines: readonly LinePx[],
  dash: readonly number[],
  palette: Palette,
): void {
  context.beginPath();
  for (const { x1, y1, x2, y2 } of lines) {
    context.moveTo(x1, y1);
    context.lineTo(x2, y2);
  }
  context.setLineDash([...dash]);
  context.lineCap = "round";
  context.strokeStyle = "rgb(20 24 26 / 0.55)";
  context.lineWidth = 4;
  context.stroke();
  context.strokeStyle = palette.white;
  context.lineWidth = 2;
  context.stroke();
  context.setLineDash([]);
}
