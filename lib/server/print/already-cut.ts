/** What was cut before this revision, what is in hand, and what the bench had found: before the steps, so that nobody cuts anything twice. */
import "server-only";
import type { OrderSnapshot } from "@/lib/schemas/order-snapshot";
import { alreadyCut } from "@/lib/words/already-cut";
import { styleOf } from "@/lib/words/order-step";
import { troubleSentence } from "@/lib/words/rest";
import { revisionLetter } from "@/lib/words/revision-letter";
import { makeRoom, type Sheet } from "./sheet";
import { black, grey, heightOfText, putText } from "./typeface";

const headStyle = { face: "title", size: 14 } as const;
const lineStyle = { face: "strong", size: 9.5 } as const;
const noteStyle = { face: "words", size: 9.5, color: grey } as const;
const padding = 7;

/** Nothing of an order that was issued before anything was cut. */
export function drawAlreadyCut(sheet: Sheet, snapshot: OrderSnapshot): void {
  const { rest } = snapshot;
  if (!rest) return;
  const style = styleOf(snapshot);
  const { doc, left } = sheet;
  const width = sheet.width - 2 * padding;
  const title = `Already cut by revision ${revisionLetter(rest.revision)}: do not cut it again`;
  const lines = [
    ...alreadyCut(snapshot).map((text) => ({ text, look: lineStyle })),
    ...rest.entries.map(({ words, by }) => ({ text: `${words} (${by}).`, look: noteStyle })),
    ...rest.troubles.map(({ trouble }) => ({ text: troubleSentence(trouble, style), look: noteStyle })),
  ];
  const heights = lines.map(({ text, look }) => heightOfText(doc, text, look, { width }) + 2);
  const height = 22 + heights.reduce((sum, one) => sum + one, 0) + padding;
  makeRoom(sheet, height + 8);
  doc.lineWidth(1.3).rect(left, sheet.y, sheet.width, height).stroke(black);
  putText(doc, title, headStyle, { x: left + padding, y: sheet.y + 4, width });
  let y = sheet.y + 22;
  for (const [i, { text, look }] of lines.entries()) {
    putText(doc, text, look, { x: left + padding, y, width });
    y += heights[i] ?? 0;
  }
  sheet.y += height + 12;
}
