/**
 * The anchor point of a group: the point of the spaced chart that its placement pins to the wood, and the point of the face that
 * belongs to it. Both in the axes of the face, before turning.
 *
 * A centre that falls on half a micrometre goes to the side of the origin, here and nowhere else; since the pieces are placed by
 * whole-number differences from that point, the choice never moves wood.
 */
import { boundsOf } from "../frame/apply-isometry";
import type { FacePoint, FaceRect } from "../frame/point";
import type { PieceId } from "../piece";
import { type Um, um } from "../units/um";
import { hungChart, outlineOf, spacedChart } from "./charts";
import type { AnchorX, AnchorY, FaceLayout, PieceGroup } from "./face-layout";
import type { ChartPlace } from "./pattern-rules";
import { ofPiece } from "./piece-ids";
import { slotOf } from "./slots";

/** The anchor point in the spaced chart. */
export function spacedAnchor(layout: FaceLayout, group: PieceGroup, places = spacedChart(layout)): FacePoint {
  const slotRect = (id: PieceId) => ofPiece(places, slotOf(group, id)).rect;
  return anchorPoint(layout, group, places, { slotRect, ownRect: slotRect });
}

/** The point of the hung face at which the wood of the group shows without drift. */
export function faceAnchor(layout: FaceLayout, group: PieceGroup): FacePoint {
  const hung = hungChart(layout.face);
  const slotRect = (id: PieceId) => ofPiece(hung, slotOf(group, id)).rect;
  const ownRect = (id: PieceId) => ofPiece(hung, id).rect;
  return anchorPoint(layout, group, spacedChart(layout), { slotRect, ownRect });
}

/** The smallest rectangle around the slots of a group in the spaced chart. Throws on a group without pieces. */
export function spacedBox(layout: FaceLayout, group: PieceGroup): FaceRect {
  const places = spacedChart(layout);
  return boxOf(group.pieceIds, (id) => ofPiece(places, slotOf(group, id)).rect);
}

type RectOf = (id: PieceId) => FaceRect;

/** What an anchor is found from: the rectangle of the slot that a piece is cut from, and that of the piece itself. */
interface Ground {
  readonly slotRect: RectOf;
  readonly ownRect: RectOf;
}

function anchorPoint(layout: FaceLayout, group: PieceGroup, places: readonly ChartPlace[], ground: Ground): FacePoint {
  const guides = group.pieceIds.filter((id) => ofPiece(places, slotOf(group, id)).anchors);
  const box = boxOf(guides.length > 0 ? guides : group.pieceIds, ground.slotRect);
  // Of a mirrored piece one point of the face is another of the wood, so it can hold nothing in its place.
  const canAnchor = (id: PieceId) => group.pieceIds.includes(id) && ofPiece(places, slotOf(group, id)).mirrored === "no";
  const own = (anchor: AnchorX | AnchorY) =>
    typeof anchor === "object" && canAnchor(anchor.piece) ? ground.ownRect(anchor.piece) : box;
  const forX = own(layout.anchorX);
  const forY = own(layout.anchorY);
  return { x: pointOn(layout.anchorX, forX.x, forX.width), y: pointOn(layout.anchorY, forY.y, forY.height) };
}

function boxOf(ids: readonly PieceId[], rectOf: RectOf): FaceRect {
  return boundsOf(ids.flatMap((id) => outlineOf(rectOf(id))));
}

function pointOn(anchor: AnchorX | AnchorY, start: Um, size: Um): Um {
  if (anchor === "left" || anchor === "top") return start;
  if (anchor === "right" || anchor === "bottom") return um(start + size);
  return um(start + Math.floor(size / 2));
}
