/**
 * Works off the queue of these kinds until told to end, one task after the other or a few at once, with a short wait when there is none. Any
 * number of processes may run it.
 */
import "server-only";
import { setTimeout as sleep } from "node:timers/promises";
import type { Database } from "@/db/client";
import { claimTask } from "@/db/queries/task";
import type { taskKinds } from "@/lib/schemas/task";
import { log } from "../log";
import { leaseMs, runTask } from "./run-task";
import type { TaskKind } from "./task-kind";

type Kind = (typeof taskKinds)[number];

const idleMs = 400;
const afterFaultMs = 5_000;

/** `places`: so many tasks at once. */
export async function workLoop(
  db: Database,
  kinds: Partial<Record<Kind, TaskKind>>,
  ending: AbortSignal,
  places = 1,
): Promise<void> {
  const wanted = Object.keys(kinds) as Kind[];
  const running = new Set<Promise<void>>();
  while (!ending.aborted) {
    try {
      const now = Date.now();
      const row = await claimTask(db, new Date(now), new Date(now + leaseMs), wanted);
      const kind = row && kinds[row.kind];
      if (kind) begin(running, runTask(db, kind, row, ending));
      else await pause(idleMs, ending);
    } catch (error) {
      log().error({ err: error }, "the queue cannot be reached; trying again");
      await pause(afterFaultMs, ending);
    }
    if (running.size >= places) await Promise.race(running);
  }
  await Promise.all(running);
}

/** Keeps account of a task under way. What its row cannot be told any more is told to the log; its lease will run out. */
function begin(running: Set<Promise<void>>, work: Promise<void>): void {
  const accounted = work
    .catch((error: unknown) => log().error({ err: error }, "a task's end could not be written"))
    .finally(() => running.delete(accounted));
  running.add(accounted);
}

async function pause(ms: number, ending: AbortSignal): Promise<void> {
  await sleep(ms, undefined, { signal: ending }).catch((error: unknown) => {
    if (!ending.aborted) throw error;
  });
}
