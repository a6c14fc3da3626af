/**
 * Sets of moves along one axis that are not allowed, as open intervals: a move to the very end of an interval touches what it
 * avoids, and touching is allowed. Real numbers, µm; the ends of the axis may be infinite.
 */
import { NOISE_UM } from "./noise";
import type { Span } from "./span";

/** Moves of `piece` after which it overlaps `obstacle` on this axis. */
export function movesInto(piece: Span, obstacle: Span): Span {
  return { from: obstacle.from - piece.to, to: obstacle.to - piece.from };
}

/** The union, in order; intervals that only touch stay apart, since the move between them is allowed. */
export function unionOf(intervals: readonly Span[]): Span[] {
  const sorted = intervals.filter(({ from, to }) => from < to).sort((p, q) => p.from - q.from || p.to - q.to);
  const union: Span[] = [];
  for (const next of sorted) {
    const last = union.at(-1);
    if (last !== undefined && next.from < last.to - NOISE_UM) {
      union[union.length - 1] = { from: last.from, to: Math.max(last.to, next.to) };
    } else {
      union.push(next);
    }
  }
  return union;
}

/** Whether a move lies inside one of the intervals; their ends are not inside. */
export function isForbidden(union: readonly Span[], move: number): boolean {
  return union.some(({ from, to }) => from + NOISE_UM < move && move < to - NOISE_UM);
}

/**
 * The shortest whole-micrometre move that is allowed, 0 when standing still is; the one towards the origin where two are
 * equally short; null when every move is forbidden.
 */
export function leastMove(union: readonly Span[]): number | null {
  if (!isForbidden(union, 0)) return 0;
  const ends = union.flatMap(({ from, to }) => [Math.floor(from + NOISE_UM), Math.ceil(to - NOISE_UM)]);
  const allowed = ends.filter((end) => Number.isFinite(end) && !isForbidden(union, end));
  allowed.sort((p, q) => Math.abs(p) - Math.abs(q) || p - q);
  return allowed[0] ?? null;
}
