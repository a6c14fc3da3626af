/**
 * Which places of a group are allowed: for every place on the grid, what stands in its way. The same judgement as `problems()`: its
 * pieces would have no problem but those among themselves, which are the same wherever it lies.
 */
import { lossBefore } from "../fit/apart";
import { movesInto } from "../fit/forbidden-moves";
import type { Span, StockAxis } from "../fit/span";
import { grownByCut } from "../fit/spoken-for";
import type { BoardFace } from "../stock/board";
import { GRID_UM, placesIn } from "./grid";
import type { LaidGroup } from "./laid-group";

/** What can stand in the way of a place. "board": over its edge or its usable outline. */
export type Obstacle = "board" | "keep-clear" | "spoken-for" | "other-pieces";

export const obstacleBits: Readonly<Record<Obstacle, number>> = { board: 1, "keep-clear": 2, "spoken-for": 4, "other-pieces": 8 };

export interface PlaceTable {
  /** Places along the board and across it. */
  readonly columns: number;
  readonly rows: number;
  /** `blocked[column * rows + row]`: the bits of all obstacles, 0 where the place is allowed. */
  readonly blocked: Uint8Array;
}

/** Every place at which the group's bounds lie on the board's rectangle, with nothing judged yet. */
export function emptyPlaceTable({ size, phase }: LaidGroup, board: BoardFace): PlaceTable {
  const columns = placesIn(board.length - phase.x - size.along);
  const rows = placesIn(board.width - phase.y - size.across);
  return { columns: rows === 0 ? 0 : columns, rows, blocked: new Uint8Array(columns * rows) };
}

/** Places strictly inside an open interval of moves, clipped to `count`: first, and one past the last. */
export function placesInside({ from, to }: Span, count: number): readonly [number, number] {
  return [Math.max(0, Math.floor(from / GRID_UM) + 1), Math.min(count, Math.ceil(to / GRID_UM))];
}

export function block(
  table: PlaceTable,
  obstacle: Obstacle,
  columns: readonly [number, number],
  rows: readonly [number, number],
): void {
  const bit = obstacleBits[obstacle];
  for (let column = columns[0]; column < columns[1]; column++) {
    for (let row = rows[0]; row < rows[1]; row++) {
      const at = column * table.rows + row;
      table.blocked[at] = (table.blocked[at] as number) | bit;
    }
  }
}

export function blockOne({ blocked, rows }: PlaceTable, obstacle: Obstacle, column: number, row: number): void {
  const at = column * rows + row;
  blocked[at] = (blocked[at] as number) | obstacleBits[obstacle];
}

/** Sawn sizes over the edge of the board's rectangle. Whole micrometres, so intervals say it exactly. */
export function blockOffBoard(table: PlaceTable, { blank }: LaidGroup, { length, width }: BoardFace): void {
  const all: readonly [number, number] = [0, table.columns];
  const every: readonly [number, number] = [0, table.rows];
  const over = (span: Span, size: number): [Span, Span] => [
    { from: Number.NEGATIVE_INFINITY, to: -span.from },
    { from: size - span.to, to: Number.POSITIVE_INFINITY },
  ];
  for (const moves of over(blank.along, length)) block(table, "board", placesInside(moves, table.columns), every);
  for (const moves of over(blank.across, width)) block(table, "board", all, placesInside(moves, table.rows));
}

/** Too near for the saw to other pieces of the layout, or to wood that is spoken for: a rectangle of moves for each pair. Exact. */
export function blockNeighbours(table: PlaceTable, { lying, others, kerfs }: LaidGroup, { spokenFor }: BoardFace): void {
  const blockMoves = (obstacle: Obstacle, moves: (axis: StockAxis) => Span) =>
    block(table, obstacle, placesInside(moves("along"), table.columns), placesInside(moves("across"), table.rows));
  for (const piece of lying) {
    for (const other of others) {
      blockMoves("other-pieces", (axis) => ({
        from: other.spans[axis].from - lossBefore(axis, piece, other, kerfs) - piece.spans[axis].to,
        to: other.spans[axis].to + lossBefore(axis, other, piece, kerfs) - piece.spans[axis].from,
      }));
    }
    for (const taken of spokenFor) {
      const wood = grownByCut(taken, kerfs);
      blockMoves("spoken-for", (axis) => movesInto(piece.blank[axis], wood[axis]));
    }
  }
}

/** The smallest set of obstacles that alone keep some place from being allowed; empty where a place is allowed. */
export function inTheWay({ blocked }: PlaceTable): Obstacle[] {
  const bitsIn = (mask: number) => [1, 2, 4, 8].filter((bit) => (mask & bit) !== 0).length;
  const seen = new Set(blocked);
  const [least] = [...seen].sort((p, q) => bitsIn(p) - bitsIn(q) || p - q);
  return (Object.keys(obstacleBits) as Obstacle[]).filter((obstacle) => ((least ?? 0) & obstacleBits[obstacle]) !== 0);
}
