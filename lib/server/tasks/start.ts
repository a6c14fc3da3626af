/** Starts this process' work loops, one for each lane, and ends them with the process. */
import "server-only";
import { database } from "../database";
import { env } from "../env";
import { log } from "../log";
import { kinds } from "./kinds";
import { inLane, lanes, placesOf } from "./lanes";
import { workLoop } from "./work-loop";

const held = globalThis as typeof globalThis & { grainwrightWorking?: AbortController };

/** Answers when the loops have ended. Called again in the same process it does nothing. */
export async function startWorking(): Promise<void> {
  if (held.grainwrightWorking) return;
  const ending = new AbortController();
  held.grainwrightWorking = ending;
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"] as const) process.once(signal, () => ending.abort());
  log().info("working off tasks");
  const places = placesOf();
  await Promise.all(lanes.map((lane) => workLoop(database(), inLane(kinds, lane), ending.signal, places[lane])));
}

/** In the web process: starts without waiting, unless the environment leaves tasks to other machines. */
export function startWorkingBeside(): void {
  if (!env().TASKS_IN_WEB) return;
  startWorking().catch((error) => log().fatal({ err: error }, "the work loops ended"));
}
