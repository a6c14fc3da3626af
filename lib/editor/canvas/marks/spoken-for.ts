/** Paints what other faces take of a board: quiet pencil outlines with their labels and the face's name, paled where the wood is given away. Origin: the board's corner. */
import type { SpokenForPiece } from "@/lib/schemas/spoken-for";
import type { Palette } from "../palette";
import type { Box, Paint } from "../sketch";

const LETTERS_PX = 13;
const LINE_PX = 18;
/** Kept between the words and the outline. */
const AROUND_PX = 4;

export function paintSpokenFor(woods: readonly SpokenForPiece[], pxPerMm: number, palette: Palette): Paint {
  const px = (length: number) => (length / 1000) * pxPerMm;
  const boxed = woods.map((wood) => {
    const { x, y, width, height } = wood.rect;
    return { wood, box: { left: px(x), top: px(y), width: px(width), height: px(height) } };
  });
  const faceIds = [...new Set(woods.map(({ faceId }) => faceId))];
  return (context) => {
    for (const { wood, box } of boxed) {
      if (wood.issued) {
        context.fillStyle = "rgb(238 240 238 / 0.45)";
        context.fillRect(box.left, box.top, box.width, box.height);
      }
      outline(context, box, palette);
      if (box.height >= LINE_PX + 2) write(context, box, wood.label, "bottom", palette);
    }
    for (const id of faceIds) {
      const ofFace = boxed.filter(({ wood }) => wood.faceId === id);
      const [first] = ofFace;
      const box = around(ofFace.map((one) => one.box));
      // Above the labels, where there is room for both.
      if (first && box.height >= 2 * LINE_PX + 3 * AROUND_PX) {
        write(context, box, `${first.wood.faceTitle}${first.wood.issued ? ", issued" : ""}`, "top", palette);
      }
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

/** In a corner of the box on its left, unless it is too narrow. */
function write(context: CanvasRenderingContext2D, box: Box, text: string, at: "top" | "bottom", palette: Palette): void {
  context.font = `500 ${LETTERS_PX}px ${palette.measure}`;
  const width = context.measureText(text).width + 2 * AROUND_PX;
  if (width + 2 * AROUND_PX > box.width) return;
  const inside = Math.min(AROUND_PX, (box.height - LINE_PX) / 2);
  const [left, top] = [box.left + AROUND_PX, at === "top" ? box.top + inside : box.top + box.height - inside - LINE_PX];
  context.fillStyle = palette.sheet;
  context.fillRect(left, top, width, LINE_PX);
  context.fillStyle = palette.pencil;
  context.textBaseline = "middle";
  context.fillText(text, left + AROUND_PX, top + LINE_PX / 2 + 1);
}

function around(boxes: readonly Box[]): Box {
  const left = Math.min(...boxes.map((box) => box.left));
  const top = Math.min(...boxes.map((box) => box.top));
  const right = Math.max(...boxes.map((box) => box.left + box.width));
  const bottom = Math.max(...boxes.map((box) => box.top + box.height));
  return { left, top, width: right - left, height: bottom - top };
}
