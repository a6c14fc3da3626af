/** Boards searched in threads of their own, so that requests are answered meanwhile. */
import "server-only";
import path from "node:path";
import { MessageChannel } from "node:worker_threads";
import Piscina from "piscina";
import { createCancelFlag, raiseCancelFlag } from "../pictures/cancel-flag";
import type { SearchAnswer, SearchAsked, SearchTask } from "./search-job";

/** Threads that have had nothing to do for so long end, and give their memory back. */
const idleMs = 60_000;

/** Boards searched at once: one for each core of a small machine. */
export const SEARCH_THREADS = 2;

declare global {
  /** Next.js may load this module more than once in one process; the threads must not multiply with it. */
  var grainwrightSearchPool: Piscina | undefined;
}

/** Rejects with the signal's reason when cancelled, otherwise only where the thread itself fails. */
export async function searchInThread(
  asked: SearchAsked,
  { signal, onProgress }: { signal?: AbortSignal; onProgress?: (share: number) => void } = {},
): Promise<SearchAnswer> {
  signal?.throwIfAborted();
  const cancel = createCancelFlag();
  const raise = (): void => raiseCancelFlag(cancel);
  signal?.addEventListener("abort", raise, { once: true });
  const { port1, port2 } = new MessageChannel();
  port1.on("message", (share: number) => onProgress?.(share));
  const task: SearchTask = { asked, cancel, progress: port2 };
  try {
    const answer: SearchAnswer = await searchPool().run(task, { transferList: [port2] });
    signal?.throwIfAborted();
    return answer;
  } catch (error) {
    signal?.throwIfAborted();
    throw error;
  } finally {
    signal?.removeEventListener("abort", raise);
    port1.close();
  }
}

/** Ends the threads; the next search starts new ones. */
export async function closeSearchPool(): Promise<void> {
  const pool = globalThis.grainwrightSearchPool;
  globalThis.grainwrightSearchPool = undefined;
  await pool?.destroy();
}

function searchPool(): Piscina {
  globalThis.grainwrightSearchPool ??= new Piscina({
    // Made by scripts/bundle.mjs. The comment keeps the bundler from following a path that exists at run time only.
    filename: path.join(/* turbopackIgnore: true */ process.cwd(), ".data", "build", "search-worker.mjs"),
    minThreads: 0,
    maxThreads: SEARCH_THREADS,
    idleTimeout: idleMs,
  });
  return globalThis.grainwrightSearchPool;
}
