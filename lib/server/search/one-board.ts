/** The one board of a search for better places. */
import "server-only";
import type { Connection } from "@/db/client";
import type { BoardWithPicture } from "@/db/queries/board";
import { insertSearchBoards } from "@/db/queries/wood-search";
import type { ShopId } from "@/db/shop-id";

/** With nothing to compare it with, how glad the shop is to use it says nothing: the same for every place. */
const STOCK = 0.5;

export async function insertOneBoard(
  tx: Connection,
  shopId: ShopId,
  searchId: string,
  { id, tagNumber }: BoardWithPicture["board"],
  straighteningId: string,
): Promise<void> {
  await insertSearchBoards(tx, shopId, [
    { searchId, boardId: id, tagNumber, straighteningId, stock: STOCK, total: null, finding: null },
  ]);
}
