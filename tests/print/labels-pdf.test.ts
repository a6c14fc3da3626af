/** Label sheets, measured in the file against the published sizes of the sheets. */
import { describe, expect, test } from "vitest";
import { labelPlace, labelSheets, labelsOnSheet } from "@/lib/server/print/label-sheet";
import { labelsPdf } from "@/lib/server/print/labels-pdf";
import { makeOrder } from "../support/make-order";
import { pdfPages, pdfText } from "../support/read-pdf";

const pointsPerMm = 72 / 25.4;

/** A4: 3 × 70 mm and 8 × 37 mm with 0.5 mm at top and bottom. Letter: 2 5/8 × 1 in, 3 × 10, left 3/16 in, top 1/2 in, 1/8 in between. */
const sheets = [
  { name: "a4-24", columns: 3, rows: 8, width: 70, height: 37, left: 0, top: 0.5, across: 0, room: 5 },
  { name: "letter-30", columns: 3, rows: 10, width: 66.675, height: 25.4, left: 4.7625, top: 12.7, across: 3.175, room: 2 },
] as const;

describe.each(sheets)("$name", ({ name, columns, rows, width, height, left, top, across, room }) => {
  const sheet = labelSheets[name];

  test("fills its paper exactly", () => {
    const [paperWidth, paperHeight] = sheet.size.map((length) => length / pointsPerMm);
    expect(2 * left + columns * width + (columns - 1) * across).toBeCloseTo(paperWidth ?? 0, 3);
    expect(2 * top + rows * height).toBeCloseTo(paperHeight ?? 0, 3);
    expect(labelsOnSheet(sheet)).toBe(columns * rows);
  });

  test("places every position where the sheet has it", () => {
    for (let position = 0; position < columns * rows; position += 1) {
      const place = labelPlace(sheet, 1, position);
      expect(place.x / pointsPerMm).toBeCloseTo(left + (position % columns) * (width + across), 4);
      expect(place.y / pointsPerMm).toBeCloseTo(top + Math.floor(position / columns) * height, 4);
    }
  });

  test.each([1, 5, columns * rows])("from position %i each label's words lie inside their own label", async (start) => {
    const order = await makeOrder({ frontsPerBoard: 6, boards: 2 });
    const pages = pdfPages(await labelsPdf(order, name, start));
    const seen: number[] = [];
    pages.forEach(({ words }, page) => {
      for (const word of words) {
        const x = (word.left / pointsPerMm - left) / (width + across);
        const y = (word.top / pointsPerMm - top) / height;
        const [column, row] = [Math.floor(x), Math.floor(y)];
        seen.push(page * columns * rows + row * columns + column);
        const inLabel = { left: left + column * (width + across), top: top + row * height };
        expect(word.left / pointsPerMm - inLabel.left, word.text).toBeGreaterThanOrEqual(room);
        expect(inLabel.left + width - word.right / pointsPerMm, word.text).toBeGreaterThanOrEqual(room);
        expect(word.top / pointsPerMm - inLabel.top, word.text).toBeGreaterThanOrEqual(room);
        expect(inLabel.top + height - word.bottom / pointsPerMm, word.text).toBeGreaterThanOrEqual(room);
      }
    });
    // Two boards, each with one strip, six fronts and one offcut; no position skipped, none used twice.
    const positions = [...new Set(seen)].sort((a, b) => a - b);
    expect(positions).toEqual(Array.from({ length: positions.length }, (_, i) => start - 1 + i));
    expect(positions.length).toBe(
      order.snapshot.boards.reduce((sum, { program }) => sum + 1 + program.pieces.length + program.offcuts.length, 0),
    );
  });
});

test("a label says number, size, board, order and revision, and which way it goes", async () => {
  const text = (await labelsPdf(await makeOrder(), "a4-24", 1).then(pdfText)).join(" ").replace(/\s+/g, " ");
  expect(text).toContain("243.2 × 184.0");
  expect(text).toContain("front, board B-041");
  expect(text).toContain("strip, board B-041");
  expect(text).toContain("offcut, board B-041");
  expect(text).toContain("Order 18 A");
  expect(text).toContain("show side, top up");
  expect(text).toMatch(/\bC1\b/);
});

test("labels of a superseded revision say so", async () => {
  const text = (await labelsPdf(await makeOrder({ superseded: true }), "letter-30", 1).then(pdfText)).join(" ");
  expect(text).toContain("Order 18 A, SUPERSEDED");
});
