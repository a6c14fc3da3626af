/** The two charts of a layout, in reading order: its face as hung, and the face as cut from stock. */
import type { FacePoint, FaceRect } from "../frame/point";
import { type Um, um } from "../units/um";
import type { Face } from "./face";
import type { FaceLayout } from "./face-layout";
import type { ChartPlace, HungPiece, SeamPlace } from "./pattern-rules";
import { rulesOf } from "./rules-of";

/** Every piece as it hangs. */
export function hungChart(face: Face): readonly HungPiece[] {
  return rulesOf(face).pieces(face);
}

/** Every place that a piece is cut from, named by the piece whose own place it is. */
export function spacedChart(layout: FaceLayout): readonly ChartPlace[] {
  return rulesOf(layout.face).places(layout);
}

/** Width and height of the whole face, outer edge to outer edge. */
export function faceSize(face: Face): { readonly width: Um; readonly height: Um } {
  return rulesOf(face).size(face);
}

/** Where the pieces of a face meet, in reading order of the first, the seam on its right before the one below it. */
export function seamPlaces(face: Face): readonly SeamPlace[] {
  return rulesOf(face).seams(face);
}

/** The finished outline of a rectangle, clockwise as seen from its top left corner. */
export function outlineOf(rect: FaceRect): FacePoint[] {
  const right = um(rect.x + rect.width);
  const bottom = um(rect.y + rect.height);
  return [
    { x: rect.x, y: rect.y },
    { x: right, y: rect.y },
    { x: right, y: bottom },
    { x: rect.x, y: bottom },
  ];
}
