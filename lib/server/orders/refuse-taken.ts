/** Refuses to issue from a board whose picture belongs to a cut order, or that was cut into since it was photographed. */
import "server-only";
import type { Connection } from "@/db/client";
import type { ShopId } from "@/db/shop-id";
import { printTag } from "@/lib/schemas/tag";
import { takenBySentence } from "@/lib/words/taken-by";
import { takersOf } from "../layouts/taken-by";
import { refusedFor } from "./freeze";

/** `used`: the boards that the layout's pieces lie on. Those that only stand on its table do not matter. */
export async function refuseTaken(
  db: Connection,
  shopId: ShopId,
  layoutId: string,
  used: readonly { readonly board: { readonly id: string; readonly tagNumber: number } }[],
): Promise<void> {
  const takers = await takersOf(db, shopId, layoutId);
  const sentences = used.flatMap(({ board }) => {
    const taker = takers.get(board.id);
    return taker ? takenBySentence(printTag(board.tagNumber), taker) : [];
  });
  if (sentences.length > 0) throw refusedFor(sentences);
}
