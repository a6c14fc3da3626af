/** Which clean-up each edge of a piece gets, seen in the stock frame: the sawn blank is the piece grown by these. */
import type { Isometry } from "../frame/isometry";
import type { Piece, PieceId } from "../piece";
import type { Edge } from "../program/program";
import type { EdgeAmounts } from "./face";
import type { FaceLayout } from "./face-layout";
import { ofPiece } from "./piece-ids";
import { rulesOf } from "./rules-of";

/** Clean-up by stock edge of each of these pieces of a layout, as they lie on wood. */
export function cleanUpEdges(layout: FaceLayout, pieces: readonly Piece[]): ReadonlyMap<PieceId, EdgeAmounts> {
  const onFace = rulesOf(layout.face).cleanUps(layout);
  return new Map(pieces.map(({ id, stockFromFace }) => [id, onStock(ofPiece(onFace, id), stockFromFace)]));
}

/** Right for quarter turns and mirrors, which take edges to edges. */
function onStock(onFace: EdgeAmounts, { a, b, c, d }: Isometry): EdgeAmounts {
  const lying: Partial<Record<Edge, EdgeAmounts[Edge]>> = {
    [edgeToward(a, b)]: onFace.right,
    [edgeToward(-a, -b)]: onFace.left,
    [edgeToward(c, d)]: onFace.bottom,
    [edgeToward(-c, -d)]: onFace.top,
  };
  return { ...onFace, ...lying };
}

function edgeToward(x: number, y: number): Edge {
  if (Math.abs(x) > Math.abs(y)) return x > 0 ? "right" : "left";
  return y > 0 ? "bottom" : "top";
}
