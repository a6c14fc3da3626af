/**
 * Marks that cannot be a rectangle seen by a camera, or lie so badly that nothing can be made of them, refused with the reason
 * and how far it is off. Looks at four corners at a time; fitting and residuals are `fit-marking.ts`.
 */
import { fitHomography, type Mark } from "./fit-homography";
import { type Homography, invertHomography, jacobianAt, type PhotoPoint, stretches } from "./homography";
import type { PhotoSize } from "./lens";
import type { BoardEdge, FourCorners } from "./marking";

/** Whose corners: the board's or the sheet's. */
export type MarkedRectangle = "board" | "sheet";
/** 0 to 3 in the order of `FourCorners`. */
export type CornerIndex = 0 | 1 | 2 | 3;

export type MarksRefusal =
  /** The true size is below 10 mm or above 30 m. */
  | { readonly reason: "size"; readonly of: MarkedRectangle }
  /** A mark is not a number, or lies outside the photo by this much. */
  | {
      readonly reason: "outside-photo";
      readonly mark: "corner" | "sheet-corner" | "extra" | "edge";
      readonly index: number;
      readonly byPx: number;
    }
  /** The marked rectangle is too small in the photo: its shortest side against what is needed. */
  | { readonly reason: "tiny"; readonly of: MarkedRectangle; readonly sidePx: number; readonly neededPx: number }
  /** Two sides cross: two corners have changed places. */
  | { readonly reason: "folded"; readonly of: MarkedRectangle }
  /** Marked the other way round, which would show the wood in a mirror. */
  | { readonly reason: "mirrored"; readonly of: MarkedRectangle }
  /** This corner points inwards. */
  | { readonly reason: "not-convex"; readonly of: MarkedRectangle; readonly corner: CornerIndex }
  /** This corner lies almost on the line between its neighbours. */
  | { readonly reason: "in-line"; readonly of: MarkedRectangle; readonly corner: CornerIndex; readonly angleDeg: number }
  /** One corner would be so many times nearer to the camera than another. */
  | { readonly reason: "scale-varies"; readonly of: MarkedRectangle; readonly ratio: number; readonly limit: number }
  /** Lengths one way are so many times more px/mm than the other way: seen too flat, or length and width changed places. */
  | { readonly reason: "too-flat"; readonly of: MarkedRectangle; readonly ratio: number; readonly limit: number }
  /** The marks contradict each other or the sizes: the worst is off by this much. */
  | {
      readonly reason: "residual";
      readonly worst: "corner" | "extra" | "edge";
      readonly index: number;
      readonly mm: number;
      readonly limitMm: number;
    }
  /** An edge point lies far off the edge it is said to be on. */
  | {
      readonly reason: "edge-point-off";
      readonly index: number;
      readonly edge: BoardEdge;
      readonly mm: number;
      readonly limitMm: number;
    };

/** Nothing that is sawn or laid on a board as its measure is smaller, and no stock is larger. */
const SHORTEST_MM = 10;
const LONGEST_MM = 30_000;
/** A hand marks to about a pixel; a side of this many keeps the scale within some percent. */
const SHORTEST_SIDE_PX = 12;
/** Corners nearer than this to a straight line let a pixel's error swing the perspective. */
const FLATTEST_CORNER_DEG = 3;
/** Nearest against farthest corner. A 2.4 m board seen from 0.3 m before its end comes to about 8. */
export const GREATEST_DEPTH_RATIO = 10;
/** px/mm one way against the other at the middle: looking along the bench at less than about 9 degrees. */
const GREATEST_FLATNESS = 6.5;
/** A mark may sit a little outside the photo where a board runs into its rim, as a share of the diagonal. */
const OUTSIDE_ALLOWANCE = 0.02;

/** How far outside the photo the point lies, px; 0 inside and within the allowance; infinite for what is no number. */
export function outsidePhotoPx(p: PhotoPoint, photo: PhotoSize): number {
  if (!Number.isFinite(p.x) || !Number.isFinite(p.y)) return Number.POSITIVE_INFINITY;
  const by = Math.hypot(Math.max(0, -p.x, p.x - photo.width), Math.max(0, -p.y, p.y - photo.height));
  return by <= OUTSIDE_ALLOWANCE * Math.hypot(photo.width, photo.height) ? 0 : by;
}

/** The reason the four corners cannot be used, or null. Corners in photo px, finite; true size in mm. */
export function checkCorners(of: MarkedRectangle, corners: FourCorners, lengthMm: number, widthMm: number): MarksRefusal | null {
  if (![lengthMm, widthMm].every((side) => side >= SHORTEST_MM && side <= LONGEST_MM)) return { reason: "size", of };
  return checkQuadrilateral(of, corners) ?? checkView(of, corners, lengthMm, widthMm);
}

/** The part of `checkCorners` that needs no true size: for a board that is only measured. */
export function checkQuadrilateral(of: MarkedRectangle, corners: FourCorners): MarksRefusal | null {
  const turns = corners.map((corner, i) => {
    const before = corners[(i + 3) % 4] as PhotoPoint;
    const after = corners[(i + 1) % 4] as PhotoPoint;
    const side = Math.hypot(after.x - corner.x, after.y - corner.y);
    const cross = (corner.x - before.x) * (after.y - corner.y) - (corner.y - before.y) * (after.x - corner.x);
    const dot = (corner.x - before.x) * (after.x - corner.x) + (corner.y - before.y) * (after.y - corner.y);
    return { side, turnDeg: (Math.atan2(cross, dot) * 180) / Math.PI };
  });
  const sidePx = Math.min(...turns.map((turn) => turn.side));
  if (!(sidePx >= SHORTEST_SIDE_PX)) return { reason: "tiny", of, sidePx, neededPx: SHORTEST_SIDE_PX };

  // With y down, clockwise as seen turns by positive angles. Four corners turn by +360, −360 or, crossed over, 0 degrees in all.
  const clockwise = turns.filter((turn) => turn.turnDeg > 0).length;
  const total = Math.round(turns.reduce((sum, turn) => sum + turn.turnDeg, 0) / 360);
  if (total === 0) return { reason: "folded", of };
  if (total < 0) return { reason: "mirrored", of };
  const flattest = indexOfLeast(turns.map((turn) => Math.abs(Math.abs(turn.turnDeg - 90) - 90)));
  const angleDeg = Math.abs(Math.abs((turns[flattest]?.turnDeg ?? 0) - 90) - 90);
  if (angleDeg < FLATTEST_CORNER_DEG) return { reason: "in-line", of, corner: flattest, angleDeg };
  if (clockwise < 4) return { reason: "not-convex", of, corner: indexOfLeast(turns.map((turn) => turn.turnDeg)) };
  return null;
}

/** Whether a camera could see a rectangle of this size like that. */
function checkView(of: MarkedRectangle, corners: FourCorners, lengthMm: number, widthMm: number): MarksRefusal | null {
  const places = [
    { x: 0, y: 0 },
    { x: lengthMm, y: 0 },
    { x: lengthMm, y: widthMm },
    { x: 0, y: widthMm },
  ] as const;
  const stockMmFromPhoto = fitHomography(corners.map((photo, i): Mark => ({ photo, stockMm: places[i as CornerIndex] })));
  const photoFromStockMm = stockMmFromPhoto === null ? null : invertHomography(stockMmFromPhoto);
  if (photoFromStockMm === null) return { reason: "in-line", of, corner: 0, angleDeg: 0 };
  const ratio = depthRatio(photoFromStockMm, places);
  if (!(ratio <= GREATEST_DEPTH_RATIO)) return { reason: "scale-varies", of, ratio, limit: GREATEST_DEPTH_RATIO };
  const [most, least] = stretches(jacobianAt(photoFromStockMm, { x: lengthMm / 2, y: widthMm / 2 }));
  const flatness = most / least;
  return flatness <= GREATEST_FLATNESS ? null : { reason: "too-flat", of, ratio: flatness, limit: GREATEST_FLATNESS };
}

function depthRatio(photoFromStockMm: Homography, places: readonly PhotoPoint[]): number {
  const depths = places.map((p) => photoFromStockMm[6] * p.x + photoFromStockMm[7] * p.y + photoFromStockMm[8]);
  return depths.every((depth) => depth > 0) ? Math.max(...depths) / Math.min(...depths) : Number.POSITIVE_INFINITY;
}

function indexOfLeast(values: readonly number[]): CornerIndex {
  const least = values.reduce((best, value, i) => (value < (values[best] as number) ? i : best), 0);
  return least as CornerIndex;
}
