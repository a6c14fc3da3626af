/** The queue of long work. Claiming and every later write go through the claim id, so a worker that lost its lease changes nothing. */
import "server-only";
import { and, asc, eq, inArray, lt, or, sql } from "drizzle-orm";
import { v7 as newId } from "uuid";
import { taskKinds } from "@/lib/schemas/task";
import type { Connection, Database } from "../client";
import { task } from "../schema";
import type { ShopId } from "../shop-id";

export type TaskRow = typeof task.$inferSelect;

export async function insertTask(
  db: Connection,
  shopId: ShopId,
  row: { kind: TaskRow["kind"]; payload: TaskRow["payload"]; createdBy: string | null; createdAt: Date },
): Promise<string> {
  const id = newId();
  await db.insert(task).values({ id, shopId, ...row, state: "queued", progress: 0, attempts: 0, cancelRequested: 0 });
  return id;
}

export async function findTask(db: Connection, shopId: ShopId, taskId: string) {
  const [row] = await db
    .select()
    .from(task)
    .where(and(eq(task.shopId, shopId), eq(task.id, taskId)));
  return row;
}

/** Others may be claiming at the same moment: so many of the oldest are looked at for one that nobody has. */
const candidates = 16;

/** Claims the oldest waiting task of these kinds, or one whose worker let its lease run out. Two workers never get the same. */
export async function claimTask(
  db: Database,
  now: Date,
  leaseUntil: Date,
  kinds: readonly TaskRow["kind"][] = taskKinds,
): Promise<TaskRow | undefined> {
  const waits = or(eq(task.state, "queued"), and(eq(task.state, "running"), lt(task.leaseUntil, now)));
  return db.transaction(async (tx) => {
    const waiting = await tx
      .select({ id: task.id })
      .from(task)
      .where(and(inArray(task.kind, [...kinds]), waits))
      .orderBy(asc(task.id))
      .limit(candidates);
    for (const { id } of waiting) {
      // Locked one at a time and by its key: sorting under a lock would lock every waiting row, and other workers would find none.
      const [free] = await tx
        .select({ id: task.id })
        .from(task)
        .where(and(eq(task.id, id), waits))
        .for("update", { skipLocked: true });
      if (!free) continue;
      await tx
        .update(task)
        .set({ state: "running", leaseUntil, claimId: newId(), attempts: sql`${task.attempts} + 1`, progress: 0 })
        .where(eq(task.id, id));
      const [claimed] = await tx.select().from(task).where(eq(task.id, id));
      return claimed;
    }
    return undefined;
  });
}

/** Moves lease and progress on. Answers whether the claim still holds and whether somebody asked to stop. */
export async function renewTask(db: Connection, claim: { id: string; claimId: string }, progress: number, leaseUntil: Date) {
  const [result] = await db
    .update(task)
    .set({ progress, leaseUntil })
    .where(and(eq(task.id, claim.id), eq(task.claimId, claim.claimId), eq(task.state, "running")));
  if (result.affectedRows === 0) return { held: false, cancelRequested: false };
  const [row] = await db.select({ cancelRequested: task.cancelRequested }).from(task).where(eq(task.id, claim.id));
  return { held: true, cancelRequested: row?.cancelRequested === 1 };
}

/** Ends a claimed task; answers false when the claim no longer holds, and then nothing may be kept of its work. */
export async function finishTask(
  db: Connection,
  claim: { id: string; claimId: string },
  end: { state: "done" | "failed" | "cancelled"; failure?: string; at: Date },
): Promise<boolean> {
  const [result] = await db
    .update(task)
    .set({
      state: end.state,
      failure: end.failure ?? null,
      finishedAt: end.at,
      leaseUntil: null,
      ...(end.state === "done" && { progress: 1 }),
    })
    .where(and(eq(task.id, claim.id), eq(task.claimId, claim.claimId), eq(task.state, "running")));
  return result.affectedRows === 1;
}

/** Puts a claimed task back at once, when its process is asked to end. */
export async function releaseTask(db: Connection, claim: { id: string; claimId: string }) {
  await db
    .update(task)
    .set({ state: "queued", leaseUntil: null, claimId: null, attempts: sql`${task.attempts} - 1` })
    .where(and(eq(task.id, claim.id), eq(task.claimId, claim.claimId), eq(task.state, "running")));
}

/** Marks a task for stopping; one that nobody has begun ends at once, answered as "cancelled". */
export async function requestCancel(db: Connection, shopId: ShopId, taskId: string, at: Date): Promise<boolean> {
  const mine = and(eq(task.shopId, shopId), eq(task.id, taskId));
  const [ended] = await db
    .update(task)
    .set({ state: "cancelled", cancelRequested: 1, finishedAt: at })
    .where(and(mine, eq(task.state, "queued")));
  await db
    .update(task)
    .set({ cancelRequested: 1 })
    .where(and(mine, inArray(task.state, ["running"])));
  return ended.affectedRows === 1;
}
