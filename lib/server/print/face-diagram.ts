/** The face as it will stand, with the carpenter's triangle across its fronts. */
import "server-only";
import { carpentersTriangle, type FaceLayout, facePieces, faceSize } from "@/lib/layout";
import { black, putText } from "./typeface";

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Largest that fits the box, centred in it across and at its top; answers the height used. */
export function drawFace(doc: PDFKit.PDFDocument, layout: FaceLayout, box: Box): number {
  const size = faceSize(layout.face);
  const scale = Math.min(box.width / size.width, box.height / size.height);
  const left = box.x + box.width - size.width * scale;
  const at = (point: { x: number; y: number }) => ({ x: left + point.x * scale, y: box.y + point.y * scale });
  for (const { label, rect } of facePieces(layout)) {
    const corner = at(rect);
    const [width, height] = [rect.width * scale, rect.height * scale];
    doc.lineWidth(0.9).rect(corner.x, corner.y, width, height).stroke(black);
    const figure = Math.min(12, height * 0.6, width * 0.7);
    if (figure >= 4)
      putText(doc, label, { face: "title", size: figure }, { x: corner.x + 2.5, y: corner.y + 1, width, oneLine: true });
  }
  doc.lineWidth(1.1).dash(3.2, { space: 2 });
  for (const { segments } of carpentersTriangle(layout)) {
    for (const segment of segments) {
      const [from, to] = [at(segment.from), at(segment.to)];
      doc.moveTo(from.x, from.y).lineTo(to.x, to.y).stroke(black);
    }
  }
  doc.undash();
  return size.height * scale;
}
