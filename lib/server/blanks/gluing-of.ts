/** What is to be done before a planned blank can be cut. */
import "server-only";
import type { Connection } from "@/db/client";
import { findBlank, isGlued, listMembers } from "@/db/queries/blank";
import type { ShopId } from "@/db/shop-id";
import type { Gluing } from "@/lib/schemas/gluing";
import { glueUpId } from "@/lib/schemas/order-steps";
import { printTag } from "@/lib/schemas/tag";
import { stripsOf } from "./blank-plan";

/** null for a board in one piece, and for a blank that is glued up: by an earlier order, or before it came here. */
export async function gluingOf(
  db: Connection,
  shopId: ShopId,
  { id, tagNumber }: { readonly id: string; readonly tagNumber: number },
): Promise<Gluing | null> {
  const blank = await findBlank(db, shopId, id);
  if (!blank || (await isGlued(db, shopId, id, glueUpId(printTag(tagNumber))))) return null;
  const rows = await listMembers(db, shopId, id);
  const { strips } = stripsOf(rows, blank.jointing);
  const members = rows.flatMap(({ board, member, straightening }, index) => {
    const strip = strips[index];
    if (!strip) return [];
    return {
      boardId: board.id,
      tag: printTag(board.tagNumber),
      species: board.species,
      place: board.place,
      thickness: board.thickness,
      length: straightening.length,
      width: straightening.width,
      straighteningId: straightening.id,
      side: straightening.side,
      endForEnd: member.endForEnd,
      rect: strip.rect,
      takes: strip.takes,
    };
  });
  return { jointing: blank.jointing, members };
}
