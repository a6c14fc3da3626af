/** The seam between two neighbours on the face, from the rectangles in which they hang. */
import type { FaceRect } from "../frame/point";
import { um } from "../units/um";
import type { SeamPlace } from "./pattern-rules";
import { pieceIdAt } from "./piece-names";

/** A piece by its place in reading order. */
export interface Neighbour {
  readonly index: number;
  readonly rect: FaceRect;
}

/** B hangs right of A, or below it; the seam is the stretch in which the two face each other. */
export function seamBetween(a: Neighbour, b: Neighbour, normal: SeamPlace["normal"]): SeamPlace {
  const names = { a: pieceIdAt(a.index), b: pieceIdAt(b.index), normal };
  if (normal === "right") {
    const x = um(a.rect.x + a.rect.width);
    const from = { x, y: um(Math.max(a.rect.y, b.rect.y)) };
    const to = { x, y: um(Math.min(a.rect.y + a.rect.height, b.rect.y + b.rect.height)) };
    return { ...names, from, to, facing: { x: b.rect.x, y: from.y }, gap: um(b.rect.x - x) };
  }
  const y = um(a.rect.y + a.rect.height);
  const from = { x: um(Math.max(a.rect.x, b.rect.x)), y };
  const to = { x: um(Math.min(a.rect.x + a.rect.width, b.rect.x + b.rect.width)), y };
  return { ...names, from, to, facing: { x: from.x, y: b.rect.y }, gap: um(b.rect.y - y) };
}

/** By the first piece, the seam on its right before the one below it, then by the second piece. */
export function inReadingOrder(seams: readonly SeamPlace[]): SeamPlace[] {
  const rank = ({ normal }: SeamPlace) => (normal === "right" ? 0 : 1);
  const number = (id: string) => Number(id.slice(1));
  return [...seams].sort((p, q) => number(p.a) - number(q.a) || rank(p) - rank(q) || number(p.b) - number(q.b));
}
