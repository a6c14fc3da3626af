/** The jump of a seam on a slip of paper beside it. */
import type { Palette } from "../palette";
import type { Paint } from "../sketch";

export function paintJump(lines: readonly string[], jumps: boolean, palette: Palette): Paint {
  return (context, { width, height }) => {
    context.beginPath();
    context.roundRect(0.5, 0.5, width - 1, height - 1, 3);
    context.fillStyle = palette.sheet;
    context.fill();
    context.strokeStyle = jumps ? palette.graphite : palette.rule;
    context.lineWidth = 1;
    context.stroke();
    context.font = `${jumps ? 600 : 500} 14px ${palette.measure}`;
    context.textAlign = "center";
    context.textBaseline = "middle";
    context.fillStyle = jumps ? palette.graphite : palette.pencil;
    lines.forEach((line, index) => {
      context.fillText(line, width / 2, (height * (index + 0.5)) / lines.length + 1, width - 8);
    });
    context.textAlign = "start";
  };
}
