/** Paper drawn in a thread of its own: an order of 300 pieces takes a second, which is no other request's business. */
import "server-only";
import path from "node:path";
import Piscina from "piscina";
import type { PrintJobs } from "./print-job";

/** Orders are printed now and then: after so long without one the thread ends and gives its memory back. */
const idleMs = 60_000;
/** Threads that draw stand back behind the one that answers (steps of nice(2)). */
const standBack = 5;

declare global {
  /** Next.js may load this module more than once in one process; the threads must not multiply with it. */
  var grainwrightPrintPool: Piscina | undefined;
}

/** The file of a cut order; of its labels. */
export function printInThread<Name extends keyof PrintJobs>(name: Name, job: PrintJobs[Name]): Promise<Uint8Array> {
  return printPool().run(job, { name });
}

/** Ends the thread; the next file starts a new one. */
export async function closePrintPool(): Promise<void> {
  const pool = globalThis.grainwrightPrintPool;
  globalThis.grainwrightPrintPool = undefined;
  await pool?.destroy();
}

function printPool(): Piscina {
  globalThis.grainwrightPrintPool ??= new Piscina({
    // Made by scripts/bundle.mjs. The comment keeps the bundler from following a path that exists at run time only.
    filename: path.join(/* turbopackIgnore: true */ process.cwd(), ".data", "build", "print-worker.mjs"),
    minThreads: 0,
    maxThreads: 1,
    idleTimeout: idleMs,
    niceIncrement: standBack,
  });
  return globalThis.grainwrightPrintPool;
}
