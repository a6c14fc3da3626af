/** A ruler in the shop's units under a drawing, at the drawing's scale. */
import "server-only";
import { mmFromUm, type Um } from "@/lib/layout";
import { tapeMarks } from "@/lib/words/tape-marks";
import { black, putText, widthOfText } from "./typeface";

const tickHeights = { short: 3, middle: 4.5, long: 7 } as const;
const figureStyle = { face: "measure", size: 7.5 } as const;
export const rulerHeight = 18;

/** From `x` to the right; `pointsPerWoodMm` is the scale of the drawing. */
export function drawRuler(
  doc: PDFKit.PDFDocument,
  length: Um,
  unit: "mm" | "inch",
  place: { readonly x: number; readonly y: number; readonly pointsPerWoodMm: number },
): void {
  const { x, y, pointsPerWoodMm } = place;
  const width = mmFromUm(length) * pointsPerWoodMm;
  doc
    .lineWidth(0.7)
    .moveTo(x, y)
    .lineTo(x + width, y);
  const marks = tapeMarks(length, pointsPerWoodMm, unit);
  for (const { mm, size } of marks)
    doc.moveTo(x + mm * pointsPerWoodMm, y).lineTo(x + mm * pointsPerWoodMm, y + tickHeights[size]);
  doc.stroke(black);
  const unitName = unit === "mm" ? "mm" : "in";
  putText(doc, unitName, figureStyle, { x, y: y + 8, width: 20 });
  for (const { mm, figure } of marks) {
    const half = widthOfText(doc, figure, figureStyle) / 2;
    const at = mm * pointsPerWoodMm;
    if (figure !== "" && at + half <= width)
      putText(doc, figure, figureStyle, { x: x + at - half, y: y + 8, width: half * 2 + 1 });
  }
}
