/** Searches for wood and what they found. */
import "server-only";
import { and, asc, count, desc, eq, gte, inArray, isNull, lt, sql } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import { blankMember, board, boardPicture, straightening, task, woodSearch, woodSearchBoard } from "../schema";
import type { ShopId } from "../shop-id";

export type WoodSearchRow = typeof woodSearch.$inferSelect;
export type SearchBoardRow = typeof woodSearchBoard.$inferSelect;
type Finding = NonNullable<SearchBoardRow["finding"]>;

export async function insertSearch(
  tx: Connection,
  shopId: ShopId,
  fields: Omit<typeof woodSearch.$inferInsert, "id" | "shopId">,
) {
  const id = newId();
  await tx.insert(woodSearch).values({ ...fields, id, shopId });
  return id;
}

export async function setSearchTask(tx: Connection, shopId: ShopId, searchId: string, taskId: string) {
  await tx
    .update(woodSearch)
    .set({ taskId })
    .where(and(eq(woodSearch.shopId, shopId), eq(woodSearch.id, searchId)));
}

export async function findSearch(db: Connection, shopId: ShopId, searchId: string) {
  const [row] = await db
    .select({ search: woodSearch, task })
    .from(woodSearch)
    .leftJoin(task, eq(task.id, woodSearch.taskId))
    .where(and(eq(woodSearch.shopId, shopId), eq(woodSearch.id, searchId)));
  return row;
}

export async function listSearchesOfFace(db: Connection, shopId: ShopId, faceId: string) {
  return db
    .select({ id: woodSearch.id, taskId: woodSearch.taskId, state: task.state })
    .from(woodSearch)
    .leftJoin(task, eq(task.id, woodSearch.taskId))
    .where(and(eq(woodSearch.shopId, shopId), eq(woodSearch.faceId, faceId)))
    .orderBy(asc(woodSearch.id));
}

export async function deleteSearches(tx: Connection, shopId: ShopId, searchIds: readonly string[]) {
  if (searchIds.length === 0) return;
  const ids = [...searchIds];
  await tx.delete(woodSearchBoard).where(and(eq(woodSearchBoard.shopId, shopId), inArray(woodSearchBoard.searchId, ids)));
  await tx.delete(woodSearch).where(and(eq(woodSearch.shopId, shopId), inArray(woodSearch.id, ids)));
}

/** Every board in the rack with its present picture of the face, in the order of their ids. */
export async function listRackForSearch(db: Connection, shopId: ShopId) {
  return db
    .select({
      id: board.id,
      tagNumber: board.tagNumber,
      species: board.species,
      length: board.length,
      width: board.width,
      thickness: board.thickness,
      costMinor: board.costMinor,
      createdAt: board.createdAt,
      straighteningId: boardPicture.straighteningId,
      inBlankId: blankMember.blankId,
    })
    .from(board)
    .leftJoin(boardPicture, eq(boardPicture.boardId, board.id))
    .leftJoin(blankMember, eq(blankMember.boardId, board.id))
    .where(and(eq(board.shopId, shopId), eq(board.state, "rack")))
    .orderBy(asc(board.id));
}

/** Rows a statement: well below what one packet holds. */
const CHUNK = 500;

export async function insertSearchBoards(tx: Connection, shopId: ShopId, rows: readonly Omit<SearchBoardRow, "shopId">[]) {
  for (let from = 0; from < rows.length; from += CHUNK) {
    await tx.insert(woodSearchBoard).values(rows.slice(from, from + CHUNK).map((row) => ({ ...row, shopId })));
  }
}

/** Boards that are not searched yet, the most promising first. */
export async function listWaitingBoards(db: Connection, shopId: ShopId, searchId: string) {
  return db
    .select()
    .from(woodSearchBoard)
    .where(and(eq(woodSearchBoard.shopId, shopId), eq(woodSearchBoard.searchId, searchId), isNull(woodSearchBoard.total)))
    .orderBy(desc(woodSearchBoard.stock), asc(woodSearchBoard.boardId));
}

export async function keepFinding(
  db: Connection,
  shopId: ShopId,
  searchId: string,
  boardId: string,
  total: number,
  finding: Finding,
) {
  await db
    .update(woodSearchBoard)
    .set({ total, finding })
    .where(and(eq(woodSearchBoard.shopId, shopId), eq(woodSearchBoard.searchId, searchId), eq(woodSearchBoard.boardId, boardId)));
}

export async function countSearchBoards(db: Connection, shopId: ShopId, searchId: string) {
  const [row] = await db
    .select({
      boards: count(),
      searched: sql<number>`count(${woodSearchBoard.total})`.mapWith(Number),
      leftOut: sql<number>`coalesce(sum(${woodSearchBoard.total} < 0), 0)`.mapWith(Number),
    })
    .from(woodSearchBoard)
    .where(and(eq(woodSearchBoard.shopId, shopId), eq(woodSearchBoard.searchId, searchId)));
  return row ?? { boards: 0, searched: 0, leftOut: 0 };
}

/** The best boards found so far, with what a picture of them takes. */
export async function listBestBoards(db: Connection, shopId: ShopId, searchId: string, most: number) {
  return db
    .select({ found: woodSearchBoard, board, straightening })
    .from(woodSearchBoard)
    .innerJoin(board, eq(board.id, woodSearchBoard.boardId))
    .innerJoin(straightening, eq(straightening.id, woodSearchBoard.straighteningId))
    .where(and(eq(woodSearchBoard.shopId, shopId), eq(woodSearchBoard.searchId, searchId), gte(woodSearchBoard.total, 0)))
    .orderBy(desc(woodSearchBoard.total), asc(woodSearchBoard.tagNumber))
    .limit(most);
}

export async function listLeftOutBoards(db: Connection, shopId: ShopId, searchId: string, page: number, pageSize: number) {
  return db
    .select({ found: woodSearchBoard, species: board.species })
    .from(woodSearchBoard)
    .innerJoin(board, eq(board.id, woodSearchBoard.boardId))
    .where(and(eq(woodSearchBoard.shopId, shopId), eq(woodSearchBoard.searchId, searchId), lt(woodSearchBoard.total, 0)))
    .orderBy(asc(woodSearchBoard.tagNumber))
    .limit(pageSize)
    .offset((page - 1) * pageSize);
}
