/**
 * Every seam of a face, with its jump found from the piece maps:
 *
 *   J(p) = M_B(q) − M_A(p) − L_A(g·n),   q = p + g·n
 *
 * A and B neighbours, g the gap, n the direction from A to B, L_A the linear part of M_A. J is a vector in the frame of the stock
 * (along the grain, across it), zero where the two pieces hang as windows in an uncut board. Where one of the two is mirrored the
 * figure mirrors at the seam, so there J(p) = M_B(q) − M_A(p): zero where the two edges show the same line of the wood. J is linear
 * in p, so its extremes over a seam lie at the two ends. What shows from below the photographed face is counted from where the
 * photograph has it (`figureOffsets`).
 */
import { toStock } from "../frame/apply-isometry";
import { turnedVector } from "../frame/combine-isometries";
import type { Isometry } from "../frame/isometry";
import type { FacePoint } from "../frame/point";
import { seamPlaces } from "../pattern/charts";
import type { FaceLayout } from "../pattern/face-layout";
import { layOut } from "../pattern/lay-out";
import type { SeamPlace } from "../pattern/pattern-rules";
import { pieceIdAt } from "../pattern/piece-names";
import { rulesOf } from "../pattern/rules-of";
import { slotsOf } from "../pattern/slots";
import type { Piece, PieceId } from "../piece";
import { type Um, um } from "../units/um";
import type { Seam, UmRange } from "./seam";

/** The seams in reading order of their first piece, the one on its right before the one below it. */
export function seams(layout: FaceLayout, pieces: readonly Piece[] = layOut(layout)): Seam[] {
  const byId = new Map(pieces.map((piece) => [piece.id, piece]));
  const offsetOf = figureOffsets(layout);
  return seamPlaces(layout.face).map((place) => {
    const [a, b] = [byId.get(place.a), byId.get(place.b)];
    if (a === undefined || b === undefined || a.stockId !== b.stockId) return { ...place, jump: null };
    const [offsetA, offsetB] = [offsetOf(a.id), offsetOf(b.id)];
    if (offsetA === null || offsetB === null) return { ...place, jump: null };
    return { ...place, jump: jumpOver(a, b, place, offsetB - offsetA) };
  });
}

/** `deeper`: how much farther across the photograph has B's figure than A's, for what they show below the photographed face. */
function jumpOver(a: Piece, b: Piece, place: SeamPlace, deeper: number): NonNullable<Seam["jump"]> {
  const { from, to, facing } = place;
  const mirrors = handOf(a.stockFromFace) !== handOf(b.stockFromFace);
  const inWood = mirrors ? { x: 0, y: 0 } : woodOfGap(a.stockFromFace, place);
  const jumpAt = (p: FacePoint) => {
    const onA = toStock(a.stockFromFace, p);
    const onB = toStock(b.stockFromFace, { x: um(p.x + facing.x - from.x), y: um(p.y + facing.y - from.y) });
    return { along: um(Math.round(onB.x - onA.x - inWood.x)), across: um(Math.round(onB.y - onA.y - inWood.y + deeper)) };
  };
  const start = jumpAt(from);
  const end = jumpAt(to);
  return { along: rangeOf(start.along, end.along), across: rangeOf(start.across, end.across) };
}

function figureOffsets(layout: FaceLayout): (id: PieceId) => Um | null {
  const offsets = rulesOf(layout.face).figureOffsets?.(layout.face);
  if (offsets === undefined) return () => um(0);
  const slots = new Map(layout.groups.flatMap((group) => [...slotsOf(group)]));
  const byPlace = new Map(offsets.map((offset, index) => [pieceIdAt(index), offset]));
  return (id) => byPlace.get(slots.get(id) ?? id) ?? null;
}

/** 1, or −1 where the map mirrors. */
function handOf({ a, b, c, d }: Isometry): number {
  return Math.sign(a * d - b * c);
}

function woodOfGap(a: Isometry, { gap, normal }: SeamPlace): { readonly x: number; readonly y: number } {
  return normal === "right" ? turnedVector(a, gap, 0) : turnedVector(a, 0, gap);
}

function rangeOf(p: Um, q: Um): UmRange {
  return p <= q ? { min: p, max: q } : { min: q, max: p };
}
