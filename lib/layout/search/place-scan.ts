/**
 * Every place of one scene: first what stands in the way, row by row, then what each allowed place is worth, column by column.
 * Works in slices, each a row or a column, and yields the share done.
 */
import type { Span } from "../fit/span";
import { lowerRooms, ROOM_ENOUGH, roomOn } from "./clear-room";
import { totalOfValues, type Weights, weightsInOrder } from "./objective";
import { blockOnAreas } from "./place-areas";
import { type ColumnDesk, columnDesk, readSeams, roomsAcross } from "./place-column";
import { blockOverOutline } from "./place-outline";
import { readParts, type Wanted } from "./place-parts";
import { blockNeighbours, blockOffBoard, emptyPlaceTable, type PlaceTable } from "./place-table";
import { countedSeams, type Scene } from "./scene";
import type { PickedRows } from "./seam-readings";
import type { Slices } from "./slices";
import { readBands } from "./symmetry";

export interface PlaceScan {
  readonly table: PlaceTable;
  /** By place, as the table; NaN where the place is not allowed, −1 where it was given up. */
  readonly totals: Float64Array;
  /** The highest total of each column; −1 where no place of it is allowed. */
  readonly columnBest: Float64Array;
  readonly allowed: number;
}

/** A scan and what it was a scan of. */
export interface SceneScan extends PlaceScan {
  readonly scene: Scene;
}

/** Share of the work that finding the allowed places is taken for. */
const TABLE_SHARE = 0.1;

/**
 * `beat`: null where the total of every place is wanted. Where only the best place is, the best total known before; places that cannot come
 * above the best known even without a step are given up before their steps are looked for.
 */
export function* scanPlaces(scene: Scene, weights: Weights, beat: number | null): Slices<PlaceScan> {
  const { table, rooms } = yield* placesOf(scene, weights.clear > 0);
  const { columns, rows } = table;
  const totals = new Float64Array(columns * rows).fill(Number.NaN);
  const columnBest = new Float64Array(columns).fill(-1);
  const desk = columnDesk(scene, rows);
  const valuing: Valuing = {
    weights,
    inOrder: weightsInOrder(weights),
    wanted: wantedFor(weights),
    rooms,
    across: new Uint16Array(rows).fill(ROOM_ENOUGH),
    totals,
  };
  const picked = { count: 0, rows: new Int32Array(rows) };
  let [allowed, best] = [0, beat];
  for (let column = 0; column < columns; column++) {
    pickAllowed(table, column, picked);
    allowed += picked.count;
    if (picked.count > 0) {
      readColumn(desk, column, valuing);
      if (best !== null) giveUp(desk, column, picked, valuing, best);
      const here = valueColumn(desk, column, picked, valuing);
      columnBest[column] = here;
      if (best !== null && here > best) best = here;
    }
    yield TABLE_SHARE + (1 - TABLE_SHARE) * ((column + 1) / columns);
  }
  return { table, totals, columnBest, allowed };
}

export interface AllowedPlaces {
  readonly table: PlaceTable;
  /** Room by slides along the board for every place, µm; empty where it was not asked for. */
  readonly rooms: Uint16Array;
}

/** Yields the share done, up to 0.1. */
export function* placesOf({ laid, side }: PlaceGround, withRooms: boolean): Slices<AllowedPlaces> {
  const table = emptyPlaceTable(laid, side.board);
  const { columns, rows } = table;
  const rooms = new Uint16Array(withRooms ? columns * rows : 0).fill(ROOM_ENOUGH);
  blockOffBoard(table, laid, side.board);
  blockNeighbours(table, laid, side.board);
  for (let row = 0; row < rows; row++) {
    if (side.board.outline !== null) blockOverOutline(table, laid, side.board.outline, row);
    const moves = blockOnAreas(table, laid, side.areas, row);
    if (withRooms) roomsAlong({ laid, side }, row, moves, { table, rooms });
    yield (TABLE_SHARE * (row + 1)) / rows;
  }
  return { table, rooms };
}

/** What decides where a group may lie. */
export type PlaceGround = { readonly laid: Scene["laid"]; readonly side: Pick<Scene["side"], "board" | "areas"> };

function roomsAlong({ laid, side }: PlaceGround, row: number, moves: readonly Span[], { table, rooms }: AllowedPlaces): void {
  lowerRooms(
    moves,
    table.columns,
    (column, room) => {
      rooms[column * table.rows + row] = room;
    },
    (column) => roomOn("along", laid.lying, side.areas, column, row),
  );
}

function pickAllowed({ blocked, rows }: PlaceTable, column: number, into: { count: number; readonly rows: Int32Array }): void {
  into.count = 0;
  for (let row = 0; row < rows; row++) if (blocked[column * rows + row] === 0) into.rows[into.count++] = row;
}

interface Valuing {
  readonly weights: Weights;
  readonly inOrder: readonly number[];
  readonly wanted: Wanted;
  readonly rooms: Uint16Array;
  readonly across: Uint16Array;
  readonly totals: Float64Array;
}

/** Parts without weight are not worked out: they add nothing to a total. */
function wantedFor({ match, step, symmetry, rest }: Weights): Wanted {
  return { seams: match > 0 || step > 0, symmetry: symmetry > 0, rest: rest > 0 };
}

/** What a column shares, seams aside. */
function readColumn({ scene, bands }: ColumnDesk, column: number, { weights, wanted, across }: Valuing): void {
  if (wanted.symmetry && scene.symmetry !== null) readBands(scene.symmetry, scene.side.wood, column, bands);
  if (weights.clear > 0) roomsAcross(scene, column, across);
}

/** Takes those out of the picked rows that stay at or below `best` however their steps turn out. */
function giveUp(desk: ColumnDesk, column: number, picked: PickedRows, valuing: Valuing, best: number): void {
  if (!(valuing.weights.step > 0)) return;
  readSeams(desk, column, picked, false);
  desk.step.fill(countedSeams(desk.scene.seams), 0, picked.count);
  let kept = 0;
  for (let index = 0; index < picked.count; index++) {
    const row = picked.rows[index] as number;
    if (totalAt(desk, column, row, index, valuing) > best) picked.rows[kept++] = row;
    else valuing.totals[column * valuing.across.length + row] = -1;
  }
  picked.count = kept;
}

/** Answers the highest total, −1 without any. */
function valueColumn(desk: ColumnDesk, column: number, picked: PickedRows, valuing: Valuing): number {
  if (picked.count === 0) return -1;
  if (valuing.wanted.seams) readSeams(desk, column, picked, valuing.weights.step > 0);
  let best = -1;
  for (let index = 0; index < picked.count; index++) {
    const row = picked.rows[index] as number;
    const total = totalAt(desk, column, row, index, valuing);
    valuing.totals[column * valuing.across.length + row] = total;
    if (total > best) best = total;
  }
  return best;
}

function totalAt(desk: ColumnDesk, column: number, row: number, index: number, valuing: Valuing): number {
  const along = valuing.rooms[column * valuing.across.length + row] ?? ROOM_ENOUGH;
  readParts(desk, column, row, index, Math.min(along, valuing.across[row] as number), valuing.wanted);
  return totalOfValues(desk.parts, valuing.inOrder);
}
