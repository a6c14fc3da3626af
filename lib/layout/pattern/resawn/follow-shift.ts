/**
 * Follows the shift between two profiles from window to window, by dynamic programming: of all paths whose shift changes little from
 * one window to the next, the one whose windows correlate best in sum. Windows whose match would lie beyond the edge of the other
 * profile say nothing and count nothing. Everything in samples; ties go to the smaller shift.
 */

export interface ShiftQuestion {
  readonly face: readonly number[];
  readonly back: readonly number[];
  readonly window: number;
  /** From one window to the next. */
  readonly next: number;
  /** Largest shift that is tried, either way. */
  readonly most: number;
  /** By how much the shift may change from one window to the next. */
  readonly bend: number;
  /** A path that is everywhere farther than this from the best one is another. */
  readonly other: number;
}

export interface WindowShift {
  /** Positive where the back has the face's figure at greater places. */
  readonly shift: number;
  readonly correlation: number;
}

export interface ShiftPath {
  /** Those that found their figure on the back. */
  readonly windows: readonly WindowShift[];
  /** Mean correlation of the best other path, over as many windows. */
  readonly nextBest: number;
}

/** null where not one window fits. */
export function followShift(question: ShiftQuestion): ShiftPath | null {
  const { face, window, next, most, bend, other } = question;
  const starts: number[] = [];
  for (let from = 0; from + window <= face.length; from += next) starts.push(from);
  const table = starts.map((from) => correlations(question, from));
  const best = bestPath(table, bend);
  if (best === null) return null;
  const windows = best.flatMap((lag, index): WindowShift[] => {
    const row = table[index] ?? [];
    const correlation = row[lag];
    if (correlation === undefined || Number.isNaN(correlation)) return [];
    return [{ shift: lag - most + peakBeside(row, lag), correlation }];
  });
  const apart = table.map((row, index) =>
    row.map((value, lag) => (Math.abs(lag - (best[index] ?? 0)) <= other ? Number.NEGATIVE_INFINITY : value)),
  );
  const second = bestPath(apart, bend);
  const sum = second?.reduce((total, lag, index) => total + known(apart[index]?.[lag]), 0) ?? Number.NEGATIVE_INFINITY;
  return windows.length === 0 ? null : { windows, nextBest: sum / windows.length };
}

/** At every shift from −most to most; NaN where the window would reach beyond the back. */
function correlations({ face, back, window, most }: ShiftQuestion, from: number): number[] {
  return Array.from({ length: 2 * most + 1 }, (_, index) => {
    const at = from + index - most;
    return at < 0 || at + window > back.length ? Number.NaN : correlation(face, from, back, at, window);
  });
}

function correlation(f: readonly number[], fromF: number, b: readonly number[], fromB: number, count: number): number {
  let [sumF, sumB, squareF, squareB, product] = [0, 0, 0, 0, 0];
  for (let index = 0; index < count; index++) {
    const [p, q] = [f[fromF + index] ?? 0, b[fromB + index] ?? 0];
    sumF += p;
    sumB += q;
    squareF += p * p;
    squareB += q * q;
    product += p * q;
  }
  const spread = (squareF - (sumF * sumF) / count) * (squareB - (sumB * sumB) / count);
  return spread > 0 ? (product - (sumF * sumB) / count) / Math.sqrt(spread) : 0;
}

/** The shift of every window, as an index into its row; null where no path goes through. */
function bestPath(table: readonly (readonly number[])[], bend: number): number[] | null {
  let totals: readonly number[] = (table[0] ?? []).map(known);
  const cameFrom: number[][] = [];
  for (const row of table.slice(1)) {
    const from = row.map((_, lag) => bestNear(totals, lag, bend));
    const before = totals;
    totals = row.map((value, lag) => known(value) + (before[from[lag] ?? 0] ?? Number.NEGATIVE_INFINITY));
    cameFrom.push(from);
  }
  let lag = bestNear(totals, 0, totals.length);
  if (!Number.isFinite(totals[lag] ?? Number.NEGATIVE_INFINITY)) return null;
  const path = [lag];
  for (const from of cameFrom.toReversed()) {
    lag = from[lag] ?? 0;
    path.push(lag);
  }
  return path.reverse();
}

function bestNear(totals: readonly number[], lag: number, reach: number): number {
  let best = Math.max(0, lag - reach);
  for (let at = best + 1; at <= Math.min(totals.length - 1, lag + reach); at++) {
    if ((totals[at] ?? 0) > (totals[best] ?? 0)) best = at;
  }
  return best;
}

/** What a window that says nothing adds to a path. */
function known(value: number | undefined): number {
  return value === undefined || Number.isNaN(value) ? 0 : value;
}

/** Where the top of the parabola through a peak and its neighbours lies, in samples from it; 0 beside a peak. */
function peakBeside(row: readonly number[], lag: number): number {
  const [before, middle, after] = [row[lag - 1] ?? Number.NaN, row[lag] ?? Number.NaN, row[lag + 1] ?? Number.NaN];
  const bend = before - 2 * middle + after;
  return middle >= before && middle >= after && bend < 0 ? (before - after) / (2 * bend) : 0;
}
