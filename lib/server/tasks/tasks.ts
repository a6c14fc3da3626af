/** Asking after long work and stopping it. */
import "server-only";
import { findTask, requestCancel, type TaskRow } from "@/db/queries/task";
import type { Task } from "@/lib/schemas/task";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound } from "../faults";
import { kinds } from "./kinds";

const taskOf = (row: TaskRow): Task => ({
  id: row.id,
  kind: row.kind,
  state: row.state,
  progress: row.progress,
  failure: row.failure,
});

export async function readTask(access: ShopAccess, taskId: string): Promise<Task> {
  const row = await findTask(database(), access.shopId, taskId);
  if (!row) throw notFound("task");
  return taskOf(row);
}

export async function cancelTask(access: ShopAccess, taskId: string): Promise<Task> {
  const row = await findTask(database(), access.shopId, taskId);
  if (!row) throw notFound("task");
  await database().transaction(async (tx) => {
    const endedAtOnce = await requestCancel(tx, access.shopId, taskId, new Date());
    if (endedAtOnce) {
      await kinds[row.kind].abandon(
        row.payload,
        { shopId: row.shopId, taskId },
        { state: "cancelled", message: "cancelled" },
        tx,
      );
    }
  });
  return readTask(access, taskId);
}
