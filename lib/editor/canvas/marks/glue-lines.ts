/** Where the wood is glued together: thin dots on a darker line, quiet beside the pieces and their cuts. */
import type { Um } from "@/lib/layout";
import type { Palette } from "../palette";
import type { Paint } from "../sketch";

/** Along a whole board; `pxPerMm`: of the screen. */
export function paintGlueLines(glueLines: readonly Um[], pxPerMm: number, palette: Palette): Paint {
  return (context, { width }) => {
    for (const across of glueLines)
      glueLine(context, { x1: 0, x2: width, y1: y(across, pxPerMm), y2: y(across, pxPerMm) }, palette);
  };
}

const y = (across: Um, pxPerMm: number) => (across / 1000) * pxPerMm;

interface LinePx {
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
}

export function glueLine(context: CanvasRenderingContext2D, { x1, y1, x2, y2 }: LinePx, palette: Palette): void {
  context.save();
  context.beginPath();
  context.moveTo(x1, y1);
  context.lineTo(x2, y2);
  context.globalAlpha = 0.45;
  context.strokeStyle = palette.graphite;
  context.lineWidth = 3;
  context.stroke();
  context.globalAlpha = 0.9;
  context.strokeStyle = palette.white;
  context.lineWidth = 1.2;
  context.setLineDash([2, 5]);
  context.stroke();
  context.restore();
}
