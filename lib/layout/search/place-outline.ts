/** Places at which a piece would reach over the usable outline of its board. */
import { movesInto, unionOf } from "../fit/forbidden-moves";
import { wholeDepth } from "../fit/noise";
import { movesOutside, outsideBy } from "../fit/outline";
import { outlineShadow } from "../fit/polygon-shadow";
import type { Span, Spans } from "../fit/span";
import type { StockPoint } from "../frame/point";
import { forbidColumns, isInside, sizedBy } from "./judged-moves";
import { type LaidGroup, pieceAt } from "./laid-group";
import { blockOne, type PlaceTable } from "./place-table";

/** One row of places. */
export function blockOverOutline(table: PlaceTable, { lying }: LaidGroup, outline: readonly StockPoint[], row: number): void {
  for (const piece of lying) {
    const { spans } = pieceAt(piece, 0, row);
    const deep = movesOnOutline(sizedBy(spans, -1), outline);
    const near = movesOnOutline(sizedBy(spans, 1), outline);
    forbidColumns(
      {
        forbidden: movesOutside(spans, outline, "along"),
        // Not inside and nowhere near the outline is outside altogether.
        settled: (move) => (isInside(deep, move) || !isInside(near, move) ? true : null),
        ask: (column) => wholeDepth(outsideBy(pieceAt(piece, column, row).spans, outline)) > 0,
      },
      table.columns,
      (column) => blockOne(table, "board", column, row),
    );
  }
}

/** Moves along the board at which an edge of the outline passes through the piece. */
function movesOnOutline(spans: Spans, outline: readonly StockPoint[]): Span[] {
  return unionOf(outlineShadow(outline, "along", spans.across).map((shadow) => movesInto(spans.along, shadow)));
}
