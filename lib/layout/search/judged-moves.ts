/**
 * Moves along the board judged the way `problems()` judges places: a depth below half a micrometre is a touch (`fit/noise.ts`). The
 * intervals of `fit/forbidden-moves.ts` know no depth, so they settle all but the moves near their ends:
 *
 *   outside every interval of the piece: allowed;
 *   inside one of the piece made a micrometre smaller all round: forbidden, because something lies that deep in it;
 *   between the two: asked of the predicate itself, place by place.
 */
import { NOISE_UM } from "../fit/noise";
import type { Span, Spans } from "../fit/span";
import { GRID_UM } from "./grid";
import { placesInside } from "./place-table";

/** A piece made larger on all four sides by this many µm; smaller by a negative one. */
export function sizedBy({ along, across }: Spans, by: number): Spans {
  return { along: { from: along.from - by, to: along.to + by }, across: { from: across.from - by, to: across.to + by } };
}

export function isInside(intervals: readonly Span[], move: number): boolean {
  for (const { from, to } of intervals) if (from < move && move < to) return true;
  return false;
}

export interface Judging {
  /** Moves of the piece as it is. */
  readonly forbidden: readonly Span[];
  /** What a move inside `forbidden` comes to without asking; null: ask. */
  readonly settled: (move: number) => boolean | null;
  /** The predicate itself, at a column of places. */
  readonly ask: (column: number) => boolean;
}

/** Calls `forbid` for every column of places, of `count`, that is forbidden. */
export function forbidColumns({ forbidden, settled, ask }: Judging, count: number, forbid: (column: number) => void): void {
  for (const { from, to } of forbidden) {
    const [first, end] = placesInside({ from: from - NOISE_UM, to: to + NOISE_UM }, count);
    for (let column = first; column < end; column++) {
      if (settled(column * GRID_UM) ?? ask(column)) forbid(column);
    }
  }
}
