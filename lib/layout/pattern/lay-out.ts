/**
 * The pattern of solid fronts: from the document of a layout to its pieces. A piece that is laid on wood gets its map; one
 * that is not has only its place on the face. Judges nothing: what does not fit is said by `fit/problems.ts`.
 */
import { quarterTurn, turnedVector } from "../frame/combine-isometries";
import type { FacePoint, FaceRect } from "../frame/point";
import type { Piece, PieceId } from "../piece";
import type { FaceLayout } from "./face-layout";
import { faceGrid, outlineOf, placeOf, rectAt, spacedGrid } from "./grids";
import { originOf } from "./group-origin";
import { labelAt, pieceIdsOf, readingIndexOf } from "./piece-ids";
import { slotOf } from "./slots";

/** A piece as the face knows it, on wood or not. */
export interface FacePiece {
  readonly id: PieceId;
  readonly label: string;
  readonly outline: readonly FacePoint[];
  readonly rect: FaceRect;
}

/** Every piece of the face in reading order. */
export function facePieces(layout: Pick<FaceLayout, "face">): FacePiece[] {
  const grid = faceGrid(layout.face);
  return pieceIdsOf(layout.face).map((id, index) => {
    const rect = rectAt(grid, placeOf(layout.face, id));
    return { id, label: labelAt(index), outline: outlineOf(rect), rect };
  });
}

/** The pieces that are laid on wood, in reading order, each with the map from the face to its stock. */
export function layOut(layout: FaceLayout): Piece[] {
  const { face } = layout;
  const hung = faceGrid(face);
  const spaced = spacedGrid(layout);
  const pieces = layout.groups.flatMap((group): Piece[] => {
    const origin = originOf(layout, group);
    if (origin === null) return [];
    return group.pieceIds.map((id) => {
      const rect = rectAt(hung, placeOf(face, id));
      const slot = rectAt(spaced, placeOf(face, slotOf(group, id)));
      const shift = turnedVector(quarterTurn(origin.turns), slot.x - rect.x, slot.y - rect.y);
      const stockFromFace = quarterTurn(origin.turns, origin.origin.x + shift.x, origin.origin.y + shift.y);
      const label = labelAt(readingIndexOf(face, id) ?? 0);
      return { id, label, outline: outlineOf(rect), stockId: origin.stockId, stockFromFace };
    });
  });
  return pieces.sort((p, q) => Number(p.label) - Number(q.label));
}

/** The pieces that are not laid on wood yet, in reading order. */
export function unplacedPieces(layout: FaceLayout): FacePiece[] {
  const placed = new Set(layout.groups.flatMap((group) => (group.placement === null ? [] : group.pieceIds)));
  return facePieces(layout).filter(({ id }) => !placed.has(id));
}
