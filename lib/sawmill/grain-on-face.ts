/**
 * Which way the figure runs on a face, told by the growth of the tree itself: the truth against which directions read from pictures
 * are judged.
 *
 * A face shows the years as lines of equal growth radius. Their direction is square to the growth radius' slope within the face; over
 * a patch it is averaged in doubled angles, weighted by the slope squared as contrast is, because closer rings show more edges.
 */
import { branchesNear, emptyPlace, type Log, readLog } from "./log";
import { type Plane, pointOn } from "./plane";

export interface GrainTruth {
  /** Radians from the face's x axis towards y, in (−π/2, π/2]. */
  readonly direction: number;
  /** 0: lines run every way, 1: all one way. */
  readonly coherence: number;
  /** Root mean square of the slope within the face: years' growth shown a millimetre; near 0 a face grazes the rings. */
  readonly slope: number;
}

/** An upright rectangle of a face, mm. */
export interface FacePatch {
  readonly xMm: number;
  readonly yMm: number;
  readonly lengthMm: number;
  readonly widthMm: number;
}

const STEP_MM = 1;
// Slopes are taken over this much wood, less than the thinnest ring.
const REACH_MM = 0.25;

/** The truth over a patch. */
export function grainOnFace(log: Log, plane: Plane, { xMm, yMm, lengthMm, widthMm }: FacePatch): GrainTruth {
  let xx = 0;
  let yy = 0;
  let xy = 0;
  let count = 0;
  for (let x = xMm + STEP_MM / 2; x < xMm + lengthMm; x += STEP_MM) {
    for (let y = yMm + STEP_MM / 2; y < yMm + widthMm; y += STEP_MM) {
      const dx = (growthAt(log, plane, x + REACH_MM, y) - growthAt(log, plane, x - REACH_MM, y)) / (2 * REACH_MM);
      const dy = (growthAt(log, plane, x, y + REACH_MM) - growthAt(log, plane, x, y - REACH_MM)) / (2 * REACH_MM);
      xx += dx * dx;
      yy += dy * dy;
      xy += dx * dy;
      count++;
    }
  }
  const square = 0.5 * Math.atan2(2 * xy, xx - yy);
  return {
    direction: square > 0 ? square - Math.PI / 2 : square + Math.PI / 2,
    coherence: xx + yy > 0 ? Math.hypot(xx - yy, 2 * xy) / (xx + yy) : 0,
    slope: Math.sqrt((xx + yy) / count),
  };
}

const place = emptyPlace();

function growthAt(log: Log, plane: Plane, xMm: number, yMm: number): number {
  const { x, y, z } = pointOn(plane, xMm, yMm);
  readLog(log, x, y, z, branchesNear(log, z, z), place);
  return place.growthMm;
}
