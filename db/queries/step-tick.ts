/** Ticks of the bench: a row for every step that is done. */
import "server-only";
import { and, asc, eq, inArray } from "drizzle-orm";
import type { Connection } from "../client";
import { stepTick, user } from "../schema";
import type { ShopId } from "../shop-id";

export async function listTicks(db: Connection, shopId: ShopId, revisionId: string) {
  return db
    .select({ stepId: stepTick.stepId, by: user.name, at: stepTick.tickedAt })
    .from(stepTick)
    .innerJoin(user, eq(user.id, stepTick.tickedBy))
    .where(and(eq(stepTick.shopId, shopId), eq(stepTick.revisionId, revisionId)))
    .orderBy(asc(stepTick.tickedAt), asc(stepTick.stepId));
}

/** The rows as they are, to be carried over to the next revision. */
export async function listTickRows(db: Connection, shopId: ShopId, revisionId: string) {
  return db
    .select()
    .from(stepTick)
    .where(and(eq(stepTick.shopId, shopId), eq(stepTick.revisionId, revisionId)));
}

/** Of a revision that nobody has seen yet. */
export async function insertTicks(tx: Connection, rows: readonly (typeof stepTick.$inferInsert & { shopId: ShopId })[]) {
  if (rows.length > 0) await tx.insert(stepTick).values([...rows]);
}

/** The ticked steps of several revisions. */
export async function listTickedSteps(db: Connection, shopId: ShopId, revisionIds: readonly string[]) {
  if (revisionIds.length === 0) return [];
  return db
    .select({ revisionId: stepTick.revisionId, stepId: stepTick.stepId })
    .from(stepTick)
    .where(and(eq(stepTick.shopId, shopId), inArray(stepTick.revisionId, [...revisionIds])));
}

/** Call it with the revision locked. False when the step is ticked already: who did it first, and when, stands. */
export async function insertTick(tx: Connection, row: typeof stepTick.$inferInsert & { shopId: ShopId }): Promise<boolean> {
  const [result] = await tx.insert(stepTick).ignore().values(row);
  return result.affectedRows === 1;
}

/** False when there was no tick to take back. */
export async function deleteTick(tx: Connection, shopId: ShopId, revisionId: string, stepId: string): Promise<boolean> {
  const [result] = await tx
    .delete(stepTick)
    .where(and(eq(stepTick.shopId, shopId), eq(stepTick.revisionId, revisionId), eq(stepTick.stepId, stepId)));
  return result.affectedRows === 1;
}
