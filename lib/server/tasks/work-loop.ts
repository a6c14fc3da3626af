/** Works off the queue until told to end: one task at a time, a short wait when there is none. Any number of processes may run it. */
import "server-only";
import { setTimeout as sleep } from "node:timers/promises";
import type { Database } from "@/db/client";
import { claimTask } from "@/db/queries/task";
import type { taskKinds } from "@/lib/schemas/task";
import { log } from "../log";
import { leaseMs, runTask } from "./run-task";
import type { TaskKind } from "./task-kind";

const idleMs = 400;
const afterFaultMs = 5_000;

export async function workLoop(
  db: Database,
  kinds: Record<(typeof taskKinds)[number], TaskKind>,
  ending: AbortSignal,
): Promise<void> {
  while (!ending.aborted) {
    try {
      const now = Date.now();
      const row = await claimTask(db, new Date(now), new Date(now + leaseMs));
      if (row) await runTask(db, kinds[row.kind], row, ending);
      else await pause(idleMs, ending);
    } catch (error) {
      log().error({ err: error }, "the queue cannot be reached; trying again");
      await pause(afterFaultMs, ending);
    }
  }
}

async function pause(ms: number, ending: AbortSignal): Promise<void> {
  await sleep(ms, undefined, { signal: ending }).catch((error: unknown) => {
    if (!ending.aborted) throw error;
  });
}
