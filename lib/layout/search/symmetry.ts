/**
 * How evenly the figure lies about the middle of the face: 1 when the two halves on either side of the line along the grain mirror
 * each other, as when a cathedral is centred.
 *
 * Computed in the wood as cut, without closing the saw's gaps: for each grid row across the group the mean grey over the whole
 * length of what is shown there, rounded down to 64ths of a level,
 *   q[k] = ⌊64 · Σ grey / cells⌋
 * and over the n rows that have a row to mirror them, both covered by pieces, with q'[k] the mirrored row's value,
 *   symmetry = (n·Σq·q' − (Σq)²) / (n·Σq² − (Σq)²),
 * the correlation of the profile with its mirror, counted as 0 below 0. A profile that varies by less than one level (standard
 * deviation) shows nothing to centre and counts as 0. Below 20 mm across, symmetry is left out.
 */
import type { LyingPiece } from "../fit/lying-piece";
import { flatBelow, LEAST_ROWS, spreadOf } from "./correlation";
import { endCell, firstCell } from "./grid";
import { addUp, between, type PrefixSums } from "./prefix-sums";
import type { WoodSums } from "./wood-sums";

/** Parts of a grey level that means are rounded to: a mean over a metre of board is finer than a level. */
const FINENESS = 64;
/** Least standard deviation of the profile, in levels. A mean over the length has less contrast than any one edge. Our own choice. */
const FLAT_LEVELS = 1;

/** Columns of cells, from first to before end. */
interface Stretch {
  readonly first: number;
  readonly end: number;
}

/** Rows that are covered by the same columns. */
interface Band {
  readonly stretches: readonly Stretch[];
  readonly cells: number;
}

/** Neighbouring pairs of mirrored rows in the same bands: near rows going on, far rows going back. */
interface PairRun {
  readonly near: number;
  readonly far: number;
  readonly nearBand: number;
  readonly farBand: number;
  readonly pairs: number;
  /** 2, or 1 for the middle row of an odd number, which is its own mirror. */
  readonly times: number;
}

export interface SymmetryPlan {
  readonly bands: readonly Band[];
  /** Rows relative to the corner's cell. */
  readonly runs: readonly PairRun[];
  /** Rows in all pairs together. */
  readonly rows: number;
}

/** Null where too little is shown across the grain. */
export function planSymmetry(lying: readonly LyingPiece[]): SymmetryPlan | null {
  const first = Math.min(...lying.map(({ spans }) => firstCell(spans.across.from)));
  const end = Math.max(...lying.map(({ spans }) => endCell(spans.across.to)));
  const bands: Band[] = [];
  const numbers = new Map<string, number>();
  const bandOf = (row: number): number | null => {
    const stretches = stretchesAt(lying, row);
    if (stretches.length === 0) return null;
    const name = JSON.stringify(stretches);
    const known = numbers.get(name);
    if (known !== undefined) return known;
    bands.push({ stretches, cells: stretches.reduce((sum, stretch) => sum + stretch.end - stretch.first, 0) });
    numbers.set(name, bands.length - 1);
    return bands.length - 1;
  };
  const runs: PairRun[] = [];
  for (let near = first; near <= first + end - 1 - near; near++) {
    const far = first + end - 1 - near;
    const [nearBand, farBand] = [bandOf(near), bandOf(far)];
    if (nearBand !== null && farBand !== null)
      addPair(runs, { near, far, nearBand, farBand, pairs: 1, times: near === far ? 1 : 2 });
  }
  const rows = runs.reduce((sum, { pairs, times }) => sum + pairs * times, 0);
  return rows < LEAST_ROWS ? null : { bands, runs, rows };
}

function addPair(runs: PairRun[], pair: PairRun): void {
  const last = runs.at(-1);
  const goesOn =
    last !== undefined &&
    last.near + last.pairs === pair.near &&
    last.nearBand === pair.nearBand &&
    last.farBand === pair.farBand &&
    last.times === pair.times;
  if (goesOn) runs[runs.length - 1] = { ...last, pairs: last.pairs + 1 };
  else runs.push(pair);
}

function stretchesAt(lying: readonly LyingPiece[], row: number): Stretch[] {
  return lying.flatMap(({ spans }) => {
    if (row < firstCell(spans.across.from) || row >= endCell(spans.across.to)) return [];
    const stretch = { first: firstCell(spans.along.from), end: endCell(spans.along.to) };
    return stretch.end > stretch.first ? [stretch] : [];
  });
}

/** The profile of each band at a column of places, for every row of the board, added up. */
export function readBands(
  { bands }: SymmetryPlan,
  { height, before }: WoodSums,
  column: number,
  into: readonly PrefixSums[],
): void {
  bands.forEach(({ stretches, cells }, index) => {
    const sums = into[index] as PrefixSums;
    const starts = stretches.map(({ first, end }) => [(column + first) * height, (column + end) * height] as const);
    for (let y = 0; y < height; y++) {
      let sum = 0;
      for (const [start, end] of starts) sum += (before[end + y] as number) - (before[start + y] as number);
      sums.grey[y] = Math.floor((FINENESS * sum) / cells);
    }
    addUp(sums);
  });
}

/** 0..1 at one row of places. */
export function symmetryAt({ runs, rows }: SymmetryPlan, bands: readonly PrefixSums[], row: number): number {
  let [sum, squares, products] = [0, 0, 0];
  for (const { near, far, nearBand, farBand, pairs, times } of runs) {
    const [p, q] = [bands[nearBand] as PrefixSums, bands[farBand] as PrefixSums];
    const [start, back] = [row + near, row + far];
    sum += between(p.sum, start, start + pairs);
    squares += between(p.squares, start, start + pairs);
    if (times === 2) {
      sum += between(q.sum, back + 1 - pairs, back + 1);
      squares += between(q.squares, back + 1 - pairs, back + 1);
    }
    products += times * mirroredProducts(p.grey, q.grey, start, back, pairs);
  }
  const spread = spreadOf(rows, sum, squares);
  if (spread < flatBelow(rows, FINENESS, FLAT_LEVELS)) return 0;
  return Math.min(1, Math.max(0, (rows * products - sum * sum) / spread));
}

function mirroredProducts(p: Int32Array, q: Int32Array, start: number, back: number, pairs: number): number {
  let products = 0;
  for (let k = 0; k < pairs; k++) products += (p[start + k] as number) * (q[back - k] as number);
  return products;
}
