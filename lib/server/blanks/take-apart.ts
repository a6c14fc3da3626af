/** Giving up a planned blank: its boards are free again, its tag is never given anew. Not once an order was issued from it. */
import "server-only";
import { deleteBlank, findBlank, isGlued, isIssued, listMembers } from "@/db/queries/blank";
import { listBoardHolds, lockBoard, setBoardState } from "@/db/queries/board";
import { recordHistory } from "@/db/queries/history";
import { listStraightenings } from "@/db/queries/straightening";
import { glueUpId } from "@/lib/schemas/order-steps";
import { printTag } from "@/lib/schemas/tag";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";

export async function takeApart(access: ShopAccess, boardId: string): Promise<void> {
  const { shopId, userId } = access;
  const at = new Date();
  await database().transaction(async (tx) => {
    const seen = await listMembers(tx, shopId, boardId);
    // In the order of ids, as everywhere; the blank among its boards.
    for (const id of [boardId, ...seen.map(({ board }) => board.id)].sort()) await lockBoard(tx, shopId, id);
    const blank = await findBlank(tx, shopId, boardId);
    const board = await lockBoard(tx, shopId, boardId);
    if (!blank || !board) throw notFound("planned blank");
    const tag = printTag(board.tagNumber);
    if (await isIssued(tx, shopId, boardId)) {
      throw refused(`A cut order was issued from ${tag}: it is not taken apart any more.`);
    }
    if (await isGlued(tx, shopId, boardId, glueUpId(tag))) {
      throw refused(`${tag} was photographed in one piece: it is glued up, and not taken apart any more.`);
    }
    const [hold] = await listBoardHolds(tx, shopId, [boardId]);
    if (hold) throw refused(`${tag} is on the table of ${hold.faceTitle} (${hold.jobTitle}). Take it off that table first.`);
    const versions = await listStraightenings(tx, shopId, boardId);
    if (versions.some(({ state }) => state === "waiting")) {
      throw refused(`A picture of ${tag} is being made. Wait until it is done, or stop it.`);
    }
    await deleteBlank(tx, shopId, boardId);
    await setBoardState(tx, shopId, boardId, "gone", at);
    const entry = { userId, noun: "board", nounId: boardId, verb: "taken apart" } as const;
    await recordHistory(tx, shopId, { ...entry, detail: { tag, members: seen.map((one) => printTag(one.board.tagNumber)) } }, at);
    for (const member of seen) {
      const detail = { blankId: boardId, tag };
      await recordHistory(tx, shopId, { ...entry, nounId: member.board.id, verb: "out of blank", detail }, at);
    }
  });
}
