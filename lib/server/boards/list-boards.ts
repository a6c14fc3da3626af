/** The rack: one page of boards with all that the page shows, in a number of queries that does not grow with it. */
import "server-only";
import type { z } from "zod";
import { listBoardHolds, listBoards, listSpecies, sumUpBoards } from "@/db/queries/board";
import { um } from "@/lib/layout";
import type { BoardQuery, boardPageSchema } from "@/lib/schemas/board";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { boardRowOf } from "./board-of";

export type BoardPage = z.output<typeof boardPageSchema>;

export async function readBoardPage(access: ShopAccess, query: BoardQuery): Promise<BoardPage> {
  const db = database();
  const [rows, { total, longest }, species] = await Promise.all([
    listBoards(db, access.shopId, query),
    sumUpBoards(db, access.shopId, query),
    listSpecies(db, access.shopId),
  ]);
  const ids = rows.map(({ board }) => board.id);
  const holds = await listBoardHolds(db, access.shopId, ids);
  return {
    items: rows.map((row) => boardRowOf(row, holds)),
    total,
    page: query.page,
    pageSize: query.pageSize,
    longest: longest ?? um(0),
    species,
  };
}

/** Every species of the shop, for typing ahead. */
export async function readSpecies(access: ShopAccess): Promise<string[]> {
  return listSpecies(database(), access.shopId);
}
