/** Entering a board: it gets the next tag number of the shop, and keeps it for good. */
import "server-only";
import { insertBoard, insertReading, refreshMoisture } from "@/db/queries/board";
import { recordHistory } from "@/db/queries/history";
import { takeNumber } from "@/db/queries/shop";
import { um } from "@/lib/layout";
import type { Board, createBoard } from "@/lib/schemas/board";
import type { BodyOf } from "@/lib/schemas/endpoint";
import { printTag } from "@/lib/schemas/tag";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { readBoard } from "./read-board";
import { tenthsOf } from "./tenths";

export async function enterBoard(access: ShopAccess, body: BodyOf<typeof createBoard>): Promise<Board> {
  const { reading, length, width, ...fields } = body;
  const at = new Date();
  return database().transaction(async (tx) => {
    const tagNumber = await takeNumber(tx, access.shopId, "nextBoardNumber");
    const size = { length: length ?? um(0), width: width ?? um(0) };
    const boardId = await insertBoard(tx, access.shopId, tagNumber, { ...fields, ...size, state: "rack" }, at);
    if (reading) {
      const { takenOn } = reading;
      const tenths = tenthsOf(reading.percent);
      await insertReading(tx, access.shopId, boardId, { tenths, takenOn, takenBy: access.userId }, at);
      await refreshMoisture(tx, access.shopId, boardId, at);
    }
    const detail = { tag: printTag(tagNumber), species: fields.species };
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "board", nounId: boardId, verb: "entered", detail },
      at,
    );
    return readBoard(access, boardId, tx);
  });
}
