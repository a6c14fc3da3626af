/**
 * A run folded round its corners, seen from above: where each side stands in plan. The first side starts at the origin and runs to
 * the right (x); y points down, the run turns clockwise, so its show faces look outward to the left of the way it goes. A gap turns
 * in its middle. Real numbers, µm: for drawing and for telling whether a closed run closes, not for cutting.
 */
import type { PieceId } from "../../piece";
import type { WrapCorner, WrapFace } from "../face";
import { pieceIdAt } from "../piece-names";
import { hungGapOf, innerBeyond } from "./corner-loss";
import { cornersOf } from "./wrap-rules";

export interface PlanPoint {
  readonly x: number;
  readonly y: number;
}

/** A side in plan: the ends of its show face and of its inner face. */
export interface FoldedSide {
  readonly piece: PieceId;
  /** The way it runs, clockwise from right, degrees, as turned since the first side: not brought below 360. */
  readonly directionDeg: number;
  readonly show: { readonly from: PlanPoint; readonly to: PlanPoint };
  readonly inner: { readonly from: PlanPoint; readonly to: PlanPoint };
}

export interface Fold {
  readonly sides: readonly FoldedSide[];
  /** Where the next side would start, and the way it would run: the start of the first, turned once round, where a closed run closes. */
  readonly end: { readonly at: PlanPoint; readonly directionDeg: number };
}

export function foldOf(face: WrapFace): Fold {
  let [at, directionDeg]: [PlanPoint, number] = [{ x: 0, y: 0 }, 0];
  const sides = face.sides.map((length, side): FoldedSide => {
    const from = at;
    const to = moved(from, directionDeg, length);
    const [near, far] = cornersOf(face, side);
    const folded = {
      piece: pieceIdAt(side),
      directionDeg,
      show: { from, to },
      inner: innerOf(face, { from, to }, directionDeg, [near, far]),
    };
    const corner = face.corners[side];
    if (corner !== undefined) {
      const [before, after] = aroundCorner(corner, face);
      at = moved(moved(to, directionDeg, before), directionDeg + corner.turnDeg, after);
      directionDeg += corner.turnDeg;
    } else at = to;
    return folded;
  });
  return { sides, end: { at, directionDeg } };
}

/** From the show edge of the side before to where the show faces would meet, and from there to the show edge of the side after. */
function aroundCorner(corner: WrapCorner, { thickness }: WrapFace): readonly [number, number] {
  const gap = hungGapOf(corner, thickness);
  if (corner.kind !== "butt") return [gap / 2, gap / 2];
  return corner.covers === "before" ? [0, gap] : [gap, 0];
}

function innerOf(
  { thickness }: WrapFace,
  { from, to }: FoldedSide["show"],
  directionDeg: number,
  [near, far]: readonly [WrapCorner | null, WrapCorner | null],
): FoldedSide["inner"] {
  const beyond = (corner: WrapCorner | null) => (corner === null ? 0 : innerBeyond(corner, thickness));
  const inward = (point: PlanPoint) => moved(point, directionDeg + 90, thickness);
  return {
    from: inward(moved(from, directionDeg, -beyond(near))),
    to: inward(moved(to, directionDeg, beyond(far))),
  };
}

function moved({ x, y }: PlanPoint, directionDeg: number, by: number): PlanPoint {
  const direction = (directionDeg * Math.PI) / 180;
  return { x: x + by * Math.cos(direction), y: y + by * Math.sin(direction) };
}
