/**
 * The document of a layout after its pieces were moved in the wood: a group whose pieces all move alike moves as one, any other piece
 * that moves is let loose first. Pieces that are left out are taken off the board.
 */
import type { FaceLayout } from "../pattern/face-layout";
import type { LayoutChange } from "../pattern/layout-change";
import { letLoose } from "../pattern/let-loose";
import { liftGroup, moveGroup } from "../pattern/place-group";
import { groupOf } from "../pattern/slots";
import type { PieceId } from "../piece";
import type { Um } from "../units/um";

export interface WoodMove {
  readonly pieceId: PieceId;
  /** In the stock frame. null: it leaves the board. */
  readonly by: { readonly x: Um; readonly y: Um } | null;
}

/** `moves`: of every piece that is sawn from a board, also of those that stay. Refused where pieces that are sawn as one part. */
export function followWood(layout: FaceLayout, moves: readonly WoodMove[]): LayoutChange {
  const moveOf = new Map(moves.map((move) => [move.pieceId, move.by]));
  let change: LayoutChange = { ok: true, layout };
  for (const { id, pieceIds } of layout.groups) {
    const sawn = pieceIds.filter((piece) => moveOf.has(piece));
    const keys = new Set(sawn.map((piece) => keyOf(moveOf.get(piece) ?? null)));
    const [first] = sawn;
    if (first === undefined) continue;
    if (keys.size === 1) {
      change = carry(change, id, moveOf.get(first) ?? null);
      continue;
    }
    for (const piece of sawn) {
      const by = moveOf.get(piece) ?? null;
      if (keyOf(by) === keyOf(standing)) continue;
      if (change.ok && !alone(change.layout, piece)) change = letLoose(change.layout, piece);
      const group = change.ok ? groupOf(change.layout, piece)?.id : undefined;
      if (group !== undefined) change = carry(change, group, by);
    }
  }
  return change;
}

const standing = { x: 0, y: 0 };
const keyOf = (by: { readonly x: number; readonly y: number } | null): string => (by ? `${by.x} ${by.y}` : "off");
const alone = (layout: FaceLayout, piece: PieceId): boolean => groupOf(layout, piece)?.pieceIds.length === 1;

function carry(change: LayoutChange, groupId: string, by: WoodMove["by"]): LayoutChange {
  if (!change.ok) return change;
  if (by === null) return liftGroup(change.layout, groupId);
  return by.x === 0 && by.y === 0 ? change : moveGroup(change.layout, groupId, by);
}
