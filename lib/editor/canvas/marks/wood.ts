/** Paints wood from a photograph: a whole board on the stock side, or the part of it that a piece shows. */
import { composed, type Isometry, inverted, type Rect } from "@/lib/layout";
import type { Palette } from "../palette";
import type { PictureAtHand, WoodBitmap } from "../pictures";
import type { Paint } from "../sketch";
import { hatch } from "./hatch";

/** The whole board; `visible` is the part of the box that is on the screen, so that a deep zoom does not scale what nobody sees. */
export function paintBoard(picture: PictureAtHand, visible: { from: number; to: number }, palette: Palette): Paint {
  return (context, { width, height }) => {
    if (picture.state !== "ready") return paintMissing(context, width, height, picture.state, palette);
    const { bitmap } = picture.wood;
    const from = Math.max(0, Math.min(width, visible.from));
    const to = Math.max(from, Math.min(width, visible.to));
    if (to <= from) return;
    const perPx = bitmap.width / width;
    context.imageSmoothingQuality = "medium";
    context.drawImage(bitmap, from * perPx, 0, (to - from) * perPx, bitmap.height, from, 0, to - from, height);
  };
}

/** The wood of one piece: the photograph drawn through the way back from the stock to the face, clipped to the piece. */
export function paintPatch(
  picture: PictureAtHand,
  stockFromFace: Isometry,
  faceRect: Rect<"face">,
  stockRect: Rect<"stock">,
  pxPerUm: number,
  palette: Palette,
): Paint {
  return (context, { width, height }) => {
    if (picture.state !== "ready") return paintMissing(context, width, height, picture.state, palette);
    context.save();
    context.beginPath();
    context.rect(0, 0, width, height);
    context.clip();
    if (reachesOver(stockRect, picture.wood)) hatch(context, { left: 0, top: 0, width, height }, palette.rule, 6);
    const faceFromStock = inverted(stockFromFace);
    const boxFromFace: Isometry = { a: 1, b: 0, c: 0, d: 1, tx: -faceRect.x, ty: -faceRect.y };
    const { a, b, c, d, tx, ty } = composed(boxFromFace, faceFromStock);
    context.transform(a * pxPerUm, b * pxPerUm, c * pxPerUm, d * pxPerUm, tx * pxPerUm, ty * pxPerUm);
    drawStockRect(context, picture.wood, stockRect);
    context.restore();
  };
}

/** Whether the photograph ends before the piece does. */
function reachesOver({ x, y, width, height }: Rect<"stock">, { bitmap, perUmX, perUmY }: WoodBitmap): boolean {
  return x < 0 || y < 0 || x + width > bitmap.width / perUmX || y + height > bitmap.height / perUmY;
}

/** Draws one rectangle of the stock in a context whose unit is a µm of the stock frame. */
function drawStockRect(context: CanvasRenderingContext2D, { bitmap, perUmX, perUmY }: WoodBitmap, rect: Rect<"stock">): void {
  // One pixel more on every side keeps the smoothing at the edges from mixing in nothing.
  const left = Math.max(0, Math.floor(rect.x * perUmX) - 1);
  const top = Math.max(0, Math.floor(rect.y * perUmY) - 1);
  const right = Math.min(bitmap.width, Math.ceil((rect.x + rect.width) * perUmX) + 1);
  const bottom = Math.min(bitmap.height, Math.ceil((rect.y + rect.height) * perUmY) + 1);
  if (right <= left || bottom <= top) return;
  const [width, height] = [right - left, bottom - top];
  context.imageSmoothingQuality = "medium";
  context.drawImage(bitmap, left, top, width, height, left / perUmX, top / perUmY, width / perUmX, height / perUmY);
}

const sayings = { coming: "Picture coming", missing: "No picture", failed: "The picture could not be loaded" } as const;

function paintMissing(
  context: CanvasRenderingContext2D,
  width: number,
  height: number,
  state: keyof typeof sayings,
  palette: Palette,
): void {
  context.fillStyle = palette.rule;
  context.fillRect(0, 0, width, height);
  context.font = `500 14px ${palette.measure}`;
  context.textBaseline = "middle";
  context.fillStyle = palette.graphite;
  if (context.measureText(sayings[state]).width < width - 12) context.fillText(sayings[state], 6, height / 2);
}
