/** Gaps that are alike in everything that is told of them, put together: a grid has hundreds, of a few kinds. */
import type { GapThroughYear, PieceId } from "@/lib/layout";

export interface GapRow {
  readonly key: string;
  /** The first of them. */
  readonly gap: GapThroughYear;
  readonly count: number;
  /** The pieces at all of them, each once. */
  readonly pieces: readonly PieceId[];
}

/** In the order of the first of each kind. */
export function gapRows(gaps: readonly GapThroughYear[]): GapRow[] {
  const rows = new Map<string, { gap: GapThroughYear; count: number; pieces: Set<PieceId> }>();
  for (const gap of gaps) {
    const side = "side" in gap.b ? gap.b.side : "between";
    const key = JSON.stringify([gap.runs, side, gap.gap, gap.reachA, gap.reachB, gap.figures]);
    const row = rows.get(key) ?? { gap, count: 0, pieces: new Set() };
    row.count += 1;
    row.pieces.add(gap.a);
    if ("piece" in gap.b) row.pieces.add(gap.b.piece);
    rows.set(key, row);
  }
  return [...rows].map(([key, { gap, count, pieces }]) => ({ key, gap, count, pieces: [...pieces] }));
}
