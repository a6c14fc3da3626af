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
import type { Isometry } from "../frame/isometry";
import type { FacePoint } from "../frame/point";
import { seamPlaces } from "../pattern/charts";
import type { FaceLayout } from "../pattern/face-layout";
import { layOut } from "../pattern/lay-out";
import type { SeamPlace } from "../pattern/pattern-rules";
import type { Piece } from "../piece";
import { type Um, um } from "../units/um";
import type { Seam, UmRange } from "./seam";

/** The seams in reading order of their first piece, the one on its right before the one below it. */
export function seams(layout: FaceLayout, pieces: readonly Piece[] = layOut(layout)): Seam[] {
  const byId = new Map(pieces.map((piece) => [piece.id, piece]));
  return seamPlaces(layout.face).map((place) => ({ ...place, jump: jumpOver(byId.get(place.a), byId.get(place.b), place) }));
}

function jumpOver(a: Piece | undefined, b: Piece | undefined, place: SeamPlace): Seam["jump"] {
  if (a === undefined || b === undefined || a.stockId !== b.stockId) return null;
  const { from, to, facing } = place;
  const inWood = woodOfGap(a.stockFromFace, place);
  const jumpAt = (p: FacePoint) => {
    const onA = toStock(a.stockFromFace, p);
    const onB = toStock(b.stockFromFace, { x: um(p.x + facing.x - from.x), y: um(p.y + facing.y - from.y) });
    return { along: um(Math.round(onB.x - onA.x - inWood.x)), across: um(Math.round(onB.y - onA.y - inWood.y)) };
  };
  const start = jumpAt(from);
  const end = jumpAt(to);
  return { along: rangeOf(start.along, end.along), across: rangeOf(start.across, end.across) };
}

function woodOfGap(a: Isometry, { gap, normal }: SeamPlace): { readonly x: number; readonly y: number } {
  return normal === "right" ? turnedVector(a, gap, 0) : turnedVector(a, 0, gap);
}

function rangeOf(p: Um, q: Um): UmRange {
  return p <= q ? { min: p, max: q } : { min: q, max: p };
}
