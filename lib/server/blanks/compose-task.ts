/** Makes the picture of a planned blank from the straightened pictures of its boards. Stopping and failing leave what they leave of any picture. */
import "server-only";
import type { Connection } from "@/db/client";
import { findBlank, listMembers } from "@/db/queries/blank";
import { lockBoard } from "@/db/queries/board";
import { recordHistory } from "@/db/queries/history";
import { endWaitingStraightening, findStraightening, type StraighteningRow, setBoardPicture } from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import { blankScale } from "@/lib/layout";
import { database } from "../database";
import type { MemberRequest } from "../pictures/compose";
import { compose } from "../pictures/pixel-pool";
import { storage } from "../storage";
import { putStraighteningFiles, removeStraighteningFiles } from "../straightenings/straightening-files";
import { abandonPicture, pictureTask } from "../straightenings/waiting-picture";
import type { TaskContext, TaskKind } from "../tasks/task-kind";
import { stripsOf } from "./blank-plan";

/** What the maker reads; the cause goes to the log. */
const ourFault =
  "The picture could not be composed: something went wrong on our side. Take the blank apart and plan it again to try once more.";

export const composeTask: TaskKind = {
  async work(payload, context) {
    const { straighteningId } = pictureTask.parse(payload);
    const { shopId, signal } = context;
    try {
      const version = await findStraightening(database(), shopId, straighteningId);
      if (version?.state !== "waiting") throw new Error("there is no version that waits for this picture");
      await removeStraighteningFiles(shopId, straighteningId);
      const made = await makePicture(version, context);
      return (tx, at) => keep(tx, shopId, version, made, at);
    } catch (error) {
      if (signal.aborted) throw error;
      throw new Error(ourFault, { cause: error });
    }
  },
  abandon: abandonPicture,
};

type Made = Pick<StraighteningRow, "pxPerMm" | "levels">;

async function makePicture(version: StraighteningRow, { shopId, signal, onProgress }: TaskContext): Promise<Made> {
  const db = database();
  const blank = await findBlank(db, shopId, version.boardId);
  const members = await listMembers(db, shopId, version.boardId);
  if (!blank) throw new Error("the blank of a picture is gone");
  const { strips } = stripsOf(members, blank.jointing);
  const { length, width } = version;
  const finest = members.map(({ straightening }) => straightening.pxPerMm);
  const scale = blankScale(length, width, finest);
  const sent = members.map(async ({ straightening }, index): Promise<MemberRequest> => {
    const strip = strips[index];
    if (!strip) throw new Error("a board of a blank has no strip");
    return { ...(await pictureAt(straightening, scale.pxPerMm)), fullPxPerMm: straightening.pxPerMm, strip };
  });
  const { pxPerMm, levels } = await compose({ length, width, members: await Promise.all(sent) }, { signal, onProgress });
  return { pxPerMm, levels: await putStraighteningFiles(shopId, version.id, levels, signal) };
}

/** The smallest level that is still as fine as asked for. Each is half of the one before, its sides rounded up. */
async function pictureAt({ levels, pxPerMm }: StraighteningRow, wanted: number) {
  const [full] = levels;
  if (!full) throw new Error("a board of a blank has no picture");
  const along = (level: typeof full) => (pxPerMm * level.widthPx) / full.widthPx;
  const level = levels.findLast((one) => along(one) >= wanted) ?? full;
  const bytes = await storage().get(level.key);
  if (!bytes) throw new Error(`the picture ${level.key} is gone from the storage`);
  return { bytes, pxPerMmAlong: along(level), pxPerMmAcross: (pxPerMm * level.heightPx) / full.heightPx };
}

/** Outline, areas and glue lines are drawn on it since it was planned. */
async function keep(tx: Connection, shopId: ShopId, version: StraighteningRow, made: Made, at: Date): Promise<void> {
  const { id, boardId, length, width } = version;
  const board = await lockBoard(tx, shopId, boardId);
  if (!board) throw new Error("the board of a version is gone");
  if (!(await endWaitingStraightening(tx, shopId, id, { ...made, residual: null, state: "done" }))) {
    throw new Error("the version waits for no picture any more");
  }
  await setBoardPicture(tx, shopId, { boardId, straighteningId: id, size: { length, width, revision: board.revision + 1 } }, at);
  const detail = { version: version.version, straighteningId: id, side: version.side, length, width };
  await recordHistory(tx, shopId, { userId: null, noun: "board", nounId: boardId, verb: "composed", detail }, at);
}
