/** QR codes as squares to draw, on paper and on screen. */
import "server-only";
import bwipjs from "bwip-js/node";

export interface QrCode {
  /** Modules along a side, without the quiet zone of 4 modules that must stay white around it. */
  readonly size: number;
  /** Dark runs, row by row: in modules from the upper left corner. */
  readonly runs: readonly { readonly x: number; readonly y: number; readonly length: number }[];
}

/** Error correction M: sawdust and a crease cost a little, never the whole code. */
export function qrCode(text: string): QrCode {
  const [symbol] = bwipjs.raw("qrcode", text, "eclevel=M");
  if (!symbol || !("pixs" in symbol)) throw new Error("the QR code was not drawn as a matrix");
  const { pixs, pixx, pixy } = symbol;
  const rows = Array.from({ length: pixy }, (_, y) => pixs.slice(y * pixx, (y + 1) * pixx));
  return { size: pixx, runs: rows.flatMap((row, y) => runsOf(row).map((run) => ({ ...run, y }))) };
}

function runsOf(row: readonly number[]): { x: number; length: number }[] {
  const runs: { x: number; length: number }[] = [];
  row.forEach((dark, x) => {
    const last = runs.at(-1);
    if (dark === 0) return;
    if (last && last.x + last.length === x) last.length += 1;
    else runs.push({ x, length: 1 });
  });
  return runs;
}

/** Draws the code into a square of the page. */
export function drawQrCode(doc: PDFKit.PDFDocument, code: QrCode, x: number, y: number, side: number): void {
  const module = side / code.size;
  for (const run of code.runs) doc.rect(x + run.x * module, y + run.y * module, run.length * module, module);
  doc.fill("#000000");
}
