/** Works off one claimed task: lease kept alive, progress written, cancel heard, the end written with the result in one transaction. */
import "server-only";
import type { Database } from "@/db/client";
import { finishTask, releaseTask, renewTask, type TaskRow } from "@/db/queries/task";
import { log } from "../log";
import type { Keep, TaskKind } from "./task-kind";

/** A lease outlives fifteen missed renewals, so a busy machine does not lose its work to another. */
export const leaseMs = 30_000;
const renewMs = 2_000;
/** After so many starts a task is thought to kill its worker and is given up. */
const maxAttempts = 4;

export async function runTask(db: Database, kind: TaskKind, row: TaskRow, ending: AbortSignal): Promise<void> {
  if (row.claimId === null) throw new Error(`task ${row.id} was not claimed`);
  const claim = { id: row.id, claimId: row.claimId };
  const stop = new AbortController();
  let progress = 0;
  let cancelled = false;
  let lost = false;

  const renew = async () => {
    const state = await renewTask(db, claim, progress, new Date(Date.now() + leaseMs));
    lost = !state.held;
    cancelled = state.cancelRequested;
    if (lost || cancelled) stop.abort();
  };
  const timer = setInterval(() => {
    renew().catch((error) => log().warn({ err: error, taskId: row.id }, "could not renew a task's lease"));
  }, renewMs);
  const onEnding = () => stop.abort();
  ending.addEventListener("abort", onEnding);

  try {
    if (ending.aborted) throw new Error("the process is ending");
    if (row.attempts > maxAttempts) throw new Error(`given up after ${maxAttempts} starts that did not come to an end`);
    const context = {
      shopId: row.shopId,
      taskId: row.id,
      createdBy: row.createdBy,
      signal: stop.signal,
      onProgress: (share: number) => {
        progress = Math.min(1, Math.max(progress, share));
      },
    };
    const keep = await kind.work(row.payload, context);
    await end(db, claim, keep);
    log().info({ taskId: row.id, kind: row.kind }, "task done");
  } catch (error) {
    if (lost) log().warn({ taskId: row.id }, "a task's lease was lost; another worker has it");
    else if (ending.aborted) await releaseTask(db, claim);
    else await giveUp(db, kind, row, claim, cancelled, error);
  } finally {
    clearInterval(timer);
    ending.removeEventListener("abort", onEnding);
  }
}

async function end(db: Database, claim: { id: string; claimId: string }, keep: Keep): Promise<void> {
  const at = new Date();
  await db.transaction(async (tx) => {
    if (!(await finishTask(tx, claim, { state: "done", at }))) throw new Error("the claim no longer holds");
    await keep(tx, at);
  });
}

async function giveUp(
  db: Database,
  kind: TaskKind,
  row: TaskRow,
  claim: { id: string; claimId: string },
  cancelled: boolean,
  error: unknown,
): Promise<void> {
  const state = cancelled ? "cancelled" : "failed";
  const message = error instanceof Error ? error.message : String(error);
  if (!cancelled) log().error({ err: error, taskId: row.id, kind: row.kind }, "task failed");
  const ended = { state, failure: message, at: new Date() } as const;
  try {
    await db.transaction(async (tx) => {
      if (!(await finishTask(tx, claim, ended))) return;
      await kind.abandon(row.payload, { shopId: row.shopId, taskId: row.id }, { state, message }, tx);
    });
  } catch (fault) {
    // What cannot be tidied up must not be started for ever: the task ends all the same, and the log tells what is left behind.
    log().error({ err: fault, taskId: row.id, kind: row.kind }, "a task could not be abandoned cleanly");
    await finishTask(db, claim, ended);
  }
}
