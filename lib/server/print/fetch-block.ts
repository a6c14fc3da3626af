/** What to bring and to do before the first cut, beside the drawing of the face. */
import "server-only";
import { type LengthStyle, printedLength } from "@/lib/layout";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";
import { testCuts } from "@/lib/schemas/order-steps";
import { firstOfAll } from "@/lib/words/caution";
import { markNote, markNoteOf, styleOf } from "@/lib/words/order-step";
import { sizeFigures } from "@/lib/words/part-name";
import { drawFace } from "./face-diagram";
import { makeRoom, type Sheet } from "./sheet";
import { grey, heightOfText, putText } from "./typeface";

const labelWidth = 62;
const drawing = { width: 176, height: 92, gap: 18 } as const;
const labelStyle = { face: "words", size: 9.5, color: grey } as const;
const sentence = { face: "strong", size: 9.5 } as const;
const measures = { face: "measure", size: 11.5 } as const;

interface Row {
  readonly label: string;
  readonly value: string;
  readonly style: typeof sentence | typeof measures;
}

export function drawFetchBlock(sheet: Sheet, snapshot: OrderSnapshot): void {
  const { doc, left, width } = sheet;
  const firstPage = doc.bufferedPageRange().count;
  let drawn = sheet.y;
  for (const { layout } of snapshot.faces) {
    drawn +=
      drawFace(doc, layout, { x: left + width - drawing.width, y: drawn, width: drawing.width, height: drawing.height }) + 4;
    drawn += putText(
      doc,
      "as seen from the show side",
      { ...labelStyle, size: 8 },
      { x: left + width - drawing.width, y: drawn, width: drawing.width, align: "right" },
    );
  }
  const valueWidth = width - labelWidth - drawing.width - drawing.gap;
  for (const { label, value, style } of rows(snapshot)) {
    const height = heightOfText(doc, value, style, { width: valueWidth });
    makeRoom(sheet, height);
    putText(doc, label, labelStyle, { x: left, y: sheet.y + (style === measures ? 1.5 : 0), width: labelWidth });
    putText(doc, value, style, { x: left + labelWidth, y: sheet.y, width: valueWidth });
    sheet.y += height + 4;
  }
  // Many boards may have run on to a second page; the drawing stays on the first.
  if (doc.bufferedPageRange().count === firstPage) sheet.y = Math.max(sheet.y, drawn);
  sheet.y += 6;
}

function rows(snapshot: OrderSnapshot): Row[] {
  const style = styleOf(snapshot);
  const boards = snapshot.boards.flatMap((board) =>
    board.gluing
      ? board.gluing.members.map((member) => `${fetched(member, style)}, for blank ${board.tag}`)
      : fetched(board, style),
  );
  const unit = style.unit === "mm" ? "millimetres" : "inches";
  return [
    ...boards.map((value, i) => ({ label: i === 0 ? "Fetch" : "", value, style: measures })),
    ...sawRows(snapshot),
    ...markRows(snapshot),
    { label: "Measures", value: `In ${unit}. Sizes are along the grain × across it.`, style: sentence },
    { label: "Before all", value: firstOfAll, style: sentence },
  ];
}

type Fetched = Pick<SnapshotBoard, "tag" | "species" | "length" | "width" | "thickness" | "place">;

function fetched({ tag, species, length, width, thickness, place }: Fetched, style: LengthStyle): string {
  const size = `${sizeFigures({ width: length, height: width }, style)} × ${printedLength(thickness, style).figure}`;
  return [`Board ${tag}`, species, size, place].filter((part) => part !== "").join(", ");
}

/** Once for all boards that lie face up; boards that lie back up are named. */
function markRows({ boards }: OrderSnapshot): Row[] {
  const backUp = boards.filter(({ side }) => side === "back");
  const usual = backUp.length < boards.length ? [markNote] : [];
  const turned = backUp.map((board) => `${boards.length > 1 ? `Board ${board.tag}: ` : ""}${markNoteOf(board)}`);
  return [...usual, ...turned].map((value, i) => ({ label: i === 0 ? "Mark first" : "", value, style: sentence }));
}

/** Each with a place for what the test cut shows. */
function sawRows(snapshot: OrderSnapshot): Row[] {
  const style = styleOf(snapshot);
  return testCuts(snapshot).map(({ saw, cuts }) => ({
    label: cuts.length === 2 ? "Saw" : cuts[0] === "rip" ? "Rip saw" : "Crosscuts",
    value: `${saw.name}, kerf ${printedLength(saw.kerf, style).figure}; true kerf: ____________`,
    style: measures,
  }));
}
