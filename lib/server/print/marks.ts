/** Small signs drawn as shapes, because the fonts do not have them, and lines that show on light and on dark wood. */
import "server-only";
import { black } from "./typeface";

export interface PagePoint {
  readonly x: number;
  readonly y: number;
}

/** A box to tick. */
export function drawTickBox(doc: PDFKit.PDFDocument, x: number, y: number, side: number): void {
  doc.lineWidth(1.3).rect(x, y, side, side).stroke(black);
}

/** The same, ticked before it was printed. */
export function drawTickedBox(doc: PDFKit.PDFDocument, x: number, y: number, side: number): void {
  drawTickBox(doc, x, y, side);
  doc
    .lineWidth(1.8)
    .lineJoin("round")
    .moveTo(x + side * 0.2, y + side * 0.55)
    .lineTo(x + side * 0.42, y + side * 0.78)
    .lineTo(x + side * 0.82, y + side * 0.22)
    .stroke(black);
}

/** A warning triangle, as wide as high. */
export function drawWarning(doc: PDFKit.PDFDocument, x: number, y: number, side: number): void {
  doc
    .lineWidth(0.8)
    .lineJoin("round")
    .polygon([x + side / 2, y], [x + side, y + side], [x, y + side])
    .stroke(black);
  doc.rect(x + side / 2 - 0.5, y + side * 0.38, 1, side * 0.32).fill(black);
  doc.rect(x + side / 2 - 0.5, y + side * 0.78, 1, 1).fill(black);
}

/** A dark line between two light ones: seen on any wood and on a bad copy. */
export function drawCasedLine(doc: PDFKit.PDFDocument, from: PagePoint, to: PagePoint, width: number, dash?: number): void {
  doc.lineCap("butt").undash();
  doc
    .lineWidth(width + 1.6)
    .moveTo(from.x, from.y)
    .lineTo(to.x, to.y)
    .stroke("#ffffff");
  if (dash !== undefined) doc.dash(dash, { space: dash * 0.7 });
  doc.lineWidth(width).moveTo(from.x, from.y).lineTo(to.x, to.y).stroke(black);
  doc.undash();
}
