/** Figure read in a thread of its own, so that requests are answered meanwhile. */
import "server-only";
import path from "node:path";
import Piscina from "piscina";
import type { FigureJobName, FigureJobs } from "./figure-job";

/** Long enough that boards stay decoded while somebody works at a layout table; then the thread gives its memory back. */
const idleMs = 120_000;

declare global {
  /** Next.js may load this module more than once in one process; the threads must not multiply with it. */
  var grainwrightFigurePool: Piscina | undefined;
}

/** Rejects with the signal's reason when nobody waits for the answer any more and the work has not begun. */
export function readFigure<Name extends FigureJobName>(
  name: Name,
  request: FigureJobs[Name]["request"],
  signal?: AbortSignal,
): Promise<FigureJobs[Name]["answer"]> {
  return figurePool().run(request, { name, ...(signal && { signal }) });
}

/** Ends the thread; the next reading starts a new one. */
export async function closeFigurePool(): Promise<void> {
  const pool = globalThis.grainwrightFigurePool;
  globalThis.grainwrightFigurePool = undefined;
  await pool?.destroy();
}

function figurePool(): Piscina {
  globalThis.grainwrightFigurePool ??= new Piscina({
    // Made by scripts/bundle.mjs. The comment keeps the bundler from following a path that exists at run time only.
    filename: path.join(/* turbopackIgnore: true */ process.cwd(), ".data", "build", "figure-worker.mjs"),
    minThreads: 0,
    // One: two would each decode the same boards.
    maxThreads: 1,
    idleTimeout: idleMs,
  });
  return globalThis.grainwrightFigurePool;
}
