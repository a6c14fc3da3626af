/**
 * Where branches show on a face: the truth against which found knots are judged.
 */
import { branchRadiusMm } from "./branches";
import { branchesNear, emptyPlace, type Log, pithAt, readLog } from "./log";
import { type FaceSize, inward, type Plane, pointOn } from "./plane";

/** One knot's own branch wood on a face, face frame, mm. */
export interface KnotTruth {
  /** Number of the branch within its log; the same branch keeps it on every face. */
  readonly branch: number;
  readonly centerMm: readonly [number, number];
  /** Radius of a disc of the same area. */
  readonly radiusMm: number;
  /** Smallest upright box: left, top, right, bottom. */
  readonly boxMm: readonly [number, number, number, number];
  readonly dead: boolean;
  readonly touchesEdge: boolean;
}

const AXIS_STEP_MM = 2;
const CELL_MM = 0.5;

/** All knots of a face, by branch number. Areas are counted in cells of half a millimetre. */
export function knotsOnFace(log: Log, plane: Plane, size: FaceSize): readonly KnotTruth[] {
  const knots: KnotTruth[] = [];
  log.branches.forEach((_, branch) => {
    const box = reachOnFace(log, branch, plane, size);
    if (box === null) return;
    const knot = countCells(log, branch, plane, size, box);
    if (knot !== null) knots.push(knot);
  });
  return knots;
}

type Box = readonly [number, number, number, number];

/** The part of the face that a branch could show on, or null: every stretch of its axis closer to the plane than it is thick. */
function reachOnFace(log: Log, index: number, plane: Plane, size: FaceSize): Box | null {
  const branch = log.branches[index];
  if (branch === undefined) return null;
  const into = inward(plane);
  let box: [number, number, number, number] | null = null;
  for (let t = 0; t <= branch.endMm; t += AXIS_STEP_MM) {
    const z = branch.rootZMm + t * branch.up;
    const pith = pithAt(log, z);
    const dx = pith.x + branch.outX * t * branch.out - plane.origin.x;
    const dy = pith.y + branch.outY * t * branch.out - plane.origin.y;
    const dz = z - plane.origin.z;
    const radius = branchRadiusMm(branch, t) + AXIS_STEP_MM;
    if (Math.abs(dx * into.x + dy * into.y + dz * into.z) > radius) continue;
    const x = dx * plane.along.x + dy * plane.along.y + dz * plane.along.z;
    const y = dx * plane.across.x + dy * plane.across.y + dz * plane.across.z;
    box = box ?? [x, y, x, y];
    box = [
      Math.min(box[0], x - radius),
      Math.min(box[1], y - radius),
      Math.max(box[2], x + radius),
      Math.max(box[3], y + radius),
    ];
  }
  if (box === null) return null;
  const held: Box = [Math.max(0, box[0]), Math.max(0, box[1]), Math.min(size.lengthMm, box[2]), Math.min(size.widthMm, box[3])];
  return held[0] < held[2] && held[1] < held[3] ? held : null;
}

function countCells(log: Log, index: number, plane: Plane, size: FaceSize, [left, top, right, bottom]: Box): KnotTruth | null {
  const place = emptyPlace();
  let cells = 0;
  let deadCells = 0;
  let sumX = 0;
  let sumY = 0;
  let box: Box | null = null;
  for (let x = left + CELL_MM / 2; x < right; x += CELL_MM) {
    const near = branchesNear(log, pointOn(plane, x, top).z - 1, pointOn(plane, x, bottom).z + 1);
    for (let y = top + CELL_MM / 2; y < bottom; y += CELL_MM) {
      const p = pointOn(plane, x, y);
      readLog(log, p.x, p.y, p.z, near, place);
      if (place.branch !== index) continue;
      cells++;
      if (place.alongBranchMm > (log.branches[index]?.deadFromMm ?? 0)) deadCells++;
      sumX += x;
      sumY += y;
      const [l, t] = [x - CELL_MM / 2, y - CELL_MM / 2];
      const [r, b] = [Math.min(right, x + CELL_MM / 2), Math.min(bottom, y + CELL_MM / 2)];
      box = box === null ? [l, t, r, b] : [Math.min(box[0], l), Math.min(box[1], t), Math.max(box[2], r), Math.max(box[3], b)];
    }
  }
  if (box === null) return null;
  return {
    branch: index,
    centerMm: [sumX / cells, sumY / cells],
    radiusMm: Math.sqrt((cells * CELL_MM * CELL_MM) / Math.PI),
    boxMm: box,
    dead: deadCells * 2 > cells,
    touchesEdge: box[0] < CELL_MM || box[1] < CELL_MM || box[2] > size.lengthMm - CELL_MM || box[3] > size.widthMm - CELL_MM,
  };
}
