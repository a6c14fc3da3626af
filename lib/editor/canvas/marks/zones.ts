/** Paints what of a board is not to be used: beyond the traced outline, and the keep-clear areas in crayon. Origin: the board's corner. */
import type { BoardFace, KeepClear } from "@/lib/layout";
import type { Palette } from "../palette";
import type { Paint } from "../sketch";
import { hatch } from "./hatch";

export function paintZones(board: BoardFace, pxPerMm: number, palette: Palette): Paint {
  const px = (length: number) => (length / 1000) * pxPerMm;
  return (context, { width, height }) => {
    if (board.outline) {
      context.save();
      context.beginPath();
      context.rect(0, 0, width, height);
      trace(context, board.outline, px);
      context.clip("evenodd");
      context.fillStyle = "rgb(238 240 238 / 0.55)";
      context.fillRect(0, 0, width, height);
      context.restore();
      context.beginPath();
      trace(context, board.outline, px);
      context.setLineDash([6, 4]);
      doubleStroke(context, palette.white, palette.graphite);
      context.setLineDash([]);
    }
    for (const area of board.keepClear) paintArea(context, area, px, palette);
  };
}

function paintArea(
  context: CanvasRenderingContext2D,
  { area, kind }: KeepClear,
  px: (length: number) => number,
  palette: Palette,
) {
  const path = new Path2D();
  if (area.shape === "ellipse") {
    const { centre, radiusX, radiusY, turnDeg } = area;
    path.ellipse(px(centre.x), px(centre.y), px(radiusX), px(radiusY), (turnDeg * Math.PI) / 180, 0, 2 * Math.PI);
  } else {
    area.points.forEach(({ x, y }, index) => {
      if (index === 0) path.moveTo(px(x), px(y));
      else path.lineTo(px(x), px(y));
    });
    path.closePath();
  }
  const box = boxOf(area, px);
  context.save();
  context.clip(path);
  context.fillStyle = "rgb(247 230 227 / 0.45)";
  context.fillRect(box.left, box.top, box.width, box.height);
  hatch(context, box, palette.crayon, 6);
  context.restore();
  context.lineWidth = 4;
  context.strokeStyle = palette.white;
  context.stroke(path);
  context.lineWidth = 2;
  context.strokeStyle = palette.crayon;
  context.stroke(path);
  context.font = `600 13px ${palette.measure}`;
  const width = context.measureText(kind).width + 8;
  const middle = box.left + box.width / 2;
  // The word stands in the area where that leaves enough of the hatching to see, else under it.
  const inside = box.width > 2 * width && box.height > 44;
  const top = inside ? box.top + box.height / 2 - 9 : box.top + box.height + 3;
  context.fillStyle = palette.sheet;
  context.fillRect(middle - width / 2, top, width, 18);
  context.fillStyle = palette.crayon;
  context.textAlign = "center";
  context.textBaseline = "middle";
  context.fillText(kind, middle, top + 10);
  context.textAlign = "start";
}

function boxOf(area: KeepClear["area"], px: (length: number) => number) {
  if (area.shape === "ellipse") {
    const reach = Math.max(area.radiusX, area.radiusY);
    return { left: px(area.centre.x - reach), top: px(area.centre.y - reach), width: px(2 * reach), height: px(2 * reach) };
  }
  const xs = area.points.map(({ x }) => px(x));
  const ys = area.points.map(({ y }) => px(y));
  const [left, top] = [Math.min(...xs), Math.min(...ys)];
  return { left, top, width: Math.max(...xs) - left, height: Math.max(...ys) - top };
}

function trace(context: CanvasRenderingContext2D, points: NonNullable<BoardFace["outline"]>, px: (length: number) => number) {
  points.forEach(({ x, y }, index) => {
    if (index === 0) context.moveTo(px(x), px(y));
    else context.lineTo(px(x), px(y));
  });
  context.closePath();
}

function doubleStroke(context: CanvasRenderingContext2D, under: string, over: string) {
  context.strokeStyle = under;
  context.lineWidth = 3;
  context.stroke();
  context.strokeStyle = over;
  context.lineWidth = 1;
  context.stroke();
}
