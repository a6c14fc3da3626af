/** Work on pixels, done in worker threads so that requests are answered meanwhile. The only door to the rest of this folder. */
import "server-only";
import path from "node:path";
import { MessageChannel } from "node:worker_threads";
import Piscina from "piscina";
import type { Marking } from "@/lib/layout";
import { createCancelFlag, raiseCancelFlag } from "./cancel-flag";
import type { ComposedPicture, ComposeRequest } from "./compose";
import type { InspectOutcome } from "./inspect-upload";
import type { PixelJobName, PixelJobs, PixelTask } from "./pixel-job";
import type { StraightenOutcome } from "./straighten";
import type { UprightOutcome } from "./upright";

/** Threads that have had nothing to do for so long end, and give their memory back. */
const idleMs = 60_000;
/** As in `.env.example`. Read here and not by `env()`, so that pixels can be worked on where no database is configured. */
const defaultThreads = 2;

declare global {
  /** Next.js may load this module more than once in one process; the threads must not multiply with it. */
  var grainwrightPixelPool: Piscina | undefined;
}

/**
 * Whether the file is a whole picture of a kind, size and length that is taken in, and what it tells of itself. Rejects with the
 * signal's reason when cancelled, otherwise only where the thread itself fails.
 */
export function inspectUpload(bytes: Uint8Array, signal?: AbortSignal): Promise<InspectOutcome> {
  return run("inspect", { bytes }, { signal });
}

/** Inspects like `inspectUpload` and makes the upright picture in levels, with no tag of the original in it. */
export function makeUpright(bytes: Uint8Array, signal?: AbortSignal): Promise<UprightOutcome> {
  return run("upright", { bytes }, { signal });
}

export interface StraightenRequest {
  /** The stored original, or level 0 of its upright picture. */
  readonly source: Uint8Array;
  /** In pixels of the upright picture's full size. */
  readonly marking: Marking;
  /** 0 to 1, never falling; the last call of a picture that succeeds is 1. */
  readonly onProgress?: (share: number) => void;
  readonly signal?: AbortSignal;
}

/** The straightened picture in levels, or what is wrong with photo or marks. Rejects with the signal's reason when cancelled. */
export function straighten({ source, marking, onProgress, signal }: StraightenRequest): Promise<StraightenOutcome> {
  return run("straighten", { bytes: source, marking }, { signal, onProgress });
}

/** The picture of a blank from those of its boards. Rejects with the signal's reason when cancelled. */
export function compose(
  request: ComposeRequest,
  more: { signal?: AbortSignal; onProgress?: (share: number) => void },
): Promise<ComposedPicture> {
  return run("compose", request, more);
}

/** Ends the threads; the next job starts new ones. */
export async function closePixelPool(): Promise<void> {
  const pool = globalThis.grainwrightPixelPool;
  globalThis.grainwrightPixelPool = undefined;
  await pool?.destroy();
}

async function run<Name extends PixelJobName>(
  name: Name,
  request: PixelJobs[Name]["request"],
  { signal, onProgress }: { signal?: AbortSignal; onProgress?: (share: number) => void },
): Promise<PixelJobs[Name]["answer"]> {
  signal?.throwIfAborted();
  const cancel = createCancelFlag();
  const raise = (): void => raiseCancelFlag(cancel);
  signal?.addEventListener("abort", raise, { once: true });
  const { port1, port2 } = new MessageChannel();
  let reached = 0;
  const report = (share: number): void => {
    reached = share;
    if (signal?.aborted !== true) onProgress?.(share);
  };
  port1.on("message", report);
  const task: PixelTask<Name> = { request, cancel, progress: port2 };
  try {
    const answer: PixelJobs[Name]["answer"] = await pixelPool().run(task, { name, transferList: [port2] });
    signal?.throwIfAborted();
    // The answer takes another way than the reports and may overtake the last of them.
    if (answer.ok && reached < 1) report(1);
    return answer;
  } catch (error) {
    signal?.throwIfAborted();
    throw error;
  } finally {
    signal?.removeEventListener("abort", raise);
    port1.close();
  }
}

function pixelPool(): Piscina {
  globalThis.grainwrightPixelPool ??= new Piscina({
    // Made by scripts/bundle.mjs. The comment keeps the bundler from following a path that exists at run time only.
    filename: path.join(/* turbopackIgnore: true */ process.cwd(), ".data", "build", "pixel-worker.mjs"),
    minThreads: 0,
    maxThreads: Number(process.env.PIXEL_THREADS) || defaultThreads,
    idleTimeout: idleMs,
  });
  return globalThis.grainwrightPixelPool;
}
