/** What stands on every page: running head, foot, and the band of a superseded revision. */
import "server-only";
import { revisionLetter } from "@/lib/words/revision-letter";
import { margins } from "./paper";
import { type PrintOrder, printDate, printMoment, supersededAt } from "./print-order";
import { drawQrCode, qrCode } from "./qr-code";
import type { Sheet } from "./sheet";
import { black, grey, hairline, putText } from "./typeface";

const qrSide = 54;
/** For revision and page number, left of the code. */
const factsWidth = 150;

/** The head of the first page. */
export function drawHeading(sheet: Sheet, { order, benchUrl, timeZone }: PrintOrder): void {
  const { doc, left, width } = sheet;
  const top = sheet.y;
  drawQrCode(doc, qrCode(benchUrl), left + width - qrSide, top, qrSide);
  const facts = { x: left + width - qrSide - 14 - factsWidth, width: factsWidth, align: "right" as const };
  putText(doc, `Revision ${revisionLetter(order.revision)}`, { face: "strong", size: 12 }, { ...facts, y: top + 2 });
  const issued = `issued ${printDate(order.issuedAt, timeZone)} by ${order.issuedBy}`;
  putText(doc, issued, { face: "words", size: 9.5 }, { ...facts, y: top + 32 });

  const title = { x: left, width: width - qrSide - factsWidth - 28 };
  let y = top - 4;
  y += putText(doc, `Cut order ${order.number}`, { face: "title", size: 28 }, { ...title, y });
  y += putText(doc, order.snapshot.job.title, { face: "strong", size: 11 }, { ...title, y: y + 1 }) + 1;
  y += putText(doc, facesAndClient(order), { face: "words", size: 10 }, { ...title, y });
  sheet.y = Math.max(y, top + qrSide) + 8;
  doc
    .lineWidth(1.6)
    .moveTo(left, sheet.y)
    .lineTo(left + width, sheet.y)
    .stroke(black);
  sheet.y += 10;
}

function facesAndClient({ snapshot }: PrintOrder["order"]): string {
  const faces = snapshot.faces.map(({ title }) => title).join(", ");
  return snapshot.job.client === "" ? faces : `${faces}, for ${snapshot.job.client}`;
}

/** The head of every other page; the page numbers come last, when it is known how many there are. */
export function drawRunningHead(sheet: Sheet, { order }: PrintOrder): void {
  const { doc, left, width } = sheet;
  const letter = revisionLetter(order.revision);
  const text = `Cut order ${order.number} ${letter}, ${order.snapshot.job.title}`;
  putText(doc, text, { face: "measure", size: 12 }, { x: left, y: sheet.y, width: width - 90, oneLine: true });
  sheet.y += 18;
  doc
    .lineWidth(0.8)
    .moveTo(left, sheet.y)
    .lineTo(left + width, sheet.y)
    .stroke(black);
  sheet.y += 8;
}

/** Foot, page numbers and band on all pages; call it last. */
export function drawFrames(sheet: Sheet, print: PrintOrder): void {
  const { doc } = sheet;
  const { start, count } = doc.bufferedPageRange();
  for (let page = 0; page < count; page += 1) {
    doc.switchToPage(start + page);
    drawPageNumber(sheet, page + 1, count);
    drawFoot(sheet, print);
    drawBand(sheet, print);
  }
}

function drawPageNumber({ doc, left, width }: Sheet, page: number, count: number): void {
  // On the first page under the revision, elsewhere in the running head.
  const box =
    page === 1
      ? { x: left + width - qrSide - 14 - factsWidth, y: margins.top + 18, width: factsWidth }
      : { x: left + width - 90, y: margins.top, width: 90 };
  putText(doc, `page ${page} of ${count}`, { face: "words", size: 9.5 }, { ...box, align: "right" });
}

function drawFoot({ doc, left, width, bottom }: Sheet, { order }: PrintOrder): void {
  const y = bottom + 14;
  doc
    .lineWidth(0.6)
    .moveTo(left, y)
    .lineTo(left + width, y)
    .stroke(hairline);
  const style = { face: "words", size: 8, color: grey } as const;
  putText(doc, order.snapshot.shop.name, style, { x: left, y: y + 5, width: width * 0.34, oneLine: true });
  const layouts = order.snapshot.faces.map(({ title, layoutRevision }) => `layout ${layoutRevision} of ${title}`).join(", ");
  const text = `Order ${order.number} ${revisionLetter(order.revision)}, ${layouts}`;
  const right = { x: left + width * 0.36, width: width * 0.64, align: "right" as const };
  putText(doc, text, style, { ...right, y: y + 5, oneLine: true });
  putText(doc, `fingerprint ${shortFingerprint(order.fingerprint)}`, style, { ...right, y: y + 16 });
}

/** Twelve of its 64 figures, in fours: enough to tell two papers apart by eye. */
function shortFingerprint(fingerprint: string): string {
  return fingerprint.slice(0, 12).replace(/(.{4})(?=.)/g, "$1 ");
}

function drawBand(sheet: Sheet, print: PrintOrder): void {
  const at = supersededAt(print.order);
  if (at === null) return;
  const { doc, left, width } = sheet;
  doc.rect(left, 14, width, 20).fill(black);
  const text = `SUPERSEDED ${printMoment(at, print.timeZone)}. Do not cut from this sheet: get the newest revision.`;
  putText(doc, text, { face: "title", size: 12.5, color: "#ffffff" }, { x: left + 8, y: 16.5, width: width - 16, oneLine: true });
  doc.save().rotate(-38, { origin: [left + width / 2, doc.page.height / 2] });
  doc.fillOpacity(0.13);
  putText(
    doc,
    "SUPERSEDED",
    { face: "title", size: 112 },
    { x: left - 60, y: doc.page.height / 2 - 60, width: width + 120, align: "center" },
  );
  doc.restore();
  doc.fillOpacity(1);
}
