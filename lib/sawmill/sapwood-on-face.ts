/**
 * Where sapwood runs along the far edge of a face (y = width): the truth for sapwood areas and for outlines that leave it out.
 */
import { branchesNear, emptyPlace, type Log, readLog } from "./log";
import { type FaceSize, type Plane, pointOn } from "./plane";

/** At `xMm` along the face everything from `fromMm` to the far edge may be sapwood; equal to the width where none is. */
export interface SapwoodReach {
  readonly xMm: number;
  readonly fromMm: number;
}

const STEP_MM = 1;
// The colour's border strays by up to this much from the year's growth it follows (see `woodColor`).
const STRAY_MM = 5;

/** Reach of the sapwood at `count` places from end to end. On the side of caution: heartwood may begin some millimetres later. */
export function sapwoodAtFarEdge(log: Log, plane: Plane, size: FaceSize, count: number): readonly SapwoodReach[] {
  const { species } = log;
  const place = emptyPlace();
  return Array.from({ length: count }, (_, index) => {
    const xMm = count === 1 ? size.lengthMm / 2 : (size.lengthMm * index) / (count - 1);
    let fromMm = size.widthMm;
    while (fromMm > 0) {
      const p = pointOn(plane, xMm, Math.max(0, fromMm - STEP_MM));
      readLog(log, p.x, p.y, p.z, branchesNear(log, p.z - 1, p.z + 1), place);
      const intoSapwood = place.growthMm - (log.radiusMm - species.sapDepthMm) - species.taper * p.z * 0.6;
      if (intoSapwood < -(STRAY_MM + species.sapBlendMm / 2)) break;
      fromMm = Math.max(0, fromMm - STEP_MM);
    }
    return { xMm, fromMm };
  });
}
