/**
 * The places that each piece of a run is tried at. What cannot be part of any run is left out beforehand: a piece comes no earlier than
 * the pieces before it allow, and no later than those after it do. That also decides exactly whether there is a run at all,
 * because every piece has its own place across the grain.
 */
import type { LooseRun, RunPiece } from "./loose-run";
import type { PlaceTable } from "./place-table";

/** Places of one piece in order along the board, then across: cells of its corner. */
export interface States {
  readonly columns: Int32Array;
  readonly rows: Int32Array;
}

/** Columns that are left to each piece, inclusive; null where the run cannot be kept in order. */
export function columnRanges({ pieces, links }: LooseRun, tables: readonly PlaceTable[]): (readonly [number, number])[] | null {
  const earliest: number[] = [];
  for (const [index, piece] of pieces.entries()) {
    const from = index === 0 ? 0 : (earliest[index - 1] as number) + (links[index - 1]?.least ?? 0);
    const first = nextColumn(tables[index] as PlaceTable, Math.max(from, piece.columns[0]), 1);
    if (first === null || first > piece.columns[1]) return null;
    earliest.push(first);
  }
  const latest: number[] = [];
  for (let index = pieces.length - 1; index >= 0; index--) {
    const piece = pieces[index] as RunPiece;
    const next = latest[0];
    const to = next === undefined ? Number.MAX_SAFE_INTEGER : next - (links[index]?.least ?? 0);
    const last = nextColumn(tables[index] as PlaceTable, Math.min(to, piece.columns[1]), -1);
    if (last === null || last < (earliest[index] as number)) return null;
    latest.unshift(last);
  }
  return earliest.map((first, index) => [first, latest[index] as number] as const);
}

/** The first column from `from` on, or back, that has an allowed place. */
function nextColumn({ columns, rows, blocked }: PlaceTable, from: number, by: 1 | -1): number | null {
  for (let column = by === 1 ? from : Math.min(from, columns - 1); column >= 0 && column < columns; column += by) {
    for (let row = 0; row < rows; row++) if (blocked[column * rows + row] === 0) return column;
  }
  return null;
}

/**
 * One allowed place of every block of the grid, the first of it, and one in the earliest column, so that the run that keeps as far
 * left as it can is always among those tried. On the finest grid these are all allowed places in the range.
 */
export function statesOn(table: PlaceTable, [first, last]: readonly [number, number], along: number, across: number): States {
  const chosen: (readonly [number, number])[] = [];
  for (let left = first; left <= last; left += along) {
    for (let top = 0; top < table.rows; top += across) {
      const place = firstAllowed(table, [left, Math.min(last + 1, left + along)], [top, Math.min(table.rows, top + across)]);
      if (place !== null) chosen.push(place);
    }
  }
  const leftmost = firstAllowed(table, [first, first + 1], [0, table.rows]);
  if (leftmost !== null && !chosen.some(([column, row]) => column === leftmost[0] && row === leftmost[1])) chosen.push(leftmost);
  chosen.sort((p, q) => p[0] - q[0] || p[1] - q[1]);
  return { columns: Int32Array.from(chosen, ([column]) => column), rows: Int32Array.from(chosen, ([, row]) => row) };
}

/** Every allowed place less than a step of the grid from a place on it. */
export function statesAround(
  table: PlaceTable,
  [first, last]: readonly [number, number],
  place: { readonly column: number; readonly row: number },
  along: number,
  across: number,
): States {
  const left = Math.max(first, place.column - along + 1);
  const right = Math.min(last, place.column + along - 1);
  const top = Math.max(0, place.row - across + 1);
  const bottom = Math.min(table.rows - 1, place.row + across - 1);
  const [columns, rows]: [number[], number[]] = [[], []];
  for (let column = left; column <= right; column++) {
    for (let row = top; row <= bottom; row++) {
      if (table.blocked[column * table.rows + row] !== 0) continue;
      columns.push(column);
      rows.push(row);
    }
  }
  return { columns: Int32Array.from(columns), rows: Int32Array.from(rows) };
}

type Bounds = readonly [number, number];

function firstAllowed({ rows, blocked }: PlaceTable, columns: Bounds, across: Bounds): readonly [number, number] | null {
  for (let column = columns[0]; column < columns[1]; column++) {
    for (let row = across[0]; row < across[1]; row++) if (blocked[column * rows + row] === 0) return [column, row];
  }
  return null;
}

/** Pairs of neighbours' places, and places, that a round would compare. */
export function pairsOf(states: readonly States[]): number {
  return states.reduce((sum, { columns }, index) => sum + columns.length * (1 + (states[index + 1]?.columns.length ?? 0)), 0);
}
