/**
 * Drift: jumps added up. How far the figure of each piece has wandered from an uncut board that runs past the whole face and
 * agrees with it at the anchor of the set, such as a rail above a row. Where all jumps go one way the centre anchor halves the
 * largest.
 *
 * The uncut board is the map that takes the set's anchor point on the hung face to its point in the wood, with the set's
 * turn; the drift of a piece is its own shift less that map's. A piece from other stock, or turned the other way, has no
 * drift that one figure can tell.
 */
import { quarterTurn, turnedVector } from "../frame/combine-isometries";
import { faceAnchor } from "../pattern/anchor";
import type { FaceLayout } from "../pattern/face-layout";
import { layOut } from "../pattern/lay-out";
import type { Piece, PieceId } from "../piece";
import { type Um, um } from "../units/um";

export interface Drift {
  readonly piece: PieceId;
  /** In the stock frame, along the grain and across it; null where the piece does not come from the set's board and turn. */
  readonly drift: { readonly along: Um; readonly across: Um } | null;
}

/** The drift of every piece laid on wood, in reading order; none before the set is laid on wood. */
export function drifts(layout: FaceLayout, pieces: readonly Piece[] = layOut(layout)): Drift[] {
  const [set] = layout.groups;
  if (set === undefined || set.placement === null || set.pieceIds.length === 0) return [];
  const { stockId, at, turns } = set.placement;
  const anchor = faceAnchor(layout, set);
  const turn = quarterTurn(turns);
  const turned = turnedVector(turn, anchor.x, anchor.y);
  return pieces.map(({ id, stockId: from, stockFromFace: map }) => {
    const comparable = from === stockId && map.a === turn.a && map.b === turn.b && map.c === turn.c && map.d === turn.d;
    if (!comparable) return { piece: id, drift: null };
    return { piece: id, drift: { along: um(map.tx - (at.x - turned.x)), across: um(map.ty - (at.y - turned.y)) } };
  });
}
