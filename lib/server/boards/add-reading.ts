/** Adding a moisture reading. It changes no fact that somebody may be editing, so the board's revision stays. */
import "server-only";
import { insertReading, lockBoard, refreshMoisture } from "@/db/queries/board";
import { recordHistory } from "@/db/queries/history";
import type { addMoistureReading, Board } from "@/lib/schemas/board";
import type { BodyOf } from "@/lib/schemas/endpoint";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound } from "../faults";
import { readBoard } from "./read-board";
import { tenthsOf } from "./tenths";

export async function addReading(
  access: ShopAccess,
  boardId: string,
  { percent, takenOn }: BodyOf<typeof addMoistureReading>,
): Promise<Board> {
  const at = new Date();
  return database().transaction(async (tx) => {
    if (!(await lockBoard(tx, access.shopId, boardId))) throw notFound("board");
    const tenths = tenthsOf(percent);
    await insertReading(tx, access.shopId, boardId, { tenths, takenOn, takenBy: access.userId }, at);
    await refreshMoisture(tx, access.shopId, boardId, at);
    const detail = { percent: tenths / 10, takenOn };
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "board", nounId: boardId, verb: "moisture read", detail },
      at,
    );
    return readBoard(access, boardId, tx);
  });
}
