/** Which clean-up each edge of a piece gets, seen in the stock frame: the sawn blank is the piece grown by these. */
import type { Isometry } from "../frame/isometry";
import type { Piece, PieceId } from "../piece";
import type { Edge } from "../program/program";
import { um } from "../units/um";
import type { EdgeAmounts } from "./face";
import type { FaceLayout } from "./face-layout";
import { oneBlankSets } from "./one-blank";
import { ofPiece } from "./piece-ids";
import { rulesOf } from "./rules-of";

/** Clean-up by stock edge of each of these pieces of a layout, as they lie on wood. What comes from one blank has the blank's. */
export function cleanUpEdges(layout: FaceLayout, pieces: readonly Piece[]): ReadonlyMap<PieceId, EdgeAmounts> {
  const onFace = rulesOf(layout.face).cleanUps(layout);
  const found = new Map(pieces.map(({ id, stockFromFace }) => [id, onStock(ofPiece(onFace, id), stockFromFace)]));
  for (const ids of oneBlankSets(layout.face)) {
    const blank = largest(ids.flatMap((id) => found.get(id) ?? []));
    for (const id of ids) if (blank !== null && found.has(id)) found.set(id, blank);
  }
  return found;
}

function largest(amounts: readonly EdgeAmounts[]): EdgeAmounts | null {
  return amounts.reduce<EdgeAmounts | null>(
    (most, { left, right, top, bottom }) => ({
      left: um(Math.max(left, most?.left ?? 0)),
      right: um(Math.max(right, most?.right ?? 0)),
      top: um(Math.max(top, most?.top ?? 0)),
      bottom: um(Math.max(bottom, most?.bottom ?? 0)),
    }),
    null,
  );
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
