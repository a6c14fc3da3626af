/** Marks taken: judged at once by the core, then a version that waits and the task that makes its picture, in one transaction. */
import "server-only";
import { lockBoard } from "@/db/queries/board";
import { recordHistory } from "@/db/queries/history";
import { lockPhoto } from "@/db/queries/photo";
import {
  findBoardPicture,
  findStraightening,
  insertWaitingStraightening,
  setStraighteningTask,
} from "@/db/queries/straightening";
import { insertTask } from "@/db/queries/task";
import { fitMarking } from "@/lib/layout";
import type { BodyOf } from "@/lib/schemas/endpoint";
import type { startStraightening as endpoint, Straightening } from "@/lib/schemas/straightening";
import { marksRefusalWords } from "@/lib/words/marks-refusal";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { lengthStyleOf } from "../shops";
import { straighteningOf } from "./straightening-of";

export async function startStraightening(
  access: ShopAccess,
  boardId: string,
  { photoId, marking, side = "face" }: BodyOf<typeof endpoint>,
): Promise<Straightening> {
  const style = await lengthStyleOf(access.shopId);
  const at = new Date();
  return database().transaction(async (tx) => {
    const board = await lockBoard(tx, access.shopId, boardId);
    if (!board) throw notFound("board");
    const photo = await lockPhoto(tx, access.shopId, photoId);
    if (!photo) throw notFound("photograph");
    if (side === "back" && !(await findBoardPicture(tx, access.shopId, boardId))) {
      throw refused("The back is taken as the face turned over. Mark a photograph of the face first.");
    }
    const fit = fitMarking(marking, { width: photo.widthPx, height: photo.heightPx });
    if (!fit.ok) throw refused(marksRefusalWords(fit.refusal, style));

    const { length, width } = fit;
    const fields = { boardId, photoId, side, marking, length, width, createdBy: access.userId, createdAt: at };
    const { id: straighteningId, version } = await insertWaitingStraightening(tx, access.shopId, fields);
    const taskId = await insertTask(tx, access.shopId, {
      kind: "straighten",
      payload: { straighteningId },
      createdBy: access.userId,
      createdAt: at,
    });
    await setStraighteningTask(tx, access.shopId, straighteningId, taskId);
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "board", nounId: boardId, verb: "marked", detail: { version, straighteningId, side } },
      at,
    );
    const row = await findStraightening(tx, access.shopId, straighteningId);
    if (!row) throw new Error("a version just made cannot be found");
    return straighteningOf(tx, access.shopId, row);
  });
}
