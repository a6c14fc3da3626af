/** Label sheets: one label for every strip, front and offcut of an order, true to the sheet it is printed on. */
import "server-only";
import { styleOf } from "@/lib/words/order-step";
import { sizeFigures } from "@/lib/words/part-name";
import { revisionLetter } from "@/lib/words/revision-letter";
import { type LabelSheetName, labelPlace, labelSheets } from "./label-sheet";
import { type OrderLabel, orderLabels } from "./order-labels";
import { type PrintOrder, supersededAt } from "./print-order";
import { closeDocument, openDocument } from "./sheet";
import { black, grey, heightOfText, putText, widthOfText } from "./typeface";

type Order = PrintOrder["order"];

interface Room {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** `start`: the first free position of a sheet that was used before, from 1. */
export async function labelsPdf(order: Order, sheetName: LabelSheetName, start: number): Promise<Uint8Array> {
  const sheet = labelSheets[sheetName];
  const [width, height] = sheet.size;
  const doc = openDocument([width, height], {
    title: `Labels of cut order ${order.number} ${revisionLetter(order.revision)}`,
    author: order.snapshot.shop.name,
    at: new Date(order.issuedAt),
  });
  for (const [index, label] of orderLabels(order.snapshot).entries()) {
    const place = labelPlace(sheet, start, index);
    while (doc.bufferedPageRange().count <= place.sheet) doc.addPage();
    drawLabel(doc, order, label, {
      x: place.x + sheet.inset.x,
      y: place.y + sheet.inset.y,
      width: sheet.label.width - 2 * sheet.inset.x,
      height: sheet.label.height - 2 * sheet.inset.y,
    });
  }
  return closeDocument(doc);
}

const drawingWidth = 52;
const kindWords: Readonly<Record<OrderLabel["kind"], string>> = { front: "front", strip: "strip", offcut: "offcut" };

function drawLabel(doc: PDFKit.PDFDocument, order: Order, label: OrderLabel, room: Room): void {
  const { snapshot } = order;
  const style = { face: "title", size: room.height * 0.62 } as const;
  const fits = Math.min(1, 66 / widthOfText(doc, label.label, style));
  const big = { ...style, size: style.size * fits };
  const bigWidth = widthOfText(doc, label.label, big);
  putText(doc, label.label, big, { x: room.x, y: room.y, width: bigWidth + 2 });

  const left = room.x + Math.max(bigWidth, 26) + 8;
  const right = room.x + room.width - (label.front ? drawingWidth + 6 : 0);
  const text = { x: left, width: right - left, oneLine: true };
  // Three lines, level with the middle of the number.
  const top = room.y + Math.max(0, (heightOfText(doc, label.label, big, { width: room.width, oneLine: true }) - 34) / 2);
  const size = `${sizeFigures(label.size, styleOf(snapshot))}${snapshot.units === "mm" ? "" : " in"}`;
  putText(doc, size, { face: "measure", size: 10.5 }, { ...text, y: top });
  putText(doc, `${kindWords[label.kind]}, board ${label.board.tag}`, { face: "words", size: 7.5 }, { ...text, y: top + 14 });
  const superseded = supersededAt(order) === null ? "" : ", SUPERSEDED";
  const orderText = `Order ${order.number} ${revisionLetter(order.revision)}${superseded}`;
  putText(doc, orderText, { face: "strong", size: 7.5 }, { ...text, y: top + 24.5 });
  const below = { x: room.x, width: right - room.x, oneLine: true, y: room.y + room.height - 9 };
  putText(doc, snapshot.job.title, { face: "words", size: 7, color: grey }, below);
  if (label.front) drawFront(doc, label.front, { ...room, x: room.x + room.width - drawingWidth, width: drawingWidth });
}

/** The front as it will be seen, with its part of the triangle: set it down so, and the set goes together one way only. */
function drawFront(doc: PDFKit.PDFDocument, { rect, segments }: NonNullable<OrderLabel["front"]>, room: Room): void {
  const caption = 9;
  const scale = Math.min(room.width / rect.width, (room.height - caption - 6) / rect.height);
  const [width, height] = [rect.width * scale, rect.height * scale];
  const corner = { x: room.x + (room.width - width) / 2, y: room.y + 5 };
  const at = (point: { x: number; y: number }) => ({
    x: corner.x + (point.x - rect.x) * scale,
    y: corner.y + (point.y - rect.y) * scale,
  });
  const middle = corner.x + width / 2;
  doc.polygon([middle, room.y], [middle + 3, room.y + 3.6], [middle - 3, room.y + 3.6]).fill(black);
  doc.lineWidth(0.9).rect(corner.x, corner.y, width, height).stroke(black);
  doc.lineWidth(1.1);
  for (const segment of segments) {
    const [from, to] = [at(segment.from), at(segment.to)];
    doc.moveTo(from.x, from.y).lineTo(to.x, to.y).stroke(black);
  }
  const style = { face: "words", size: 6.5, color: grey } as const;
  putText(doc, "show side, top up", style, {
    x: room.x - 6,
    y: room.y + room.height - 8.5,
    width: room.width + 6,
    align: "right",
    oneLine: true,
  });
}
