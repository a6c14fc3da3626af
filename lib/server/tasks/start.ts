/** Starts this process' work loop and ends it with the process. */
import "server-only";
import { database } from "../database";
import { env } from "../env";
import { log } from "../log";
import { kinds } from "./kinds";
import { workLoop } from "./work-loop";

const held = globalThis as typeof globalThis & { grainwrightWorking?: AbortController };

/** Answers when the loop has ended. Called again in the same process it does nothing. */
export async function startWorking(): Promise<void> {
  if (held.grainwrightWorking) return;
  const ending = new AbortController();
  held.grainwrightWorking = ending;
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"] as const) process.once(signal, () => ending.abort());
  log().info("working off tasks");
  await workLoop(database(), kinds, ending.signal);
}

/** In the web process: starts without waiting, unless the environment leaves tasks to other machines. */
export function startWorkingBeside(): void {
  if (!env().TASKS_IN_WEB) return;
  startWorking().catch((error) => log().fatal({ err: error }, "the work loop ended"));
}
