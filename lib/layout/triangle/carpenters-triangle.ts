/**
 * The carpenter's triangle: one triangle drawn across the whole face, so that each piece carries its own part of it and the
 * set goes together one way only. Cut here into the line segments on each piece, on the face and in the wood. What falls into
 * a gap is on no piece.
 *
 * Every front of a row or a stack carries part of it. On a larger grid a front beside the apex may carry none: its label
 * alone places it.
 */
import { toStock } from "../frame/apply-isometry";
import type { FacePoint, FaceRect, StockPoint } from "../frame/point";
import { faceSize } from "../pattern/charts";
import type { FaceLayout } from "../pattern/face-layout";
import { facePieces, layOut } from "../pattern/lay-out";
import type { Piece, PieceId } from "../piece";
import { type Um, um } from "../units/um";

/** Base edge = bottom, or right-hand end, of the face. */
export type TriangleBase = "bottom" | "right";

/** `first` and `second`: the sides from the apex to the left or upper, and to the right or lower, end of the base. */
export type TriangleSide = "first" | "second" | "base";

export interface TriangleSegment {
  readonly side: TriangleSide;
  readonly from: FacePoint;
  readonly to: FacePoint;
  /** The same segment in the stock frame; null while the piece is not laid on wood. */
  readonly inWood: { readonly from: StockPoint; readonly to: StockPoint } | null;
}

export interface TriangleMark {
  readonly piece: PieceId;
  readonly segments: readonly TriangleSegment[];
}

/**
 * The triangle stays this share of the shorter side of the face away from its edges, so that the base is a line on the wood,
 * not its edge.
 */
export const TRIANGLE_INSET = 1 / 12;

/** The part of the triangle on every piece, in reading order. */
export function carpentersTriangle(
  layout: FaceLayout,
  base: TriangleBase = "bottom",
  pieces: readonly Piece[] = layOut(layout),
): TriangleMark[] {
  const lines = triangleLines(layout, base);
  const mapById = new Map(pieces.map((piece) => [piece.id, piece.stockFromFace]));
  return facePieces(layout).map(({ id, rect }) => {
    const map = mapById.get(id);
    const segments = lines.flatMap((line): TriangleSegment[] => {
      const cut = clippedTo(rect, line);
      if (cut === null) return [];
      const inWood = map === undefined ? null : { from: toStock(map, cut.from), to: toStock(map, cut.to) };
      return [{ side: line.side, ...cut, inWood }];
    });
    return { piece: id, segments };
  });
}

/** The three corners on the face: apex, then the ends of the base. */
export function triangleCorners(
  layout: Pick<FaceLayout, "face">,
  base: TriangleBase = "bottom",
): [FacePoint, FacePoint, FacePoint] {
  const { width, height } = faceSize(layout.face);
  const inset = Math.round(Math.min(width, height) * TRIANGLE_INSET);
  const [left, right, top, bottom] = [um(inset), um(width - inset), um(inset), um(height - inset)];
  if (base === "bottom") {
    return [
      { x: middle(width), y: top },
      { x: left, y: bottom },
      { x: right, y: bottom },
    ];
  }
  return [
    { x: left, y: middle(height) },
    { x: right, y: top },
    { x: right, y: bottom },
  ];
}

interface Line {
  readonly side: TriangleSide;
  readonly from: FacePoint;
  readonly to: FacePoint;
}

function triangleLines(layout: FaceLayout, base: TriangleBase): Line[] {
  const [apex, first, second] = triangleCorners(layout, base);
  return [
    { side: "first", from: apex, to: first },
    { side: "second", from: apex, to: second },
    { side: "base", from: first, to: second },
  ];
}

/**
 * The part of a line inside a rectangle, edges included (Liang and Barsky 1984); null where it only passes by or touches a
 * corner.
 */
function clippedTo(rect: FaceRect, { from, to }: Line): { from: FacePoint; to: FacePoint } | null {
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  let [enter, leave] = [0, 1];
  for (const [room, slope] of [
    [from.x - rect.x, dx],
    [rect.x + rect.width - from.x, -dx],
    [from.y - rect.y, dy],
    [rect.y + rect.height - from.y, -dy],
  ] as const) {
    if (slope === 0 && room < 0) return null;
    if (slope > 0) enter = Math.max(enter, -room / slope);
    if (slope < 0) leave = Math.min(leave, room / -slope);
  }
  const pointAt = (t: number): FacePoint => ({ x: um(Math.round(from.x + t * dx)), y: um(Math.round(from.y + t * dy)) });
  return enter < leave ? { from: pointAt(enter), to: pointAt(leave) } : null;
}

function middle(size: Um): Um {
  return um(Math.floor(size / 2));
}
