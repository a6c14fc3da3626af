/** A planned blank as the browser sees it. */
import "server-only";
import type { Connection } from "@/db/client";
import { findBlank, isGlued, isIssued, listMembers } from "@/db/queries/blank";
import type { ShopId } from "@/db/shop-id";
import type { Board } from "@/lib/schemas/board";
import { glueUpId } from "@/lib/schemas/order-steps";
import { printTag } from "@/lib/schemas/tag";
import { stripsOf } from "./blank-plan";

/** null for a board in one piece, and for a blank that was glued already. */
export async function readBlank(db: Connection, shopId: ShopId, boardId: string, tag: string): Promise<Board["blank"]> {
  const found = await findBlank(db, shopId, boardId);
  if (!found) return null;
  const rows = await listMembers(db, shopId, boardId);
  const { strips } = stripsOf(rows, found.jointing);
  const members = rows.flatMap(({ board, member, straightening }, index) => {
    const strip = strips[index];
    if (!strip) return [];
    const { rect, takes } = strip;
    return {
      boardId: board.id,
      tag: printTag(board.tagNumber),
      species: board.species,
      place: board.place,
      side: straightening.side,
      straighteningId: straightening.id,
      endForEnd: member.endForEnd,
      rect,
      takes,
    };
  });
  return {
    jointing: found.jointing,
    glued: await isGlued(db, shopId, boardId, glueUpId(tag)),
    issued: await isIssued(db, shopId, boardId),
    members,
  };
}
