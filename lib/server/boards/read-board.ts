/** One board with its readings. */
import "server-only";
import type { Connection } from "@/db/client";
import { findBoard, listBoardHolds, listReadings } from "@/db/queries/board";
import type { Board } from "@/lib/schemas/board";
import type { ShopAccess } from "../access";
import { readBlank } from "../blanks/read-blank";
import { database } from "../database";
import { notFound } from "../faults";
import { boardRowOf } from "./board-of";

export async function readBoard(access: ShopAccess, boardId: string, db: Connection = database()): Promise<Board> {
  const found = await findBoard(db, access.shopId, boardId);
  if (!found) throw notFound("board");
  const holds = await listBoardHolds(db, access.shopId, [boardId]);
  const row = boardRowOf(found, holds);
  const readings = await listReadings(db, access.shopId, boardId);
  return {
    ...row,
    readings: readings.map(({ id, tenths, takenOn, takenBy }) => ({ id, percent: tenths / 10, takenOn, takenBy })),
    blank: await readBlank(db, access.shopId, boardId, row.tag),
  };
}
