/**
 * One side of a board as a search sees it, and what is worked out about it once: sums of its picture, what of it could be kept.
 *
 * The back of a board has a frame of its own: turned over about its long axis, y_back = width − y_face. Outline, areas and wood that
 * is spoken for are given in the frame of their side.
 */
import type { Kerfs } from "../fit/apart";
import type { LyingPiece } from "../fit/lying-piece";
import type { BoardFace } from "../stock/board";
import type { Um } from "../units/um";
import { firstCell } from "./grid";
import { type LeastRest, type RestTable, restTable } from "./largest-rest";
import { type BoundedArea, boundedArea } from "./place-areas";
import type { SearchPicture } from "./search-picture";
import type { Slices } from "./slices";
import { usableCells } from "./usable-cells";
import { type WoodSums, woodSums } from "./wood-sums";

export type SideName = "face" | "back";

export interface BoardSide {
  readonly side: SideName;
  readonly board: BoardFace;
  /** Of this side; made for this board's size. */
  readonly picture: SearchPicture;
}

/** The smallest offcut worth keeping, along and across the grain. */
export interface LeastOffcut {
  readonly along: Um;
  readonly across: Um;
}

export function leastCells({ along, across }: LeastOffcut): LeastRest {
  return { along: Math.max(1, firstCell(along)), across: Math.max(1, firstCell(across)) };
}

export interface SideTables extends BoardSide {
  readonly wood: WoodSums;
  readonly areas: readonly BoundedArea[];
  readonly rest: RestTable;
}

/** In slices. `taken`: pieces that lie on this side and stay. */
export function* sideTables(side: BoardSide, taken: readonly LyingPiece[], kerfs: Kerfs, least: LeastOffcut): Slices<SideTables> {
  const wood = woodSums(side.picture);
  yield 0;
  const cells = yield* usableCells(side.board, taken, kerfs);
  const rest = yield* restTable(cells, leastCells(least));
  return { ...side, wood, areas: side.board.keepClear.map(({ area }) => boundedArea(area)), rest };
}
