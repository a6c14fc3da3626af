/** The pieces of a cut-out in reading order, and where each hangs once the rail is glued up and the fronts are in their openings. */
import type { FaceRect } from "../../frame/point";
import type { CutOutFace } from "../face";
import { startsOf } from "../run";
import { bySide, rectOnFace, type Stretch } from "./rail-axes";

export type CutOutPiece =
  | { readonly role: "strip"; readonly strip: number }
  | { readonly role: "fixed" | "front"; readonly row: number; readonly part: number };

export function piecesOfCutOut(face: CutOutFace): CutOutPiece[] {
  return face.strips.flatMap((_, strip): CutOutPiece[] => [
    { role: "strip", strip },
    ...(face.rows[strip]?.parts ?? []).map(({ kind }, part): CutOutPiece => ({ role: kind, row: strip, part })),
  ]);
}

export function countOfCutOut({ strips, rows }: CutOutFace): number {
  return rows.reduce((count, { parts }) => count + parts.length, strips.length);
}

/** Place in reading order of a part of a row. */
export function indexOfPart({ rows }: CutOutFace, row: number, part: number): number {
  return rows.slice(0, row).reduce((count, { parts }) => count + parts.length, row + 1 + part);
}

/** Finished length of a row along the grain. */
export function lengthOfRow(face: CutOutFace, row: number): number {
  return (face.rows[row]?.parts ?? []).reduce((sum, { width }) => sum + width, 0);
}

/** Where each strip and each row of openings starts across the grain, as glued up. */
export function startsAcross({ strips, rows }: CutOutFace): {
  readonly strips: readonly number[];
  readonly rows: readonly number[];
} {
  const starts: { strips: number[]; rows: number[] } = { strips: [], rows: [] };
  let next = 0;
  for (const [index, strip] of strips.entries()) {
    starts.strips.push(next);
    starts.rows.push(next + strip);
    next += strip + (rows[index]?.height ?? 0);
  }
  return starts;
}

/** Where each part of a row starts along the grain, as glued up: a fixed part's own end, or the edge of an opening. */
export function startsAlong({ rows }: CutOutFace, row: number): readonly number[] {
  return startsOf({ sizes: (rows[row]?.parts ?? []).map(({ width }) => width), between: [] });
}

/** The stretches that a piece fills as hung. */
export function hungStretches(face: CutOutFace, piece: CutOutPiece): { readonly along: Stretch; readonly across: Stretch } {
  const starts = startsAcross(face);
  if (piece.role === "strip") {
    const across = { start: starts.strips[piece.strip] ?? 0, size: face.strips[piece.strip] ?? 0 };
    return { along: { start: 0, size: lengthOfRow(face, 0) }, across };
  }
  const row = face.rows[piece.row];
  const opening = {
    along: { start: startsAlong(face, piece.row)[piece.part] ?? 0, size: row?.parts[piece.part]?.width ?? 0 },
    across: { start: starts.rows[piece.row] ?? 0, size: row?.height ?? 0 },
  };
  if (piece.role === "fixed") return opening;
  const { near, far, above, below } = bySide(face.gap, face.grain);
  return { along: inset(opening.along, near, far), across: inset(opening.across, above, below) };
}

export function hungRect(face: CutOutFace, piece: CutOutPiece): FaceRect {
  const { along, across } = hungStretches(face, piece);
  return rectOnFace(face.grain, along, across);
}

function inset({ start, size }: Stretch, before: number, after: number): Stretch {
  return { start: start + before, size: size - before - after };
}
