/**
 * When two places of a group are really different for a maker, and the best few that are.
 *
 * Two places are alike when they show nearly the same wood at nearly the same joints: they lie on the same side of the board, less
 * than `across` apart across the grain, and the corner and every counted seam between the group's own pieces, taken in order along the board,
 * less than `along` apart along it. So a set of equal fronts turned end for end on the same wood is alike, since the same wood meets at the
 * same joints; a set of unequal ones is not, as soon as its joints fall elsewhere.
 *
 * The choice is greedy: the best place of all, then the best that is like none chosen before. Of equal totals the first counts, by
 * side and orientation in the order searched, then along the board, then across it.
 */
import type { SideName } from "./board-side";
import { GRID_UM } from "./grid";
import type { SceneScan } from "./place-scan";
import type { Scene } from "./scene";
import type { Slices } from "./slices";

/** Least distances, µm. */
export interface Apart {
  readonly along: number;
  readonly across: number;
}

/** 60 mm along the grain, where figure changes slowly, and 10 mm across it, a little more than a step is looked for. Our own choice. */
export const defaultApart: Apart = { along: 60_000, across: 10_000 };

/** What of a place is compared, in the frame of its side, µm. */
export interface PlaceMarks {
  readonly side: SideName;
  readonly across: number;
  /** The corner, then the joints in order. */
  readonly along: readonly number[];
}

export function marksOf({ side, laid, seams }: Scene, column: number, row: number): PlaceMarks {
  const x = column * GRID_UM + laid.phase.x;
  const joints = seams.own.map(({ first, second }) => (first.column + second.column) * (GRID_UM / 2));
  joints.sort((p, q) => p - q);
  return {
    side: side.side,
    across: row * GRID_UM + laid.phase.y,
    along: [x, ...joints.map((joint) => joint + column * GRID_UM)],
  };
}

export function areAlike(p: PlaceMarks, q: PlaceMarks, apart: Apart): boolean {
  return (
    p.side === q.side &&
    Math.abs(p.across - q.across) < apart.across &&
    p.along.length === q.along.length &&
    p.along.every((mark, index) => Math.abs(mark - (q.along[index] as number)) < apart.along)
  );
}

export interface ChosenPlace {
  readonly scene: Scene;
  readonly column: number;
  readonly row: number;
}

/** At most `count`, best first; yields after each. */
export function* chooseDifferent(scanned: readonly SceneScan[], count: number, apart: Apart): Slices<ChosenPlace[]> {
  const chosen: ChosenPlace[] = [];
  const marks: PlaceMarks[] = [];
  while (chosen.length < count) {
    const next = bestUnlike(scanned, marks, apart);
    if (next === null) break;
    chosen.push(next);
    marks.push(marksOf(next.scene, next.column, next.row));
    yield 0;
  }
  return chosen;
}

function bestUnlike(scanned: readonly SceneScan[], marks: readonly PlaceMarks[], apart: Apart): ChosenPlace | null {
  let best: ChosenPlace | null = null;
  let highest = Number.NEGATIVE_INFINITY;
  for (const { scene, table, totals, columnBest } of scanned) {
    for (let column = 0; column < table.columns; column++) {
      if (!((columnBest[column] as number) > highest)) continue;
      for (let row = 0; row < table.rows; row++) {
        const total = totals[column * table.rows + row] as number;
        if (!(total > highest)) continue;
        const here = marksOf(scene, column, row);
        if (!marks.some((mark) => areAlike(mark, here, apart))) [best, highest] = [{ scene, column, row }, total];
      }
    }
  }
  return best;
}
