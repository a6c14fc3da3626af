/**
 * From the document of a layout to its pieces. A piece that is laid on wood gets its map; one that is not has only its place on
 * the face. Judges nothing: what does not fit is said by `fit/problems.ts`.
 */
import { composed, quarterTurn } from "../frame/combine-isometries";
import type { Isometry } from "../frame/isometry";
import type { FacePoint, FaceRect } from "../frame/point";
import type { Piece, PieceId, PieceRole } from "../piece";
import { hungChart, outlineOf, spacedChart } from "./charts";
import type { FaceLayout } from "./face-layout";
import { originOf } from "./group-origin";
import type { ChartPlace } from "./pattern-rules";
import { ofPiece } from "./piece-ids";
import { labelAt, pieceIdAt } from "./piece-names";
import { slotOf } from "./slots";

/** A piece as the face knows it, on wood or not. */
export interface FacePiece {
  readonly id: PieceId;
  readonly label: string;
  readonly role: PieceRole;
  readonly outline: readonly FacePoint[];
  readonly rect: FaceRect;
}

/** Every piece of the face in reading order. */
export function facePieces(layout: Pick<FaceLayout, "face">): FacePiece[] {
  return hungChart(layout.face).map(({ role, rect }, index) => {
    return { id: pieceIdAt(index), label: labelAt(index), role, outline: outlineOf(rect), rect };
  });
}

/**
 * Kept by document: documents never change, and problems, seams, clearances and every board's cut request ask for the same pieces. A face
 * of 300 pieces on 30 boards would be laid out a hundred times for one order.
 */
const laid = new WeakMap<FaceLayout, readonly Piece[]>();

/** The pieces that are laid on wood, in reading order, each with the map from the face to its stock. */
export function layOut(layout: FaceLayout): readonly Piece[] {
  const known = laid.get(layout);
  if (known !== undefined) return known;
  const pieces = piecesOf(layout);
  laid.set(layout, pieces);
  return pieces;
}

function piecesOf(layout: FaceLayout): Piece[] {
  const hung = facePieces(layout);
  const places = spacedChart(layout);
  const pieces = layout.groups.flatMap((group): Piece[] => {
    const origin = originOf(layout, group, places);
    if (origin === null) return [];
    const stockFromChart = quarterTurn(origin.turns, origin.origin.x, origin.origin.y);
    return group.pieceIds.map((id) => {
      const { rect, ...piece } = ofPiece(hung, id);
      const chartFromFace = mapInto(ofPiece(places, slotOf(group, id)), rect);
      return { ...piece, stockId: origin.stockId, stockFromFace: composed(stockFromChart, chartFromFace) };
    });
  });
  return pieces.sort((p, q) => Number(p.label) - Number(q.label));
}

/** The map that takes the rectangle in which a piece hangs to the place it is cut from. */
function mapInto({ rect: place, mirrored }: ChartPlace, rect: FaceRect): Isometry {
  const [flipX, flipY] = [mirrored === "leftRight", mirrored === "topBottom"];
  return {
    a: flipX ? -1 : 1,
    b: 0,
    c: 0,
    d: flipY ? -1 : 1,
    tx: flipX ? place.x + place.width + rect.x : place.x - rect.x,
    ty: flipY ? place.y + place.height + rect.y : place.y - rect.y,
  };
}

/** The pieces that are not laid on wood yet, in reading order. */
export function unplacedPieces(layout: FaceLayout): FacePiece[] {
  const placed = new Set(layout.groups.flatMap((group) => (group.placement === null ? [] : group.pieceIds)));
  return facePieces(layout).filter(({ id }) => !placed.has(id));
}
