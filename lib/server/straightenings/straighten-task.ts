/**
 * Makes the picture of a version that waits for it. A run that was killed leaves files under the version's own prefix at most; the next
 * run clears them first. Files are removed here only by whoever holds the claim: a run that lost it may no longer touch them.
 */
import "server-only";
import { findPhoto, type PhotoRow } from "@/db/queries/photo";
import { findStraightening, type StraighteningRow } from "@/db/queries/straightening";
import { umFromMm } from "@/lib/layout";
import { marksRefusalWords } from "@/lib/words/marks-refusal";
import { database } from "../database";
import { straighten } from "../pictures/pixel-pool";
import { lengthStyleOf } from "../shops";
import { storage } from "../storage";
import type { TaskContext, TaskKind } from "../tasks/task-kind";
import { keepPicture, type MadePicture } from "./keep-picture";
import { putStraighteningFiles, removeStraighteningFiles } from "./straightening-files";
import { abandonPicture, pictureTask } from "./waiting-picture";

/** What the maker reads where the reason is no business of theirs; the cause goes to the log. */
const ourFault = "The picture could not be made: something went wrong on our side. Mark the photograph again to try once more.";

export const straightenTask: TaskKind = {
  async work(payload, context) {
    const { straighteningId } = pictureTask.parse(payload);
    const { shopId, signal } = context;
    try {
      const version = await findStraightening(database(), shopId, straighteningId);
      if (version?.state !== "waiting") throw new Error("there is no version that waits for this picture");
      await removeStraighteningFiles(shopId, straighteningId);
      const made = await makePicture(version, context);
      return (tx, at) => keepPicture(tx, shopId, version, made, at);
    } catch (error) {
      if (signal.aborted || error instanceof WordedRefusal) throw error;
      throw new Error(ourFault, { cause: error });
    }
  },

  abandon: abandonPicture,
};

/** A reason that the maker can do something about, in words. */
class WordedRefusal extends Error {}

async function makePicture(version: StraighteningRow, { shopId, signal, onProgress }: TaskContext): Promise<MadePicture> {
  const { photoId, marking } = version;
  if (photoId === null || marking === null) throw new Error("a picture that is composed of others cannot be straightened");
  const photo = await findPhoto(database(), shopId, photoId);
  if (!photo) throw new Error("the photograph of a version is gone");
  const outcome = await straighten({ source: await originalOf(photo), marking, onProgress, signal });
  if (!outcome.ok) {
    if (outcome.of === "photo") throw new Error(`an original that was taken in cannot be read: ${outcome.refusal.reason}`);
    throw new WordedRefusal(marksRefusalWords(outcome.refusal, await lengthStyleOf(shopId)));
  }
  const { length, width, pxPerMm, rmsMm, levels } = outcome;
  const stored = await putStraighteningFiles(shopId, version.id, levels, signal);
  return { length, width, pxPerMm, residual: umFromMm(rmsMm), levels: stored };
}

async function originalOf({ originalKey }: PhotoRow): Promise<Uint8Array> {
  const bytes = await storage().get(originalKey);
  if (!bytes) throw new Error(`the original ${originalKey} is gone from the storage`);
  return bytes;
}
