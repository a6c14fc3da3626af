/**
 * The largest rectangle that can still be kept of a board after a group is taken out of it, for every place of the group at once.
 *
 * A rectangle that avoids the group's own rectangle lies wholly before it or after it along the board, or wholly above or below it
 * across. So four sweeps over the empty board, each noting the largest rectangle seen so far line by line, answer every place by
 * the largest of four numbers. In a sweep the rectangles that end at a line are those under the skyline of how far each cell's
 * run of usable cells reaches back, found with a stack in one pass. Whole cells, exact.
 */

import type { Slices } from "./slices";
import type { UsableCells } from "./usable-cells";

/** What is worth keeping at least, in cells along and across the grain. */
export interface LeastRest {
  readonly along: number;
  readonly across: number;
}

/** A rectangle of cells. */
export interface CellRect {
  readonly column: number;
  readonly row: number;
  readonly columns: number;
  readonly rows: number;
}

/** The largest rectangle within the first n lines of a sweep, n from 0: its area in cells, and where it lies in the sweep. */
interface Sweep {
  readonly area: Float64Array;
  /** Line one past its last, lines, first position in the line, positions: four numbers a line. */
  readonly rect: Int32Array;
}

export interface RestTable {
  readonly cells: UsableCells;
  readonly before: Sweep;
  readonly after: Sweep;
  readonly above: Sweep;
  readonly below: Sweep;
  /** Area of the largest rectangle of the empty board. */
  readonly whole: number;
}

/** Cells that the group's rectangle and the cut around it reach into: columns `left` to before `right`, rows likewise. */
export interface TakenCells {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** In slices. */
export function* restTable(cells: UsableCells, least: LeastRest): Slices<RestTable> {
  const { columns, rows, usable } = cells;
  const column = (number: number, into: Uint8Array) => into.set(usable.subarray(number * rows, (number + 1) * rows));
  const row = (number: number, into: Uint8Array) => {
    for (let x = 0; x < columns; x++) into[x] = usable[x * rows + number] as number;
  };
  const along = { lines: columns, length: rows, leastLines: least.along, leastLength: least.across };
  const across = { lines: rows, length: columns, leastLines: least.across, leastLength: least.along };
  const before = yield* sweep({ ...along, read: column });
  const after = yield* sweep({ ...along, read: (line, into) => column(columns - 1 - line, into) });
  const above = yield* sweep({ ...across, read: row });
  const below = yield* sweep({ ...across, read: (line, into) => row(rows - 1 - line, into) });
  return { cells, before, after, above, below, whole: before.area[columns] as number };
}

/** Area in cells of the largest rectangle clear of the group; 0 when nothing worth keeping is left. */
export function restArea({ cells, before, after, above, below }: RestTable, { left, right, top, bottom }: TakenCells): number {
  return Math.max(
    before.area[within(left, cells.columns)] as number,
    after.area[within(cells.columns - right, cells.columns)] as number,
    above.area[within(top, cells.rows)] as number,
    below.area[within(cells.rows - bottom, cells.rows)] as number,
  );
}

/** The rectangle itself; of equal ones that before the group, then after, above, below. */
export function restRect(table: RestTable, { left, right, top, bottom }: TakenCells): CellRect | null {
  const { columns, rows } = table.cells;
  const found = [
    { sweep: table.before, line: within(left, columns), lie: (r: Lying) => ({ ...alongRect(r), column: r.end - r.lines }) },
    {
      sweep: table.after,
      line: within(columns - right, columns),
      lie: (r: Lying) => ({ ...alongRect(r), column: columns - r.end }),
    },
    { sweep: table.above, line: within(top, rows), lie: (r: Lying) => ({ ...acrossRect(r), row: r.end - r.lines }) },
    { sweep: table.below, line: within(rows - bottom, rows), lie: (r: Lying) => ({ ...acrossRect(r), row: rows - r.end }) },
  ];
  let [best, rect]: [number, CellRect | null] = [0, null];
  for (const { sweep, line, lie } of found) {
    const area = sweep.area[line] as number;
    if (area > best) [best, rect] = [area, lie(lyingAt(sweep, line))];
  }
  return rect;
}

/** The largest rectangle of a board worth keeping as it is, in slices. */
export function* largestRect({ columns, rows, usable }: UsableCells, least: LeastRest): Slices<CellRect | null> {
  const read = (number: number, into: Uint8Array) => into.set(usable.subarray(number * rows, (number + 1) * rows));
  const found = yield* sweep({ lines: columns, length: rows, leastLines: least.along, leastLength: least.across, read });
  const lying = lyingAt(found, columns);
  return lying.lines === 0 ? null : { ...alongRect(lying), column: lying.end - lying.lines };
}

interface Lying {
  readonly end: number;
  readonly lines: number;
  readonly first: number;
  readonly length: number;
}

function lyingAt({ rect }: Sweep, line: number): Lying {
  const [end = 0, lines = 0, first = 0, length = 0] = rect.subarray(line * 4, line * 4 + 4);
  return { end, lines, first, length };
}

function alongRect({ lines, first, length }: Lying) {
  return { columns: lines, row: first, rows: length };
}

function acrossRect({ lines, first, length }: Lying) {
  return { rows: lines, column: first, columns: length };
}

function within(line: number, lines: number): number {
  return Math.min(lines, Math.max(0, line));
}

interface Lines {
  readonly lines: number;
  readonly length: number;
  /** The cells of a line, 1 where usable. */
  readonly read: (line: number, into: Uint8Array) => void;
  readonly leastLines: number;
  readonly leastLength: number;
}

/** Cells between two slices, about. */
const SLICE_CELLS = 200_000;

function* sweep({ lines, length, read, leastLines, leastLength }: Lines): Slices<Sweep> {
  const sliceLines = Math.max(1, Math.floor(SLICE_CELLS / length));
  const area = new Float64Array(lines + 1);
  const rect = new Int32Array((lines + 1) * 4);
  const cells = new Uint8Array(length);
  const run = new Int32Array(length + 1);
  const starts = new Int32Array(length + 1);
  const heights = new Int32Array(length + 1);
  for (let line = 0; line < lines; line++) {
    let best = area[line] as number;
    rect.copyWithin((line + 1) * 4, line * 4, line * 4 + 4);
    read(line, cells);
    for (let position = 0; position < length; position++)
      run[position] = cells[position] === 1 ? (run[position] as number) + 1 : 0;
    let depth = 0;
    // The run past the end is always 0, so it closes every rectangle that is still open.
    for (let position = 0; position <= length; position++) {
      const height = run[position] as number;
      let start = position;
      while (depth > 0 && (heights[depth - 1] as number) >= height) {
        depth--;
        start = starts[depth] as number;
        const [tall, wide] = [heights[depth] as number, position - start];
        if (tall >= leastLines && wide >= leastLength && tall * wide > best) {
          best = tall * wide;
          rect.set([line + 1, tall, start, wide], (line + 1) * 4);
        }
      }
      heights[depth] = height;
      starts[depth++] = start;
    }
    area[line + 1] = best;
    if ((line + 1) % sliceLines === 0) yield 0;
  }
  return { area, rect };
}
