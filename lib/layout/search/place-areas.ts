/**
 * Keep-clear areas seen from every place: at which places a piece would reach into one, and how far a straight slide along the board
 * is from the next, one row of places at a time.
 */
import { movesIntoArea, reachInto } from "../fit/keep-clear";
import { wholeDepth } from "../fit/noise";
import type { Span, Spans } from "../fit/span";
import type { KeepClearShape } from "../stock/board";
import { forbidColumns, isInside, sizedBy } from "./judged-moves";
import { type LaidGroup, pieceAt } from "./laid-group";
import { blockOne, type PlaceTable } from "./place-table";

/** An area and a rectangle that surely holds it. */
export interface BoundedArea {
  readonly area: KeepClearShape;
  readonly within: Spans;
}

export function boundedArea(area: KeepClearShape): BoundedArea {
  if (area.shape === "ellipse") {
    const reach = Math.max(area.radiusX, area.radiusY);
    const around = (middle: number): Span => ({ from: middle - reach, to: middle + reach });
    return { area, within: { along: around(area.centre.x), across: around(area.centre.y) } };
  }
  const span = (values: readonly number[]): Span => ({ from: Math.min(...values), to: Math.max(...values) });
  return { area, within: { along: span(area.points.map(({ x }) => x)), across: span(area.points.map(({ y }) => y)) } };
}

/** Blocks one row of places and answers the moves along the board, from the first place of the row, that lead into any area. */
export function blockOnAreas(table: PlaceTable, { lying }: LaidGroup, areas: readonly BoundedArea[], row: number): Span[] {
  const moves: Span[] = [];
  for (const piece of lying) {
    const { spans } = pieceAt(piece, 0, row);
    for (const { area, within } of areas) {
      if (within.across.to < spans.across.from || within.across.from > spans.across.to) continue;
      const forbidden = movesIntoArea(spans, area, "along");
      if (forbidden.length === 0) continue;
      moves.push(...forbidden);
      const deep = movesIntoArea(sizedBy(spans, -1), area, "along");
      forbidColumns(
        {
          forbidden,
          settled: (move) => (isInside(deep, move) ? true : null),
          ask: (column) => wholeDepth(reachInto(pieceAt(piece, column, row).spans, area)) > 0,
        },
        table.columns,
        (column) => blockOne(table, "keep-clear", column, row),
      );
    }
  }
  return moves;
}
