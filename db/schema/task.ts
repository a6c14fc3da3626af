import { double, index, int, mysqlTable, text, varchar } from "drizzle-orm/mysql-core";
import { z } from "zod";
import { taskKinds, taskStates } from "@/lib/schemas/task";
import { idColumn, jsonOf, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { user } from "./user";

/**
 * Long work. A row is claimed with SKIP LOCKED by whichever process comes first; the lease is moved on while it is worked at,
 * so a row whose worker was killed is taken up again when its lease runs out.
 */
export const task = mysqlTable(
  "task",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    kind: varchar("kind", { length: 24, enum: taskKinds }).notNull(),
    /** What it works on, in the shape its kind asks for; the worker parses it. */
    payload: jsonOf(z.json())("payload").notNull(),
    state: varchar("state", { length: 12, enum: taskStates }).notNull(),
    /** 0 to 1. */
    progress: double("progress").notNull(),
    attempts: int("attempts").notNull(),
    /** Until when the present worker has it. */
    leaseUntil: utcColumn("lease_until"),
    /** Which claim holds it: a worker that lost its lease can no longer write. */
    claimId: idColumn("claim_id"),
    cancelRequested: int("cancel_requested").notNull(),
    failure: text("failure"),
    createdBy: idColumn("created_by").references(() => user.id),
    createdAt: utcColumn("created_at").notNull(),
    finishedAt: utcColumn("finished_at"),
  },
  (table) => [
    // The next task to claim: queued ones, or running ones whose lease is over.
    index("task_claim").on(table.state, table.leaseUntil, table.id),
    index("task_shop").on(table.shopId, table.createdAt),
  ],
);
