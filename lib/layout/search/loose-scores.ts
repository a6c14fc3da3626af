/**
 * What the places of loose pieces add to the score of a run:
 *
 *   score = Σ over pieces (own share) + Σ over links (shared seam),
 *   own share  = w_clear / pieces · clear + w_match / seams · Σ match of its seams to pieces that stay,
 *   shared seam = w_match / seams · match,
 *
 * so that score = w_match · (mean match) + w_clear · (mean clear). Clear is each piece's own distance to keep-clear areas.
 */
import { clearValue, roomAt } from "./clear-room";
import type { LooseRun, RunLink, RunPiece } from "./loose-run";
import type { States } from "./loose-states";
import type { BoundedArea } from "./place-areas";
import { addUp, type PrefixSums, prefixSums } from "./prefix-sums";
import { matchOf, summed } from "./read-profiles";
import type { FixedSeam } from "./seam-plan";
import { readStrip, type WoodSums } from "./wood-sums";

export interface LooseDesk {
  readonly wood: WoodSums;
  readonly areas: readonly BoundedArea[];
  readonly matchWeight: number;
  readonly clearWeight: number;
  /** Strips by first column and depth, added up once. */
  readonly strips: Map<string, PrefixSums>;
}

export function looseDesk(
  { pieces, counted }: LooseRun,
  wood: WoodSums,
  areas: readonly BoundedArea[],
  weights: { readonly match: number; readonly clear: number },
): LooseDesk {
  return {
    wood,
    areas,
    matchWeight: counted === 0 ? 0 : weights.match / counted,
    clearWeight: weights.clear / pieces.length,
    strips: new Map(),
  };
}

function stripAt({ wood, strips }: LooseDesk, column: number, depth: number): PrefixSums {
  const name = `${column} ${depth}`;
  const known = strips.get(name);
  if (known !== undefined) return known;
  const sums = prefixSums(wood.height);
  readStrip(wood, column, depth, sums.grey);
  addUp(sums);
  strips.set(name, sums);
  return sums;
}

/** Own share of each state of a piece. */
export function ownShares(desk: LooseDesk, piece: RunPiece, { columns, rows }: States): Float64Array {
  const still = piece.fixed.map((seam) => summed({ grey: seam.still, depth: seam.stillDepth }));
  return Float64Array.from(columns, (column, state) => {
    const row = rows[state] as number;
    let share = desk.clearWeight * clearValue(roomAt([piece.lying], desk.areas, column, row));
    for (const [index, seam] of piece.fixed.entries()) {
      share += desk.matchWeight * fixedMatch(desk, seam, still[index] as PrefixSums, column, row);
    }
    return share;
  });
}

function fixedMatch(desk: LooseDesk, seam: FixedSeam, still: PrefixSums, column: number, row: number): number {
  const { moving, rows, stillDepth } = seam;
  const strip = stripAt(desk, column + moving.column, moving.depth);
  return matchOf(strip, row + moving.row, still, 0, rows, [moving.depth, stillDepth]);
}

/** Share of the seam of a link, for one state of the piece and all states of the next. */
export function seamShares(
  desk: LooseDesk,
  { seam, swapped }: RunLink,
  from: States,
  to: States,
): (s: number, t: number) => number {
  if (seam === null || desk.matchWeight === 0) return () => 0;
  const [here, there] = swapped ? [seam.second, seam.first] : [seam.first, seam.second];
  const hereStrips = Array.from(from.columns, (column) => stripAt(desk, column + here.column, here.depth));
  const thereStrips = Array.from(to.columns, (column) => stripAt(desk, column + there.column, there.depth));
  const depths = [here.depth, there.depth] as const;
  return (s, t) => {
    const [p, q] = [(from.rows[s] as number) + here.row, (to.rows[t] as number) + there.row];
    return desk.matchWeight * matchOf(hereStrips[s] as PrefixSums, p, thereStrips[t] as PrefixSums, q, seam.rows, depths);
  };
}
