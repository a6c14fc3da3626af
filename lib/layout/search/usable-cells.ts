/**
 * What of a board could be kept for later: the cells of the grid that lie wholly inside the usable outline, on no keep-clear area,
 * and the saw's kerf away from everything else that is to be cut from the board. Tested exactly, cell by cell, as if each were a
 * piece of half a millimetre.
 */
import type { Kerfs } from "../fit/apart";
import { unionOf } from "../fit/forbidden-moves";
import { movesIntoArea } from "../fit/keep-clear";
import type { LyingPiece } from "../fit/lying-piece";
import { NOISE_UM } from "../fit/noise";
import { movesOutside } from "../fit/outline";
import type { Span, Spans } from "../fit/span";
import { grownByCut } from "../fit/spoken-for";
import type { BoardFace } from "../stock/board";
import { endCell, firstCell, GRID_UM } from "./grid";
import type { Slices } from "./slices";

/** `usable[x * rows + y]`: 1 where the cell may be kept. */
export interface UsableCells {
  readonly columns: number;
  readonly rows: number;
  readonly usable: Uint8Array;
}

/** A slice a row. `taken`: pieces that lie on the board and stay. */
export function* usableCells(board: BoardFace, taken: readonly LyingPiece[], kerfs: Kerfs): Slices<UsableCells> {
  const [columns, rows] = [endCell(board.length), endCell(board.width)];
  const usable = new Uint8Array(columns * rows).fill(1);
  for (let row = 0; row < rows; row++) {
    for (const { from, to } of forbiddenIn(board, row)) {
      // Moves to the very ends only touch.
      const first = Math.max(0, endCell(from + NOISE_UM) + 1);
      const end = Math.min(columns, firstCell(to - NOISE_UM));
      for (let x = first; x < end; x++) usable[x * rows + row] = 0;
    }
    yield 0;
  }
  const cells = { columns, rows, usable };
  for (const { blank } of taken) blockRect(cells, grown(blank, kerfs));
  for (const wood of board.spokenFor) blockRect(cells, grownByCut(wood, kerfs));
  return cells;
}

/** Moves along the board of a cell of this row that are not allowed. */
function forbiddenIn({ outline, keepClear }: BoardFace, row: number): Span[] {
  const cell: Spans = { along: { from: 0, to: GRID_UM }, across: { from: row * GRID_UM, to: (row + 1) * GRID_UM } };
  return unionOf([
    ...(outline === null ? [] : movesOutside(cell, outline, "along")),
    ...keepClear.flatMap(({ area }) => movesIntoArea(cell, area, "along")),
  ]);
}

/** Takes out every cell that a rectangle reaches into. */
export function blockRect({ columns, rows, usable }: UsableCells, { along, across }: Spans): void {
  const [left, right] = [Math.max(0, endCell(along.from)), Math.min(columns, firstCell(along.to))];
  const [top, bottom] = [Math.max(0, endCell(across.from)), Math.min(rows, firstCell(across.to))];
  for (let x = left; x < right; x++) usable.fill(0, x * rows + top, x * rows + Math.max(top, bottom));
}

/** A rectangle and the kerf of the cut around it. */
export function grown({ along, across }: Spans, kerfs: Kerfs): Spans {
  return {
    along: { from: along.from - kerfs.along, to: along.to + kerfs.along },
    across: { from: across.from - kerfs.across, to: across.to + kerfs.across },
  };
}
