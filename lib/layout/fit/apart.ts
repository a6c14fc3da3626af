/**
 * Whether the saw gets between two pieces. They come apart by a crosscut when there is room for its loss between them along
 * the board, or by a rip when there is room across it; room equal to the loss is enough. The loss is the kerf and the
 * clean-up of the two edges that face each other.
 */
import type { FaceLayout } from "../pattern/face-layout";
import type { LyingPiece } from "./lying-piece";
import { roomBetween, type Span, type StockAxis } from "./span";

export type Kerfs = Readonly<Record<StockAxis, number>>;

/** The kerf that parts pieces along the board is the crosscut's, across it the rip's. */
export function kerfsOf({ crosscut, rip }: Pick<FaceLayout, "crosscut" | "rip">): Kerfs {
  return { along: crosscut.kerf, across: rip.kerf };
}

/** µm that are missing between two pieces of one board, by the cut that needs fewer; 0 when the saw gets through. */
export function missingBetween(a: LyingPiece, b: LyingPiece, kerfs: Kerfs): number {
  return Math.max(0, Math.min(missingOn("along", a, b, kerfs), missingOn("across", a, b, kerfs)));
}

/** Moves of `a` along one axis that bring it too close to `b`; none while they pass each other on the other axis. */
export function movesTooClose(a: LyingPiece, b: LyingPiece, axis: StockAxis, kerfs: Kerfs): Span | null {
  if (missingOn(axis === "along" ? "across" : "along", a, b, kerfs) <= 0) return null;
  const mine = a.spans[axis];
  const other = b.spans[axis];
  return { from: other.from - lossBefore(axis, a, b, kerfs) - mine.to, to: other.to + lossBefore(axis, b, a, kerfs) - mine.from };
}

/** What the cut takes where `first` lies nearer the origin than `second`. */
export function lossBefore(axis: StockAxis, first: LyingPiece, second: LyingPiece, kerfs: Kerfs): number {
  return axis === "along"
    ? kerfs.along + first.cleanUp.right + second.cleanUp.left
    : kerfs.across + first.cleanUp.bottom + second.cleanUp.top;
}

function missingOn(axis: StockAxis, a: LyingPiece, b: LyingPiece, kerfs: Kerfs): number {
  const aFirst = a.spans[axis].from + a.spans[axis].to <= b.spans[axis].from + b.spans[axis].to;
  const loss = aFirst ? lossBefore(axis, a, b, kerfs) : lossBefore(axis, b, a, kerfs);
  return loss - roomBetween(a.spans[axis], b.spans[axis]);
}
