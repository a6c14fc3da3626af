/** The program of a pixel thread: one exported function per job. Bundled on its own, because threads load plain JavaScript. */
import "server-only";
import sharp from "sharp";
import { stopIfCancelled } from "./cancel-flag";
import { composeInThread } from "./compose";
import { inspectInThread } from "./inspect-upload";
import type { PixelJobName, PixelJobs, PixelTask } from "./pixel-job";
import { straightenInThread } from "./straighten";
import { makeUprightInThread } from "./upright";

// Every photograph is seen once; kept operations would only hold memory.
sharp.cache(false);

type Job<Name extends PixelJobName> = (task: PixelTask<Name>) => Promise<PixelJobs[Name]["answer"]>;

export const inspect: Job<"inspect"> = async ({ request, cancel }) => {
  stopIfCancelled(cancel);
  return inspectInThread(request.bytes);
};

export const upright: Job<"upright"> = async ({ request, cancel }) => {
  stopIfCancelled(cancel);
  return makeUprightInThread(request.bytes, () => stopIfCancelled(cancel));
};

export const straighten: Job<"straighten"> = ({ request, cancel, progress }) =>
  straightenInThread(request.bytes, request.marking, (share) => {
    stopIfCancelled(cancel);
    progress.postMessage(share);
  });

export const compose: Job<"compose"> = ({ request, cancel, progress }) =>
  composeInThread(request, (share) => {
    stopIfCancelled(cancel);
    progress.postMessage(share);
  });
