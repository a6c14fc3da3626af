/**
 * Planning a blank: boards of the rack become one stock with a tag of its own. The boards are locked while it is looked at whether they
 * are free, so that two who plan with one board at once get one blank and one refusal.
 */
import "server-only";
import { v7 as newId } from "uuid";
import type { Connection } from "@/db/client";
import { isDuplicateKey } from "@/db/duplicate-key";
import { insertBlank } from "@/db/queries/blank";
import { insertBoard } from "@/db/queries/board";
import { replaceGlueLines } from "@/db/queries/glue-line";
import { recordHistory } from "@/db/queries/history";
import { takeNumber } from "@/db/queries/shop";
import { insertWaitingStraightening, replaceKeepClear, setOutline, setStraighteningTask } from "@/db/queries/straightening";
import { insertTask } from "@/db/queries/task";
import { type ComposedBlank, composeBlank } from "@/lib/layout";
import type { PlanBlank } from "@/lib/schemas/blank";
import type { Board } from "@/lib/schemas/board";
import { printTag } from "@/lib/schemas/tag";
import { blankRefusalWords } from "@/lib/words/blank-refusal";
import type { ShopAccess } from "../access";
import { readBoard } from "../boards/read-board";
import { database } from "../database";
import { conflict, refused } from "../faults";
import { lengthStyleOf } from "../shops";
import { blankFields } from "./blank-fields";
import { type FreeMember, lockFreeMembers } from "./free-members";

export async function planBlank(access: ShopAccess, plan: PlanBlank): Promise<Board> {
  const style = await lengthStyleOf(access.shopId);
  const at = new Date();
  return database().transaction(async (tx) => {
    const members = await lockFreeMembers(tx, access.shopId, plan.members);
    const outcome = composeBlank({ members: members.map(({ drawn }) => drawn), jointing: plan.jointing });
    if (!outcome.ok) {
      const tagOf = (boardId: string) => members.find(({ board }) => board.id === boardId)?.tag ?? "a board";
      throw refused(blankRefusalWords(outcome.refusal, style, tagOf));
    }
    const { blank } = outcome;
    const tagNumber = await takeNumber(tx, access.shopId, "nextBoardNumber");
    const boardId = await insertBoard(tx, access.shopId, tagNumber, blankFields(members, blank, plan), at);
    await insertMembers(tx, access, boardId, plan);
    await startPicture(tx, access, boardId, blank, members, at);
    await tellHistory(tx, access, { boardId, tag: printTag(tagNumber) }, members, at);
    return readBoard(access, boardId, tx);
  });
}

/** The unique key decides where two plan with one board; their locks let one wait for the other, so it speaks up only if a lock is forgotten. */
async function insertMembers(tx: Connection, { shopId }: ShopAccess, boardId: string, { members, jointing }: PlanBlank) {
  const rows = members.map(({ boardId: memberId, straighteningId, endForEnd, along, trim }, position) => ({
    position,
    boardId: memberId,
    straighteningId,
    endForEnd,
    along,
    trimUpper: trim.upper,
    trimLower: trim.lower,
  }));
  await insertBlank(tx, shopId, { boardId, jointing }, rows).catch((error) => {
    if (isDuplicateKey(error))
      throw conflict("A board of this plan has got into another blank meanwhile. Look at the rack and plan again.");
    throw error;
  });
}

/** A version that waits for its picture, with all that is carried over from the boards drawn on it already. */
async function startPicture(
  tx: Connection,
  { shopId, userId }: ShopAccess,
  boardId: string,
  { length, width, outline, keepClear, glueLines }: ComposedBlank,
  members: readonly FreeMember[],
  at: Date,
): Promise<void> {
  const version = {
    boardId,
    photoId: null,
    side: "face",
    marking: null,
    length,
    width,
    createdBy: userId,
    createdAt: at,
  } as const;
  const { id: straighteningId } = await insertWaitingStraightening(tx, shopId, version);
  const payload = { straighteningId };
  const taskId = await insertTask(tx, shopId, { kind: "compose", payload, createdBy: userId, createdAt: at });
  await setStraighteningTask(tx, shopId, straighteningId, taskId);
  await setOutline(tx, shopId, straighteningId, outline && [...outline]);
  const noteOf = (from: ComposedBlank["keepClear"][number]["from"]) =>
    members.find(({ board }) => board.id === from?.member)?.keepClear.find(({ id }) => id === from?.area)?.note ?? "";
  const areas = keepClear.map(({ from, kind, area }) => ({ id: newId(), kind, area: stored(area), note: noteOf(from) }));
  await replaceKeepClear(tx, shopId, straighteningId, areas);
  const lines = glueLines.map(({ across, above, below }) => ({ id: newId(), across, aboveBoardId: above, belowBoardId: below }));
  await replaceGlueLines(tx, shopId, straighteningId, lines);
}

/** The columns' lists may be written to, the core's may not. */
function stored(area: ComposedBlank["keepClear"][number]["area"]) {
  return area.shape === "polygon" ? { ...area, points: [...area.points] } : area;
}

async function tellHistory(
  tx: Connection,
  { shopId, userId }: ShopAccess,
  blank: { readonly boardId: string; readonly tag: string },
  members: readonly FreeMember[],
  at: Date,
): Promise<void> {
  const entry = { userId, noun: "board", nounId: blank.boardId, verb: "planned" } as const;
  await recordHistory(tx, shopId, { ...entry, detail: { tag: blank.tag, members: members.map(({ tag }) => tag) } }, at);
  for (const { board } of members) {
    const detail = { blankId: blank.boardId, tag: blank.tag };
    await recordHistory(tx, shopId, { ...entry, nounId: board.id, verb: "put in blank", detail }, at);
  }
}
