/**
 * The gaps of a face that may open and close: between two fronts or two sides of a run, between a front and the rail it was cut from,
 * and, where a gap round the fronts is given, between the outermost fronts and what stands round them. Joints move as one. A gap at a
 * corner is taken as on the unfolded run, along which its two sides move.
 */

import { seamPlaces } from "../pattern/charts";
import type { FaceLayout } from "../pattern/face-layout";
import { type FacePiece, facePieces } from "../pattern/lay-out";
import { rulesOf } from "../pattern/rules-of";
import type { PieceId } from "../piece";
import { type Um, um } from "../units/um";

export type FaceSide = "left" | "right" | "top" | "bottom";

export interface FaceGap {
  readonly a: PieceId;
  /** The piece on the other side of the gap, or the side of the face where the surround begins. */
  readonly b: { readonly piece: PieceId } | { readonly side: FaceSide };
  /** The line across the gap. */
  readonly runs: "sideways" | "upright";
  /** As it is cut today. */
  readonly gap: Um;
  /** From where a front is held, its middle, to its edge at the gap; 0 for what stands round it. */
  readonly reachA: Um;
  readonly reachB: Um;
  /** The part of the rail that stands at the gap and is cut from the layout's own wood; null where it is a front on either side. */
  readonly rail: PieceId | null;
}

/** `around`: the gap round the fronts, null where there is none. Seams in their order first, then the sides in reading order. */
export function faceGaps(layout: FaceLayout, around: Um | null): FaceGap[] {
  const pieces = facePieces(layout);
  const byId = new Map(pieces.map((piece) => [piece.id, piece]));
  const open = rulesOf(layout.face).openSeams?.(layout.face);
  const between = seamPlaces(layout.face).flatMap(({ a, b, gap, normal }, index) => {
    const [first, second] = [byId.get(a), byId.get(b)];
    if (gap <= 0 || open?.[index] === false || first === undefined || second === undefined) return [];
    return gapBetween(first, second, gap, normal === "right" ? "sideways" : "upright");
  });
  return around === null ? between : [...between, ...gapsAround(pieces, around)];
}

const isRail = ({ role }: FacePiece) => role === "strip" || role === "fixed";

function gapBetween(a: FacePiece, b: FacePiece, gap: Um, runs: FaceGap["runs"]): FaceGap[] {
  if (isRail(a) && isRail(b)) return [];
  const rail = [a, b].find(isRail)?.id ?? null;
  return [{ a: a.id, b: { piece: b.id }, runs, gap, reachA: reach(a, runs), reachB: reach(b, runs), rail }];
}

function gapsAround(pieces: readonly FacePiece[], around: Um): FaceGap[] {
  const right = Math.max(...pieces.map(({ rect }) => rect.x + rect.width));
  const bottom = Math.max(...pieces.map(({ rect }) => rect.y + rect.height));
  return pieces.flatMap((piece): FaceGap[] => {
    if (piece.role !== "front") return [];
    const { x, y, width, height } = piece.rect;
    const outermost: Record<FaceSide, boolean> = {
      left: x === 0,
      right: x + width === right,
      top: y === 0,
      bottom: y + height === bottom,
    };
    return (["left", "right", "top", "bottom"] as const)
      .filter((side) => outermost[side])
      .map((side) => {
        const runs = side === "left" || side === "right" ? "sideways" : "upright";
        return { a: piece.id, b: { side }, runs, gap: around, reachA: reach(piece, runs), reachB: um(0), rail: null };
      });
  });
}

/** Half of a front along the line, rounded up: the more of it moves, the safer the gap. */
function reach(piece: FacePiece, runs: FaceGap["runs"]): Um {
  if (isRail(piece)) return um(0);
  return um(Math.ceil((runs === "sideways" ? piece.rect.width : piece.rect.height) / 2));
}
