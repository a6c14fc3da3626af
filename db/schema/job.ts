import { date, index, int, mysqlTable, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { climateSchema } from "@/lib/schemas/climate";
import { idColumn, jsonOf, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";

/** A piece of furniture or a commission: what the faces belong to. */
export const job = mysqlTable(
  "job",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    number: int("number").notNull(),
    title: varchar("title", { length: 120 }).notNull(),
    client: varchar("client", { length: 120 }).notNull(),
    note: text("note").notNull(),
    dueOn: date("due_on", { mode: "string" }),
    /** Where this furniture will live; null: where the shop's usually does. */
    climate: jsonOf(climateSchema)("climate"),
    state: varchar("state", { length: 8, enum: ["open", "closed"] }).notNull(),
    revision: int("revision").notNull(),
    createdAt: utcColumn("created_at").notNull(),
    updatedAt: utcColumn("updated_at").notNull(),
  },
  (table) => [
    uniqueIndex("job_number").on(table.shopId, table.number),
    // Open jobs, the one touched last first.
    index("job_recent").on(table.shopId, table.state, table.updatedAt),
  ],
);

/** One visible surface of a job. */
export const face = mysqlTable(
  "face",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    jobId: idColumn("job_id")
      .notNull()
      .references(() => job.id),
    title: varchar("title", { length: 120 }).notNull(),
    position: int("position").notNull(),
    createdAt: utcColumn("created_at").notNull(),
  },
  (table) => [uniqueIndex("face_position").on(table.jobId, table.position), index("face_shop").on(table.shopId)],
);
