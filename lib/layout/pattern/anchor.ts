/**
 * The anchor point of a group: the point of the spaced grid that its placement pins to the wood, and the point of the face that
 * belongs to it. Both in the axes of the face, before turning.
 *
 * A centre that falls on half a micrometre goes to the side of the origin, here and nowhere else; since the pieces are placed by
 * whole-number differences from that point, the choice never moves wood.
 */
import { boundsOf } from "../frame/apply-isometry";
import type { FacePoint, FaceRect } from "../frame/point";
import type { PieceId } from "../piece";
import { type Um, um } from "../units/um";
import type { AnchorX, AnchorY, FaceLayout, PieceGroup } from "./face-layout";
import { faceGrid, type Grid, outlineOf, placeOf, rectAt, spacedGrid } from "./grids";
import { slotOf } from "./slots";

/** What an anchor is found from: the box of the group and, per piece, its rectangle. */
interface Ground {
  readonly box: FaceRect;
  readonly rectOf: (id: PieceId) => FaceRect;
}

/** The anchor point in the spaced grid. */
export function spacedAnchor(layout: FaceLayout, group: PieceGroup, grid: Grid = spacedGrid(layout)): FacePoint {
  const slotRect = (id: PieceId) => rectAt(grid, placeOf(layout.face, slotOf(group, id)));
  return anchorPoint(layout, group, { box: boxOf(group, slotRect), rectOf: slotRect });
}

/** The point of the hung face at which the wood of the group shows without drift. */
export function faceAnchor(layout: FaceLayout, group: PieceGroup, grid: Grid = faceGrid(layout.face)): FacePoint {
  const slotRect = (id: PieceId) => rectAt(grid, placeOf(layout.face, slotOf(group, id)));
  const ownRect = (id: PieceId) => rectAt(grid, placeOf(layout.face, id));
  return anchorPoint(layout, group, { box: boxOf(group, slotRect), rectOf: ownRect });
}

/** The smallest rectangle around the slots of a group in the spaced grid. Throws on a group without pieces. */
export function spacedBox(layout: FaceLayout, group: PieceGroup): FaceRect {
  const grid = spacedGrid(layout);
  return boxOf(group, (id) => rectAt(grid, placeOf(layout.face, slotOf(group, id))));
}

function boxOf(group: PieceGroup, rectOf: (id: PieceId) => FaceRect): FaceRect {
  return boundsOf(group.pieceIds.flatMap((id) => outlineOf(rectOf(id))));
}

function anchorPoint(layout: FaceLayout, group: PieceGroup, { box, rectOf }: Ground): FacePoint {
  const own = (anchor: AnchorX | AnchorY) =>
    typeof anchor === "object" && group.pieceIds.includes(anchor.piece) ? rectOf(anchor.piece) : box;
  const forX = own(layout.anchorX);
  const forY = own(layout.anchorY);
  return { x: pointOn(layout.anchorX, forX.x, forX.width), y: pointOn(layout.anchorY, forY.y, forY.height) };
}

function pointOn(anchor: AnchorX | AnchorY, start: Um, size: Um): Um {
  if (anchor === "left" || anchor === "top") return start;
  if (anchor === "right" || anchor === "bottom") return um(start + size);
  return um(start + Math.floor(size / 2));
}
