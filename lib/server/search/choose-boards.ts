/** Every board of the rack for a search: those that come into question wait to be searched, the others are left out with every reason. */
import "server-only";
import type { Connection } from "@/db/client";
import { insertSearchBoards, listRackForSearch, type WoodSearchRow } from "@/db/queries/wood-search";
import type { ShopId } from "@/db/shop-id";
import { type StockLeftOut, stockLeftOut, um } from "@/lib/layout";
import type { BoardFinding, LeftOut } from "@/lib/schemas/wood-search";
import { takersOfPictures } from "../layouts/taken-by";
import { stockWorths } from "./stock-worth";

const THICKEST = um(1_000_000);

export async function chooseBoards(db: Connection, shopId: ShopId, search: WoodSearchRow, now: Date): Promise<void> {
  const rack = await listRackForSearch(db, shopId);
  const taken = await takersOfPictures(
    db,
    shopId,
    rack.flatMap(({ straighteningId }) => straighteningId ?? []),
  );
  const { leastThickness, mostThickness } = search;
  const wish = {
    layout: search.document,
    groupId: search.groupId,
    species: search.species,
    thickness:
      leastThickness === null && mostThickness === null
        ? null
        : { least: leastThickness ?? um(0), most: mostThickness ?? THICKEST },
  };
  const worths = stockWorths(rack, now);
  const rows = rack.map((board, index) => {
    const facts = { ...board, stockId: board.id, isHeld: taken.has(board.id), hasPicture: board.straighteningId !== null };
    const reasons = [...stockLeftOut(wish, facts).map(onWire), ...(board.inBlankId ? [{ reason: "in-blank" } as const] : [])];
    const out = reasons.length > 0;
    return {
      searchId: search.id,
      boardId: board.id,
      tagNumber: board.tagNumber,
      straighteningId: board.straighteningId,
      stock: worths[index] ?? 0,
      total: out ? -1 : null,
      finding: out ? leftOut(reasons) : null,
    };
  });
  await db.transaction((tx) => insertSearchBoards(tx, shopId, rows));
}

export const leftOut = (reasons: LeftOut[]): BoardFinding => ({
  places: [],
  present: null,
  leftOut: reasons,
  positions: 0,
  allowed: 0,
});

export function onWire(reason: StockLeftOut): LeftOut {
  return reason.reason === "no-place" ? { ...reason, obstacles: [...reason.obstacles] } : reason;
}
