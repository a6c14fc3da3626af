/**
 * A cut-out is described by its grain: parts follow each other along it, strips and rows across it. Here both are brought on to the
 * face: with horizontal grain along is right and across is down, with vertical grain the other way.
 */
import type { FaceRect } from "../../frame/point";
import { um } from "../../units/um";
import type { EdgeAmounts, Grain } from "../face";
import type { AnchorX, AnchorY, FaceLayout } from "../face-layout";

/** A stretch of one axis, µm. */
export interface Stretch {
  readonly start: number;
  readonly size: number;
}

export function rectOnFace(grain: Grain, along: Stretch, across: Stretch): FaceRect {
  const [x, y] = grain === "horizontal" ? [along, across] : [across, along];
  return { x: um(x.start), y: um(y.start), width: um(x.size), height: um(y.size) };
}

/** Lengths by side of a part: the end nearer the start of the row and the end farther from it, the edges above and below across it. */
export interface BySide<T> {
  readonly near: T;
  readonly far: T;
  readonly above: T;
  readonly below: T;
}

export function bySide({ left, right, top, bottom }: EdgeAmounts, grain: Grain): BySide<EdgeAmounts["left"]> {
  return grain === "horizontal"
    ? { near: left, far: right, above: top, below: bottom }
    : { near: top, far: bottom, above: left, below: right };
}

export function byEdge({ near, far, above, below }: BySide<number>, grain: Grain): EdgeAmounts {
  return grain === "horizontal"
    ? { left: um(near), right: um(far), top: um(above), bottom: um(below) }
    : { left: um(above), right: um(below), top: um(near), bottom: um(far) };
}

/** The anchor along the grain. */
export function anchorAlong(
  { anchorX, anchorY }: Pick<FaceLayout, "anchorX" | "anchorY">,
  grain: Grain,
): "start" | "centre" | "end" | { readonly piece: string } {
  const anchor: AnchorX | AnchorY = grain === "horizontal" ? anchorX : anchorY;
  if (typeof anchor === "object") return anchor;
  if (anchor === "centre") return "centre";
  return anchor === "left" || anchor === "top" ? "start" : "end";
}
