/** Pieces as they lie on their boards, with what the tests of this room need to know of them. */
import { boundsOf, polygonToStock } from "../frame/apply-isometry";
import { cleanUpEdges } from "../pattern/clean-up-edges";
import type { FaceLayout } from "../pattern/face-layout";
import { layOut } from "../pattern/lay-out";
import { blankOwners } from "../pattern/one-blank";
import type { Piece, PieceId, PieceRole, StockId } from "../piece";
import type { Edge } from "../program/program";
import type { Um } from "../units/um";
import { type Spans, spansOf } from "./span";

export interface LyingPiece {
  readonly id: PieceId;
  readonly role: PieceRole;
  readonly groupId: string;
  readonly stockId: StockId;
  /** The piece that names the blank it is sawn in: another one's where several come from one blank, lying in the same place. */
  readonly blankId: PieceId;
  /** Finished size. */
  readonly spans: Spans;
  /** As it must leave the saw: finished size and clean-up. */
  readonly blank: Spans;
  /** Taken off each edge after sawing, by edge of the stock frame. */
  readonly cleanUp: Readonly<Record<Edge, Um>>;
}

/** Every piece laid on wood, in reading order. */
export function lyingPieces(layout: FaceLayout, pieces: readonly Piece[] = layOut(layout)): LyingPiece[] {
  const groupById = new Map(layout.groups.flatMap((group) => group.pieceIds.map((id) => [id, group] as const)));
  const cleanUps = cleanUpEdges(layout, pieces);
  const ownerOf = blankOwners(layout.face);
  return pieces.flatMap(({ id, role, stockId, outline, stockFromFace }): LyingPiece[] => {
    const group = groupById.get(id);
    if (group === undefined) return [];
    const cleanUp = cleanUps.get(id);
    if (cleanUp === undefined) return [];
    const spans = spansOf(boundsOf(polygonToStock(stockFromFace, outline)));
    return [{ id, role, groupId: group.id, stockId, blankId: ownerOf(id), spans, blank: grownBy(spans, cleanUp), cleanUp }];
  });
}

function grownBy({ along, across }: Spans, cleanUp: LyingPiece["cleanUp"]): Spans {
  return {
    along: { from: along.from - cleanUp.left, to: along.to + cleanUp.right },
    across: { from: across.from - cleanUp.top, to: across.to + cleanUp.bottom },
  };
}
