/** Paints what other faces take of a board: quiet pencil outlines with label and face, paled where the wood is given away. Origin: the board's corner. */
import type { SpokenForPiece } from "@/lib/schemas/spoken-for";
import type { Palette } from "../palette";
import type { Box, Paint } from "../sketch";

const LETTERS_PX = 13;
const LINE_PX = 18;
/** Kept between the words and the outline. */
const AROUND_PX = 4;

export function paintSpokenFor(woods: readonly SpokenForPiece[], pxPerMm: number, palette: Palette): Paint {
  const px = (length: number) => (length / 1000) * pxPerMm;
  return (context) => {
    for (const { rect, label, faceTitle, issued } of woods) {
      const box = { left: px(rect.x), top: px(rect.y), width: px(rect.width), height: px(rect.height) };
      if (issued) {
        context.fillStyle = "rgb(238 240 238 / 0.45)";
        context.fillRect(box.left, box.top, box.width, box.height);
      }
      outline(context, box, palette);
      name(context, box, [`${label}, ${faceTitle}`, label], palette);
    }
  };
}

function outline(context: CanvasRenderingContext2D, { left, top, width, height }: Box, palette: Palette): void {
  context.setLineDash([5, 4]);
  context.strokeStyle = palette.white;
  context.lineWidth = 3;
  context.strokeRect(left, top, width, height);
  context.strokeStyle = palette.graphite;
  context.lineWidth = 1;
  context.strokeRect(left, top, width, height);
  context.setLineDash([]);
}

/** The longest of the names that the outline has room for, at the bottom left: own labels stand at the top. */
function name(context: CanvasRenderingContext2D, box: Box, names: readonly string[], palette: Palette): void {
  if (box.height < LINE_PX + 2) return;
  context.font = `500 ${LETTERS_PX}px ${palette.measure}`;
  const fitting = names.find((text) => context.measureText(text).width + 4 * AROUND_PX <= box.width);
  if (fitting === undefined) return;
  const [left, bottom] = [box.left + AROUND_PX, box.top + box.height - Math.min(AROUND_PX, (box.height - LINE_PX) / 2)];
  context.fillStyle = palette.sheet;
  context.fillRect(left, bottom - LINE_PX, context.measureText(fitting).width + 2 * AROUND_PX, LINE_PX);
  context.fillStyle = palette.pencil;
  context.textBaseline = "middle";
  context.fillText(fitting, left + AROUND_PX, bottom - LINE_PX / 2 + 1);
}
