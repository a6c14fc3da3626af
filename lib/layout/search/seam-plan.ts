/**
 * Which seams of a face a search can make better or worse, and the cells they are judged by. A seam counts when at least one of
 * its pieces moves and it runs across the grain of both; along the grain a seam's jump is the same wherever the group lies. Also
 * left out are seams that no place could change: shorter than 20 mm, to a neighbour without a picture, and between mirrored
 * leaves of a resawn pair.
 */
import type { PieceId, StockId } from "../piece";
import type { Seam } from "../seam/seam";
import { LEAST_ROWS } from "./correlation";
import { liesIn, type ProfileWindow, profileIn } from "./profile-window";
import type { SearchPicture } from "./search-picture";

/** Both pieces move: both windows shift with their pieces. */
export interface OwnSeam {
  readonly a: PieceId;
  readonly b: PieceId;
  readonly first: ProfileWindow;
  readonly second: ProfileWindow;
  readonly rows: number;
  /** The seam's own direction runs against y of the stock. */
  readonly reversed: boolean;
}

/** One piece moves, the other lies still. */
export interface FixedSeam {
  readonly a: PieceId;
  readonly b: PieceId;
  readonly moves: "a" | "b";
  readonly moving: ProfileWindow;
  readonly rows: number;
  /** The still edge's profile in the direction in which the moving one runs along y of its stock. */
  readonly still: Int32Array;
  readonly stillDepth: number;
}

/** How many seams of the moving pieces do not count, and why. */
export interface SeamsLeftOut {
  readonly notPlaced: number;
  readonly alongGrain: number;
  readonly tooShort: number;
  readonly noPicture: number;
  readonly mirrored: number;
}

export interface SeamPlan {
  readonly own: readonly OwnSeam[];
  readonly fixed: readonly FixedSeam[];
  readonly leftOut: SeamsLeftOut;
}

/** What the plan asks of the pieces: where their windows are, which of them move, and the picture that a still one is seen in. */
export interface SeamGround {
  readonly seams: readonly Seam[];
  readonly moves: (id: PieceId) => boolean;
  /** Null: the seam does not run across the grain of that piece. */
  readonly windowOf: (seam: Seam, side: "a" | "b") => ProfileWindow | null;
  /** Null: not laid on wood. */
  readonly stockOf: (id: PieceId) => StockId | null;
  readonly pictureOf: (stockId: StockId) => SearchPicture | null;
}

export function planSeams(ground: SeamGround): SeamPlan {
  const own: OwnSeam[] = [];
  const fixed: FixedSeam[] = [];
  const leftOut = { notPlaced: 0, alongGrain: 0, tooShort: 0, noPicture: 0, mirrored: 0 };
  for (const seam of ground.seams) {
    const [aMoves, bMoves] = [ground.moves(seam.a), ground.moves(seam.b)];
    if (!aMoves && !bMoves) continue;
    const [first, second] = [ground.windowOf(seam, "a"), ground.windowOf(seam, "b")];
    const rows = Math.min(first?.rows ?? 0, second?.rows ?? 0);
    if (ground.stockOf(seam.a) === null || ground.stockOf(seam.b) === null) leftOut.notPlaced++;
    else if (first === null || second === null) leftOut.alongGrain++;
    else if (rows < LEAST_ROWS) leftOut.tooShort++;
    else if (aMoves && bMoves) {
      if (areMirrored(first, second)) leftOut.mirrored++;
      else own.push({ a: seam.a, b: seam.b, first, second, rows, reversed: first.reversed });
    } else {
      const moves = aMoves ? "a" : "b";
      const [moving, other] = aMoves ? [first, second] : [second, first];
      const still = stillProfile(ground, aMoves ? seam.b : seam.a, other, moving, rows);
      if (still === null) leftOut.noPicture++;
      else fixed.push({ a: seam.a, b: seam.b, moves, moving, rows, still, stillDepth: other.depth });
    }
  }
  return { own, fixed, leftOut };
}

/**
 * The profile of an edge that stays, in the direction of the moving one, beginning where that begins; null without a picture, or
 * where the piece reaches over it.
 */
function stillProfile(
  ground: SeamGround,
  id: PieceId,
  still: ProfileWindow,
  moving: ProfileWindow,
  rows: number,
): Int32Array | null {
  const stockId = ground.stockOf(id);
  const picture = stockId === null ? null : ground.pictureOf(stockId);
  if (picture === null) return null;
  const opposed = still.reversed !== moving.reversed;
  const window = { ...still, row: opposed ? still.row + still.rows - rows : still.row, rows };
  if (!liesIn(picture, window)) return null;
  const profile = profileIn(picture, window);
  return opposed ? profile.reverse() : profile;
}

/** Two leaves of a resawn pair come from one place, seen from its two sides: one picture cannot tell them apart. */
function areMirrored(p: ProfileWindow, q: ProfileWindow): boolean {
  return p.reversed !== q.reversed || (p.column === q.column && p.row === q.row);
}
