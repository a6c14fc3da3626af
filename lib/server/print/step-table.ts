/** One row a step, each with a box to tick. Rows never break over pages; every page that carries rows says again what the columns are. */
import "server-only";
import { type LengthStyle, printedLength } from "@/lib/layout";
import type { OrderStep } from "@/lib/schemas/order-steps";
import { type Gives, type StepWords, stepWords } from "@/lib/words/order-step";
import { drawTickBox, drawTickedBox, drawWarning } from "./marks";
import { breathe, makeRoom, type Sheet } from "./sheet";
import { black, grey, hairline, heightOfText, putText, widthOfText } from "./typeface";

const titleStyle = { face: "strong", size: 10.5 } as const;
const restStyle = { face: "words", size: 10.5 } as const;
const noteStyle = { face: "words", size: 8.8, color: grey } as const;
const cautionStyle = { face: "words", size: 8.8 } as const;
const settingStyle = { face: "title", size: 19 } as const;
const fromStyle = { face: "words", size: 9.5 } as const;
const sizeStyle = { face: "measure", size: 11 } as const;
const labelStyle = { face: "title", size: 11.5 } as const;
const numberStyle = { face: "title", size: 12 } as const;
const headStyle = { face: "measure", size: 9.5, color: grey } as const;

const padding = 5.5;
const givesHeight = 17.5;
const tickSide = 15;
const headHeight = 17;
/** Some 10 ms of work. */
const rowsAtATime = 8;

interface Columns {
  readonly number: number;
  readonly what: number;
  readonly whatWidth: number;
  readonly from: number;
  readonly fromWidth: number;
  readonly setting: number;
  readonly settingWidth: number;
  readonly gives: number;
  readonly givesWidth: number;
  readonly done: number;
}

function columnsOf({ left, width }: Sheet): Columns {
  const right = left + width;
  const done = right - tickSide;
  const gives = done - 10 - 122;
  const setting = gives - 74;
  const from = setting - 66;
  return {
    number: left,
    what: left + 26,
    whatWidth: from - left - 34,
    from,
    fromWidth: 60,
    setting,
    settingWidth: 72,
    gives,
    givesWidth: 122,
    done,
  };
}

/** Height of the head and the first row, so that a board's drawing is not parted from its steps. */
export function tableStartHeight(sheet: Sheet, steps: readonly OrderStep[], style: LengthStyle): number {
  const [first] = steps;
  return headHeight + (first ? rowHeight(sheet, columnsOf(sheet), stepWords(first, style)) : 0);
}

/** `done`: ids of the steps that were done before the revision was issued; their boxes are ticked. */
export async function drawStepTable(
  sheet: Sheet,
  steps: readonly OrderStep[],
  style: LengthStyle,
  done: ReadonlySet<string>,
): Promise<void> {
  const columns = columnsOf(sheet);
  const headed = sheet.headPage;
  drawTableHead(sheet, columns, style);
  // From here on every new page begins with the head of the table.
  sheet.headPage = () => {
    headed();
    drawTableHead(sheet, columns, style);
  };
  for (const [i, step] of steps.entries()) {
    const words = stepWords(step, style, steps[i - 1]);
    const height = rowHeight(sheet, columns, words);
    makeRoom(sheet, height);
    drawRow(sheet, columns, { number: step.number, done: done.has(step.id) }, words, height, style);
    sheet.y += height;
    if (i % rowsAtATime === rowsAtATime - 1) await breathe();
  }
  sheet.headPage = headed;
}

function drawTableHead(sheet: Sheet, columns: Columns, style: LengthStyle): void {
  const { doc, left, width, y } = sheet;
  const unit = style.unit === "mm" ? "mm" : "in";
  const heads: [string, number, number][] = [
    ["do this", columns.what, columns.whatWidth],
    ["from", columns.from, columns.fromWidth],
    [`setting, ${unit}`, columns.setting, columns.settingWidth],
    ["gives", columns.gives, columns.givesWidth],
  ];
  for (const [text, x, room] of heads) putText(doc, text, headStyle, { x, y, width: room });
  putText(doc, "done", headStyle, { x: columns.done - 15, y, width: tickSide + 15, align: "right" });
  sheet.y = y + headHeight - 3;
  doc
    .lineWidth(1)
    .moveTo(left, sheet.y)
    .lineTo(left + width, sheet.y)
    .stroke(black);
  sheet.y += 1;
}

function rowHeight({ doc }: Sheet, columns: Columns, words: StepWords): number {
  const what = whatHeight(doc, columns, words);
  const from = words.from === null ? 0 : heightOfText(doc, words.from, fromStyle, { width: columns.fromWidth });
  const setting = words.setting === null ? 0 : heightOfText(doc, "0", settingStyle, { width: columns.settingWidth });
  const gives = givesLines(words).length * givesHeight;
  return Math.max(what, from, setting, gives, tickSide) + 2 * padding;
}

/** Waste is named only where nothing else comes of a step: it gets no label and wants no place on the paper. */
function givesLines({ gives }: StepWords): readonly Gives[] {
  const wanted = gives.filter(({ label, size }) => label !== null || size !== null);
  return wanted.length > 0 ? wanted : gives.slice(0, 1);
}

/** The verb in bold stands before the first line of the rest. */
function titleHeight(doc: PDFKit.PDFDocument, { whatWidth: width }: Columns, { verb, rest }: StepWords): number {
  return heightOfText(doc, rest, restStyle, { width, indent: widthOfText(doc, `${verb} `, titleStyle) });
}

function whatHeight(doc: PDFKit.PDFDocument, columns: Columns, words: StepWords): number {
  const notes =
    words.notes.length === 0 ? 0 : heightOfText(doc, words.notes.join("; "), noteStyle, { width: columns.whatWidth }) + 2;
  const cautions = words.cautions.reduce((sum, caution) => sum + cautionHeight(doc, columns, caution), 0);
  return titleHeight(doc, columns, words) + notes + cautions;
}

const cautionIndent = 12;
const cautionHeight = (doc: PDFKit.PDFDocument, columns: Columns, caution: string) =>
  heightOfText(doc, caution, cautionStyle, { width: columns.whatWidth - cautionIndent }) + 2;

function drawRow(
  sheet: Sheet,
  columns: Columns,
  { number, done }: { readonly number: number; readonly done: boolean },
  words: StepWords,
  height: number,
  style: LengthStyle,
): void {
  const { doc, left, width, y } = sheet;
  const middle = y + height / 2;
  putText(doc, String(number), numberStyle, { x: columns.number, y: middle - 7, width: 22, align: "center" });
  drawWhat(doc, columns, words, y + (height - whatHeight(doc, columns, words)) / 2);
  if (words.from !== null) {
    const tall = heightOfText(doc, words.from, fromStyle, { width: columns.fromWidth });
    putText(doc, words.from, fromStyle, { x: columns.from, y: middle - tall / 2, width: columns.fromWidth });
  }
  if (words.setting !== null) {
    const figure = printedLength(words.setting, style).figure;
    putText(doc, figure, settingStyle, { x: columns.setting, y: middle - 11.5, width: columns.settingWidth });
  }
  const lines = givesLines(words);
  for (const [i, gives] of lines.entries()) drawGives(doc, columns, gives, middle + (i - lines.length / 2) * givesHeight);
  (done ? drawTickedBox : drawTickBox)(doc, columns.done, middle - tickSide / 2, tickSide);
  doc
    .lineWidth(0.5)
    .moveTo(left, y + height)
    .lineTo(left + width, y + height)
    .stroke(hairline);
}

function drawWhat(doc: PDFKit.PDFDocument, columns: Columns, words: StepWords, top: number): void {
  const { what: x, whatWidth: width } = columns;
  putText(doc, words.verb, titleStyle, { x, y: top, width });
  const indent = widthOfText(doc, `${words.verb} `, titleStyle);
  let y = top + putText(doc, words.rest, restStyle, { x, y: top, width, indent });
  if (words.notes.length > 0) y += putText(doc, words.notes.join("; "), noteStyle, { x, y: y + 1, width }) + 2;
  for (const caution of words.cautions) {
    drawWarning(doc, x, y + 2, 7.5);
    putText(doc, caution, cautionStyle, { x: x + cautionIndent, y: y + 1, width: width - cautionIndent });
    y += cautionHeight(doc, columns, caution);
  }
}

function drawGives(doc: PDFKit.PDFDocument, { gives: left, givesWidth }: Columns, gives: Gives, top: number): void {
  let x = left;
  if (gives.word !== "") {
    const style = { ...fromStyle, color: gives.label === null && gives.size === null ? grey : black };
    putText(doc, gives.word, style, { x, y: top + 3, width: givesWidth });
    x += widthOfText(doc, gives.word, style) + 5;
  }
  if (gives.label !== null) {
    const wide = Math.max(15, widthOfText(doc, gives.label, labelStyle) + 7);
    doc
      .lineWidth(0.9)
      .rect(x, top + 1.5, wide, 15)
      .stroke(black);
    putText(doc, gives.label, labelStyle, { x, y: top + 2.2, width: wide, align: "center" });
    x += wide + 5;
  }
  if (gives.size !== null)
    putText(doc, gives.size, sizeStyle, { x, y: top + 2.6, width: left + givesWidth - x + 8, oneLine: true });
}
