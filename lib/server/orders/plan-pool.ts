/** Cut programs worked out in a thread of their own, so that requests are answered meanwhile. */
import "server-only";
import path from "node:path";
import Piscina from "piscina";
import type { CutProgramOutcome, RestPlanOutcome } from "@/lib/layout";
import type { Planner, RestPlanner } from "./plan-cuts";

/** Orders are issued now and then: after so long without one the thread ends and gives its memory back. */
const idleMs = 60_000;

declare global {
  /** Next.js may load this module more than once in one process; the threads must not multiply with it. */
  var grainwrightPlanPool: Piscina | undefined;
}

export const planInThread: Planner = async (request) => {
  const outcome: CutProgramOutcome = await planPool().run(request);
  return outcome;
};

export const planRestInThread: RestPlanner = async (task) => {
  const outcome: RestPlanOutcome = await planPool().run(task, { name: "planRestAndVerify" });
  return outcome;
};

/** Ends the threads; the next order starts new ones. */
export async function closePlanPool(): Promise<void> {
  const pool = globalThis.grainwrightPlanPool;
  globalThis.grainwrightPlanPool = undefined;
  await pool?.destroy();
}

function planPool(): Piscina {
  globalThis.grainwrightPlanPool ??= new Piscina({
    // Made by scripts/bundle.mjs. The comment keeps the bundler from following a path that exists at run time only.
    filename: path.join(/* turbopackIgnore: true */ process.cwd(), ".data", "build", "plan-worker.mjs"),
    minThreads: 0,
    // The boards of one order side by side; the pixels' threads are a pool of their own.
    maxThreads: 2,
    idleTimeout: idleMs,
  });
  return globalThis.grainwrightPlanPool;
}
