/**
 * Every seam of a face, with its jump found from the piece maps:
 *
 *   J(p) = M_B(q) − M_A(p) − L_A(g·n),   q = p + g·n
 *
 * A and B neighbours, g the gap, n the direction from A to B, L_A the linear part of M_A. J is a vector in the frame of the stock
 * (along the grain, across it), zero where the two pieces hang as windows in an uncut board. J is linear in p, so its extremes
 * over a seam lie at the two ends.
 */
import { toStock } from "../frame/apply-isometry";
import { turnedVector } from "../frame/combine-isometries";
import type { FacePoint } from "../frame/point";
import type { FaceLayout, GridFace } from "../pattern/face-layout";
import { faceGrid, type Grid, rectAt } from "../pattern/grids";
import { layOut } from "../pattern/lay-out";
import { type GridPlace, pieceIdAt } from "../pattern/piece-ids";
import type { Piece, PieceId } from "../piece";
import { type Um, um } from "../units/um";
import type { Seam, UmRange } from "./seam";

/** The seams in reading order of their first piece, the one on its right before the one below it. */
export function seams(layout: FaceLayout, pieces: readonly Piece[] = layOut(layout)): Seam[] {
  const { face } = layout;
  const grid = faceGrid(face);
  const byId = new Map(pieces.map((piece) => [piece.id, piece]));
  return face.rows.flatMap((_, row) =>
    face.columns.flatMap((_, column) => {
      const place = { row, column };
      return [seamRight(face, grid, byId, place), seamDown(face, grid, byId, place)].filter((seam) => seam !== null);
    }),
  );
}

type PiecesById = ReadonlyMap<PieceId, Piece>;

function seamRight(face: GridFace, grid: Grid, byId: PiecesById, { row, column }: GridPlace): Seam | null {
  if (column + 1 >= face.columns.length) return null;
  const rect = rectAt(grid, { row, column });
  const from = { x: um(rect.x + rect.width), y: rect.y };
  const to = { x: from.x, y: um(rect.y + rect.height) };
  const first = row * face.columns.length + column;
  return seamBetween(byId, pieceIdAt(first), pieceIdAt(first + 1), {
    from,
    to,
    gap: face.columnGaps[column] ?? um(0),
    normal: "right",
  });
}

function seamDown(face: GridFace, grid: Grid, byId: PiecesById, { row, column }: GridPlace): Seam | null {
  if (row + 1 >= face.rows.length) return null;
  const rect = rectAt(grid, { row, column });
  const from = { x: rect.x, y: um(rect.y + rect.height) };
  const to = { x: um(rect.x + rect.width), y: from.y };
  const first = row * face.columns.length + column;
  const below = first + face.columns.length;
  return seamBetween(byId, pieceIdAt(first), pieceIdAt(below), { from, to, gap: face.rowGaps[row] ?? um(0), normal: "down" });
}

type SeamPlace = Pick<Seam, "from" | "to" | "gap" | "normal">;

function seamBetween(byId: PiecesById, a: PieceId, b: PieceId, place: SeamPlace): Seam {
  const pieceA = byId.get(a);
  const pieceB = byId.get(b);
  const sameStock = pieceA !== undefined && pieceB !== undefined && pieceA.stockId === pieceB.stockId;
  return { a, b, ...place, jump: sameStock ? jumpOver(pieceA, pieceB, place) : null };
}

function jumpOver(a: Piece, b: Piece, { from, to, gap, normal }: SeamPlace): { along: UmRange; across: UmRange } {
  const overGap = normal === "right" ? { x: gap, y: 0 } : { x: 0, y: gap };
  const inWood = turnedVector(a.stockFromFace, overGap.x, overGap.y);
  const jumpAt = (p: FacePoint) => {
    const onA = toStock(a.stockFromFace, p);
    const onB = toStock(b.stockFromFace, { x: um(p.x + overGap.x), y: um(p.y + overGap.y) });
    return { along: um(Math.round(onB.x - onA.x - inWood.x)), across: um(Math.round(onB.y - onA.y - inWood.y)) };
  };
  const start = jumpAt(from);
  const end = jumpAt(to);
  return { along: rangeOf(start.along, end.along), across: rangeOf(start.across, end.across) };
}

function rangeOf(p: Um, q: Um): UmRange {
  return p <= q ? { min: p, max: q } : { min: q, max: p };
}
