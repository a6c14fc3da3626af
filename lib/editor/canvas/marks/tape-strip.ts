/** The yellow tape above a board, its marks in the shop's units. */
import type { TapeMark } from "@/lib/words/tape-marks";
import type { Palette } from "../palette";
import type { Paint } from "../sketch";

const markPx: Readonly<Record<TapeMark["size"], number>> = { short: 5, middle: 9, long: 14 };
/** A figure that would hang over the end of the tape is left out. */
const FIGURE_ROOM_PX = 40;

export function paintTape(marks: readonly TapeMark[], pxPerMm: number, unit: string, palette: Palette): Paint {
  return (context, { width, height }) => {
    context.fillStyle = palette.tape;
    context.fillRect(0, 0, width, height);
    context.beginPath();
    for (const { mm, size } of marks) {
      const x = Math.floor(mm * pxPerMm) + 0.5;
      context.moveTo(x, height);
      context.lineTo(x, height - markPx[size]);
    }
    context.strokeStyle = palette.graphite;
    context.lineWidth = 1;
    context.stroke();
    context.fillStyle = palette.graphite;
    context.textBaseline = "alphabetic";
    context.font = `500 12px ${palette.measure}`;
    context.fillText(unit, 4, 13);
    context.font = `500 14px ${palette.measure}`;
    for (const { mm, figure } of marks) {
      if (figure !== "" && mm * pxPerMm + FIGURE_ROOM_PX <= width) context.fillText(figure, mm * pxPerMm + 3, 13);
    }
  };
}
