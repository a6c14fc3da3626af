/** The cells of an edge's profile: those of the outermost 4 mm of the piece along the stretch that faces its neighbour. */
import type { LyingPiece } from "../fit/lying-piece";
import { toStock } from "../frame/apply-isometry";
import { turnedVector } from "../frame/combine-isometries";
import type { FacePoint } from "../frame/point";
import type { Piece } from "../piece";
import type { Seam } from "../seam/seam";
import { um } from "../units/um";
import { DEPTH_CELLS } from "./correlation";
import { endCell, firstCell } from "./grid";
import type { SearchPicture } from "./search-picture";

/** In cells, wholly inside the piece. `reversed`: from `from` to `to` the seam runs against y of the stock. */
export interface ProfileWindow {
  readonly column: number;
  readonly depth: number;
  readonly row: number;
  readonly rows: number;
  readonly reversed: boolean;
}

/**
 * The window of one side of a seam; null where the seam runs along the grain in this wood, or the piece is less than a cell
 * deep. `side`: which of the two pieces of the seam this is.
 */
export function profileWindow(
  seam: Seam,
  side: "a" | "b",
  { stockFromFace }: Piece,
  { spans }: LyingPiece,
): ProfileWindow | null {
  const step = seam.normal === "right" ? { x: 1, y: 0 } : { x: 0, y: 1 };
  const onEdge = (point: FacePoint): FacePoint =>
    side === "a" ? point : { x: um(point.x + step.x * seam.gap), y: um(point.y + step.y * seam.gap) };
  const [from, to] = [toStock(stockFromFace, onEdge(seam.from)), toStock(stockFromFace, onEdge(seam.to))];
  if (from.x !== to.x || from.y === to.y) return null;
  const normal = turnedVector(stockFromFace, step.x, step.y).x;
  const inward = side === "a" ? -normal : normal;
  const [first, end] =
    inward < 0
      ? [Math.max(firstCell(spans.along.from), endCell(from.x) - DEPTH_CELLS), endCell(from.x)]
      : [firstCell(from.x), Math.min(endCell(spans.along.to), firstCell(from.x) + DEPTH_CELLS)];
  if (end - first < 1) return null;
  const row = firstCell(Math.min(from.y, to.y));
  const rows = endCell(Math.max(from.y, to.y)) - row;
  return { column: first, depth: end - first, row, rows, reversed: to.y < from.y };
}

export function liesIn({ width, height }: SearchPicture, { column, depth, row, rows }: ProfileWindow): boolean {
  return column >= 0 && column + depth <= width && row >= 0 && row + rows <= height;
}

/** The grey of each row of a window added up, in the direction of y. */
export function profileIn({ height, grey }: SearchPicture, { column, depth, row, rows }: ProfileWindow): Int32Array {
  const profile = new Int32Array(rows);
  for (let x = column; x < column + depth; x++) {
    for (let y = 0; y < rows; y++) profile[y] = (profile[y] as number) + (grey[x * height + row + y] as number);
  }
  return profile;
}
