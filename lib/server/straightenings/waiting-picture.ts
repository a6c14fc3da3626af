/** What every task that makes a board's picture has to say of itself, and what it leaves behind when it comes to nothing. */
import "server-only";
import { z } from "zod";
import { recordHistory } from "@/db/queries/history";
import { endWaitingStraightening, findStraightening } from "@/db/queries/straightening";
import { idSchema } from "@/lib/schemas/ids";
import type { TaskKind } from "../tasks/task-kind";
import { removeStraighteningFiles } from "./straightening-files";

export const pictureTask = z.object({ straighteningId: idSchema });

/** The version says that it failed or was stopped, and has no files. */
export const abandonPicture: TaskKind["abandon"] = async (payload, { shopId }, { state, message }, tx) => {
  const { straighteningId } = pictureTask.parse(payload);
  const version = await findStraightening(tx, shopId, straighteningId);
  const failure = state === "failed" ? message : null;
  if (version && (await endWaitingStraightening(tx, shopId, straighteningId, { state, failure }))) {
    const verb = state === "failed" ? "straightening failed" : "straightening cancelled";
    const detail = { version: version.version, straighteningId, side: version.side, failure };
    await recordHistory(tx, shopId, { userId: null, noun: "board", nounId: version.boardId, verb, detail }, new Date());
  }
  await removeStraighteningFiles(shopId, straighteningId);
};
