/** Reading versions of boards' pictures. */
import "server-only";
import { findBoard } from "@/db/queries/board";
import { findStraightening, listStraightenings } from "@/db/queries/straightening";
import type { Straightening } from "@/lib/schemas/straightening";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound } from "../faults";
import { pictureResponse } from "../pictures/picture-response";
import { straighteningOf } from "./straightening-of";

export async function readStraightening(access: ShopAccess, straighteningId: string): Promise<Straightening> {
  const row = await findStraightening(database(), access.shopId, straighteningId);
  if (!row) throw notFound("version of a board's picture");
  return straighteningOf(database(), access.shopId, row);
}

/** All versions of a board's picture, the newest first. */
export async function readStraightenings(access: ShopAccess, boardId: string): Promise<Straightening[]> {
  const db = database();
  if (!(await findBoard(db, access.shopId, boardId))) throw notFound("board");
  const rows = await listStraightenings(db, access.shopId, boardId);
  return Promise.all(rows.map((row) => straighteningOf(db, access.shopId, row)));
}

export async function straighteningLevel(access: ShopAccess, straighteningId: string, level: number): Promise<Response> {
  const row = await findStraightening(database(), access.shopId, straighteningId);
  if (!row) throw notFound("version of a board's picture");
  return pictureResponse(row.levels, level, `board-${row.boardId}-${row.version}-${level}.jpg`);
}
