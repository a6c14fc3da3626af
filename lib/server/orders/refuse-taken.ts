/** Refuses to issue from a board whose picture belongs to a cut order, that was cut into since it was photographed, or that is in a blank. */
import "server-only";
import type { Connection } from "@/db/client";
import { listInBlanks, listTakenApart } from "@/db/queries/blank";
import type { ShopId } from "@/db/shop-id";
import { printTag } from "@/lib/schemas/tag";
import { inBlankSentence, takenApartSentence } from "@/lib/words/in-blank";
import { takenBySentence } from "@/lib/words/taken-by";
import { takersBesides, takersOf } from "../layouts/taken-by";
import { refusedFor } from "./freeze";

/**
 * `used`: the boards that the layout's pieces lie on. Those that only stand on its table do not matter. `ownOrderId`: of the order whose
 * rest is issued; what it holds and has cut itself does not stand in its way.
 */
export async function refuseTaken(
  db: Connection,
  shopId: ShopId,
  layoutId: string,
  used: readonly { readonly board: { readonly id: string; readonly tagNumber: number } }[],
  ownOrderId?: string,
): Promise<void> {
  const takers = await (ownOrderId === undefined
    ? takersOf(db, shopId, layoutId)
    : takersBesides(db, shopId, layoutId, ownOrderId));
  const ids = used.map(({ board }) => board.id);
  const inBlanks = await listInBlanks(db, shopId, ids);
  const takenApart = await listTakenApart(db, shopId, ids);
  const sentences = used.flatMap(({ board }) => {
    const tag = printTag(board.tagNumber);
    const taker = takers.get(board.id);
    const inBlank = inBlanks.find(({ boardId }) => boardId === board.id);
    if (takenApart.has(board.id)) return takenApartSentence(tag);
    const taken = taker ? [takenBySentence(tag, taker)] : [];
    return inBlank ? [...taken, inBlankSentence(tag, printTag(inBlank.blankTagNumber))] : taken;
  });
  if (sentences.length > 0) throw refusedFor(sentences);
}
