/** A group laid with its corner in the first cell of a board, from where every place of the search is a shift by whole cells. */
import { type Kerfs, kerfsOf } from "../fit/apart";
import { type LyingPiece, lyingPieces } from "../fit/lying-piece";
import { movedSpans, type Span, type Spans, type StockAxis } from "../fit/span";
import type { FaceLayout, QuarterTurns } from "../pattern/face-layout";
import { groupBounds, placeGroup } from "../pattern/place-group";
import type { StockId } from "../piece";
import { um } from "../units/um";
import { GRID_UM } from "./grid";

/** Where the corner lies within its cell, µm, 0 … 499; zero for places on the grid. */
export interface Phase {
  readonly x: number;
  readonly y: number;
}

export const ON_GRID: Phase = { x: 0, y: 0 };

export interface LaidGroup {
  readonly layout: FaceLayout;
  readonly turns: QuarterTurns;
  readonly phase: Phase;
  /** Its pieces in reading order, the corner of their bounds at the phase. */
  readonly lying: readonly LyingPiece[];
  /** Around all that is sawn for them. */
  readonly blank: Spans;
  /** Bounds of the finished pieces. */
  readonly size: { readonly along: number; readonly across: number };
  /** Pieces of other groups on the same board, where they lie. */
  readonly others: readonly LyingPiece[];
  readonly kerfs: Kerfs;
}

/** `apart`: groups that are no obstacles, because they move too. Throws on a group that the layout does not have. */
export function layGroup(
  layout: FaceLayout,
  groupId: string,
  on: { readonly stockId: StockId; readonly turns: QuarterTurns; readonly phase?: Phase; readonly apart?: ReadonlySet<string> },
): LaidGroup {
  const { stockId, turns, phase = ON_GRID, apart = new Set<string>() } = on;
  const laid = placeGroup(layout, groupId, stockId, { x: um(phase.x), y: um(phase.y) }, turns);
  if (!laid.ok) throw new RangeError(`no group ${groupId} to lay`);
  const all = lyingPieces(laid.layout);
  const lying = all.filter((piece) => piece.groupId === groupId);
  const bounds = groupBounds(laid.layout, groupId);
  return {
    layout: laid.layout,
    turns,
    phase,
    lying,
    blank: { along: around(lying, "along"), across: around(lying, "across") },
    size: { along: bounds?.width ?? 0, across: bounds?.height ?? 0 },
    others: all.filter((piece) => piece.stockId === stockId && piece.groupId !== groupId && !apart.has(piece.groupId)),
    kerfs: kerfsOf(layout),
  };
}

/** A piece moved by whole cells. */
export function pieceAt(piece: LyingPiece, column: number, row: number): LyingPiece {
  const [x, y] = [column * GRID_UM, row * GRID_UM];
  const moved = (spans: Spans) => movedSpans(movedSpans(spans, "along", x), "across", y);
  return { ...piece, spans: moved(piece.spans), blank: moved(piece.blank) };
}

function around(lying: readonly LyingPiece[], axis: StockAxis): Span {
  return {
    from: Math.min(...lying.map(({ blank }) => blank[axis].from)),
    to: Math.max(...lying.map(({ blank }) => blank[axis].to)),
  };
}
