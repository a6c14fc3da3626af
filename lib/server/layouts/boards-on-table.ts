/** Which boards lie on a layout's table, and with which version of their picture. */
import "server-only";
import type { Connection } from "@/db/client";
import { listInBlanks, listTakenApart } from "@/db/queries/blank";
import { lockBoard } from "@/db/queries/board";
import { recordHistory } from "@/db/queries/history";
import {
  deleteLayoutBoard,
  findCurrentStraightening,
  findDoneStraightening,
  insertLayoutBoard,
  listLayoutBoards,
  lockLayout,
  updateLayoutBoard,
} from "@/db/queries/layout";
import { printTag } from "@/lib/schemas/tag";
import { inBlankSentence, takenApartSentence } from "@/lib/words/in-blank";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { markSuperseded } from "../orders/supersede";
import { type LayoutBoard, layoutBoards } from "./read-layout";

export async function putBoardOnTable(access: ShopAccess, faceId: string, boardId: string): Promise<LayoutBoard> {
  return onLockedTable(access, faceId, async (tx, layoutId, at) => {
    await refuseInBlank(tx, access, boardId);
    const straighteningId = await findCurrentStraightening(tx, access.shopId, boardId);
    if (!straighteningId) throw refused("This board has no straightened picture yet. Mark a photograph of it first.");
    const there = (await listLayoutBoards(tx, access.shopId, layoutId)).some(({ board }) => board.id === boardId);
    if (!there) {
      await insertLayoutBoard(tx, access.shopId, layoutId, boardId, straighteningId);
      const detail = { boardId, straighteningId };
      await recordHistory(
        tx,
        access.shopId,
        { userId: access.userId, noun: "layout", nounId: layoutId, verb: "board put on", detail },
        at,
      );
    }
    return boardOnTable(tx, access, layoutId, boardId);
  });
}

export async function takeBoardOffTable(access: ShopAccess, faceId: string, boardId: string): Promise<void> {
  await onLockedTable(access, faceId, async (tx, layoutId, at, document) => {
    const { tag } = await boardOnTable(tx, access, layoutId, boardId);
    const pieces = document.groups.filter(({ placement }) => placement?.stockId === boardId).flatMap(({ pieceIds }) => pieceIds);
    if (pieces.length > 0) {
      throw refused(
        `${pieces.length === 1 ? "A piece lies" : `${pieces.length} pieces lie`} on ${tag}. Move them to another board first.`,
      );
    }
    await deleteLayoutBoard(tx, access.shopId, layoutId, boardId);
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "layout", nounId: layoutId, verb: "board taken off", detail: { boardId } },
      at,
    );
  });
}

/** The layout lies on another version of the board's picture from now on. An order issued from the earlier one is out of date. */
export async function moveToVersion(
  access: ShopAccess,
  faceId: string,
  boardId: string,
  straighteningId: string,
): Promise<LayoutBoard> {
  return onLockedTable(access, faceId, async (tx, layoutId, at) => {
    await boardOnTable(tx, access, layoutId, boardId);
    const version = await findDoneStraightening(tx, access.shopId, boardId, straighteningId);
    if (!version) throw notFound("version of this board's picture");
    await updateLayoutBoard(tx, access.shopId, layoutId, boardId, straighteningId);
    await markSuperseded(tx, access.shopId, faceId, { userId: access.userId, reason: "picture changed" }, at);
    const detail = { boardId, straighteningId };
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "layout", nounId: layoutId, verb: "moved to version", detail },
      at,
    );
    return boardOnTable(tx, access, layoutId, boardId);
  });
}

/** Locked first: who plans a blank with the board at the same moment waits, or has it already. */
async function refuseInBlank(tx: Connection, { shopId }: ShopAccess, boardId: string): Promise<void> {
  const board = await lockBoard(tx, shopId, boardId);
  if (!board) throw notFound("board");
  const [inBlank] = await listInBlanks(tx, shopId, [boardId]);
  const tag = printTag(board.tagNumber);
  if (inBlank) throw refused(inBlankSentence(tag, printTag(inBlank.blankTagNumber)));
  if ((await listTakenApart(tx, shopId, [boardId])).has(boardId)) throw refused(takenApartSentence(tag));
}

type Document = NonNullable<Awaited<ReturnType<typeof lockLayout>>>["document"];

async function onLockedTable<T>(
  access: ShopAccess,
  faceId: string,
  act: (tx: Connection, layoutId: string, at: Date, document: Document) => Promise<T>,
): Promise<T> {
  return database().transaction(async (tx) => {
    const layout = await lockLayout(tx, access.shopId, faceId);
    if (!layout) throw notFound("face");
    return act(tx, layout.id, new Date(), layout.document);
  });
}

async function boardOnTable(tx: Connection, access: ShopAccess, layoutId: string, boardId: string): Promise<LayoutBoard> {
  const found = (await layoutBoards(tx, access.shopId, layoutId)).find((board) => board.boardId === boardId);
  if (!found) throw notFound(`board on this table`);
  return found;
}
