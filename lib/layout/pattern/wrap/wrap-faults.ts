/** What makes a run round corners mean nothing. */
import { um } from "../../units/um";
import type { WrapCorner, WrapFace } from "../face";
import type { FaceFault } from "../face-fault";
import { innerBeyond } from "./corner-loss";

export function wrapFaults(face: WrapFace): FaceFault[] {
  const { sides, corners, closed } = face;
  if (sides.length === 0) return [{ fault: "empty-face" }];
  const faults: FaceFault[] = [];
  if (closed && sides.length < 3) faults.push({ fault: "too-few-sides", sides: sides.length });
  const needed = closed ? sides.length : sides.length - 1;
  if (corners.length !== needed) faults.push({ fault: "corner-count", corners: corners.length, needed });
  for (const axis of ["height", "thickness"] as const) {
    if (!(face[axis] > 0)) faults.push({ fault: "size-not-positive", axis, index: 0 });
  }
  corners.forEach((corner, index) => {
    if (!(corner.turnDeg > 0 && corner.turnDeg < 180)) faults.push({ fault: "turn-out-of-range", corner: index });
    if (corner.kind === "gap" && !(corner.gap >= 0)) faults.push({ fault: "negative-length", where: "gap" });
  });
  sides.forEach((side, index) => {
    if (!(side > 0)) faults.push({ fault: "side-not-positive", side: index });
  });
  return faults.length > 0 ? faults : sides.flatMap((_, side) => innerFault(face, side));
}

function innerFault(face: WrapFace, side: number): FaceFault[] {
  const { sides, corners, closed, thickness } = face;
  const near = side > 0 ? corners[side - 1] : closed ? corners.at(-1) : undefined;
  const ends = [near, corners[side]].filter((corner): corner is WrapCorner => corner !== undefined);
  const inner = ends.reduce((length, corner) => length + innerBeyond(corner, thickness), sides[side] ?? 0);
  return inner > 0 ? [] : [{ fault: "no-inner-face", side, by: um(1 - inner) }];
}
