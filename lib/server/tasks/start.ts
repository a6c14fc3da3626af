/** Starts this process' work loops, one for each lane, and ends them with the process. */
import "server-only";
import { database } from "../database";
import { env } from "../env";
import { log } from "../log";
import { kinds } from "./kinds";
import { inLane, lanes, placesOf } from "./lanes";
import { workLoop } from "./work-loop";
import { keepWorkerBeside } from "./worker-beside";

const held = globalThis as typeof globalThis & { grainwrightWorking?: AbortController };

/** Answers when the loops have ended. Called again in the same process it does nothing. */
export async function startWorking(): Promise<void> {
  if (held.grainwrightWorking) return;
  const ending = new AbortController();
  held.grainwrightWorking = ending;
  process.once("SIGINT", () => ending.abort());
  // May come twice, by way of the process group and of the web server; the second must not cut the ending short.
  for (const signal of ["SIGTERM", "SIGHUP"] as const) process.on(signal, () => ending.abort());
  log().info("working off tasks");
  const places = placesOf();
  await Promise.all(lanes.map((lane) => workLoop(database(), inLane(kinds, lane), ending.signal, places[lane])));
}

/**
 * In the web server: starts without waiting, unless the environment leaves tasks to other machines. A server for working on the code works
 * them off itself, because a process beside it would run what was bundled last.
 */
export function startWorkingBeside(): void {
  if (!env().TASKS_IN_WEB) return;
  if (env().NODE_ENV === "production") keepWorkerBeside();
  else startWorking().catch((error) => log().fatal({ err: error }, "the work loops ended"));
}
