/** Paints the direction of the grain over a board: one quiet line a cell, longer and darker where the direction is clear. Origin: the board's corner. */
import type { GrainOnWire } from "@/lib/schemas/figure";
import type { Palette } from "../palette";
import type { Paint } from "../sketch";

/** Below this coherence a cell shows no one direction: a knot, a burr, plain wood. */
const LEAST_COHERENCE = 0.25;
/** Lines closer together than this are a grey veil, px: only every second, third, … cell is drawn then. */
const LEAST_SPACING_PX = 14;

export function paintGrain(grain: GrainOnWire, pxPerMm: number, palette: Palette): Paint {
  const cell = grain.cellMm * pxPerMm;
  const every = Math.max(1, Math.ceil(LEAST_SPACING_PX / cell));
  return (context) => {
    context.lineCap = "round";
    for (let row = Math.floor(every / 2); row < grain.rows; row += every) {
      for (let column = Math.floor(every / 2); column < grain.columns; column += every) {
        const i = row * grain.columns + column;
        const coherence = grain.coherence[i] ?? 0;
        if (coherence < LEAST_COHERENCE) continue;
        const angle = ((grain.directionDeg[i] ?? 0) * Math.PI) / 180;
        const reach = cell * every * 0.42 * (0.4 + 0.6 * coherence);
        const [x, y] = [(column + 0.5) * cell, (row + 0.5) * cell];
        const [dx, dy] = [Math.cos(angle) * reach, Math.sin(angle) * reach];
        context.beginPath();
        context.moveTo(x - dx, y - dy);
        context.lineTo(x + dx, y + dy);
        context.globalAlpha = 0.35 + 0.45 * coherence;
        context.lineWidth = 2.5;
        context.strokeStyle = palette.white;
        context.stroke();
        context.lineWidth = 1;
        context.strokeStyle = palette.graphite;
        context.stroke();
      }
    }
    context.globalAlpha = 1;
  };
}
