/** Where labels lie on the sheets they are bought on. Points of 1/72 inch from the upper left corner of the sheet, y down. */
import "server-only";
import { paperSizes, pointsPerMm } from "./paper";

export type LabelSheetName = "a4-24" | "letter-30";

export interface LabelSheet {
  readonly size: readonly [number, number];
  readonly columns: number;
  readonly rows: number;
  readonly label: { readonly width: number; readonly height: number };
  readonly first: { readonly x: number; readonly y: number };
  /** From the left edge of one label to that of the next, and likewise down. */
  readonly pitch: { readonly x: number; readonly y: number };
  /** Kept free inside every label. */
  readonly inset: { readonly x: number; readonly y: number };
}

const mm = (length: number) => length * pointsPerMm;
const inch = (length: number) => length * 72;

export const labelSheets: Readonly<Record<LabelSheetName, LabelSheet>> = {
  // 70 × 37 mm, 3 × 8, no side margin, 0.5 mm at top and bottom: 3 · 70 = 210, 8 · 37 + 1 = 297. The outer labels reach the rim that
  // printers leave bare (4–5 mm), so all text keeps 5 mm and a little inside.
  "a4-24": {
    size: paperSizes.a4,
    columns: 3,
    rows: 8,
    label: { width: mm(70), height: mm(37) },
    first: { x: 0, y: mm(0.5) },
    pitch: { x: mm(70), y: mm(37) },
    inset: { x: mm(5.5), y: mm(5.2) },
  },
  // 2 5/8 × 1 in, 3 × 10, 3/16 in at the left, 1/2 in at the top, 1/8 in between columns, none between rows.
  "letter-30": {
    size: paperSizes.letter,
    columns: 3,
    rows: 10,
    label: { width: inch(2.625), height: inch(1) },
    first: { x: inch(0.1875), y: inch(0.5) },
    pitch: { x: inch(2.75), y: inch(1) },
    inset: { x: mm(3), y: mm(2.2) },
  },
};

export interface LabelPlace {
  /** Sheet from 0. */
  readonly sheet: number;
  readonly x: number;
  readonly y: number;
}

export function labelsOnSheet({ columns, rows }: LabelSheet): number {
  return columns * rows;
}

/** Place of the n-th label from 0, row by row, when the first goes to position `start` (from 1) of the first sheet. */
export function labelPlace(sheet: LabelSheet, start: number, index: number): LabelPlace {
  const position = start - 1 + index;
  const onSheet = position % labelsOnSheet(sheet);
  return {
    sheet: Math.floor(position / labelsOnSheet(sheet)),
    x: sheet.first.x + (onSheet % sheet.columns) * sheet.pitch.x,
    y: sheet.first.y + Math.floor(onSheet / sheet.columns) * sheet.pitch.y,
  };
}
