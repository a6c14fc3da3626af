/**
 * How far a group lies from what its pieces must keep clear of: the shortest straight slide, along the board or across it, after
 * which one of them touches an area (as `fit/clearance.ts` measures it), in whole micrometres, rounded down, and counted up to 30 mm.
 *
 *   clear = min(room, 30 mm) / 30 mm; 1 where no straight slide leads into an area.
 */
import { movesIntoArea } from "../fit/keep-clear";
import type { LyingPiece } from "../fit/lying-piece";
import { NOISE_UM } from "../fit/noise";
import type { Span, StockAxis } from "../fit/span";
import { GRID_UM } from "./grid";
import { pieceAt } from "./laid-group";
import type { BoundedArea } from "./place-areas";

/** Room beyond which more is no better: 30 mm. Our own choice, fits 16 bits. */
export const ROOM_ENOUGH = 30_000;

export function clearValue(room: number): number {
  return room / ROOM_ENOUGH;
}

/** Room of a group at one place, from the areas themselves. `lying`: laid in the first cell. */
export function roomAt(lying: readonly LyingPiece[], areas: readonly BoundedArea[], column: number, row: number): number {
  return Math.min(roomOn("along", lying, areas, column, row), roomOn("across", lying, areas, column, row));
}

/** The same for slides along one axis only. */
export function roomOn(
  axis: StockAxis,
  lying: readonly LyingPiece[],
  areas: readonly BoundedArea[],
  column: number,
  row: number,
): number {
  let least = ROOM_ENOUGH;
  for (const piece of lying) {
    const { spans } = pieceAt(piece, column, row);
    for (const { area } of areas) {
      for (const move of movesIntoArea(spans, area, axis)) least = Math.min(least, Math.floor(distanceTo(move, 0) + NOISE_UM));
    }
  }
  return least;
}

function distanceTo({ from, to }: Span, move: number): number {
  return from > move ? from - move : to < move ? move - to : 0;
}

/** What is within this much of the next whole micrometre is measured at the place itself, so that its last digit is never a matter of rounding. */
const CLOSE_CALL_UM = 1e-6;

/**
 * Rooms of a line of places by intervals of moves from its first: `lower` is called with every place that has less than enough.
 * `measure`: the room of a place from the areas themselves.
 */
export function lowerRooms(
  moves: readonly Span[],
  count: number,
  lower: (index: number, room: number) => void,
  measure: (index: number) => number,
): void {
  const sorted = merged(moves);
  let next = 0;
  for (let index = 0; index < count; index++) {
    const move = index * GRID_UM;
    while (next < sorted.length && (sorted[next] as Span).to < move) next++;
    const before = next > 0 ? move - (sorted[next - 1] as Span).to : Number.POSITIVE_INFINITY;
    const after = next < sorted.length ? Math.max(0, (sorted[next] as Span).from - move) : Number.POSITIVE_INFINITY;
    const room = Math.min(before, after) + NOISE_UM;
    if (room >= ROOM_ENOUGH + 1) continue;
    const isClose = Math.abs(room - Math.round(room)) < CLOSE_CALL_UM;
    lower(index, isClose ? measure(index) : Math.floor(room));
  }
}

/** In order, overlapping ones as one. */
function merged(moves: readonly Span[]): Span[] {
  const out: { from: number; to: number }[] = [];
  for (const { from, to } of [...moves].sort((p, q) => p.from - q.from || p.to - q.to)) {
    const last = out.at(-1);
    if (last !== undefined && from <= last.to) last.to = Math.max(last.to, to);
    else out.push({ from, to });
  }
  return out;
}
