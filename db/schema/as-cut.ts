import { index, int, mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { asCutEntrySchema } from "@/lib/schemas/as-cut";
import { idColumn, jsonOf, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { orderRevision } from "./order";
import { user } from "./user";

/** What the bench found when it cut by a revision. Corrected in place; the story of it is in the history. */
export const asCut = mysqlTable(
  "as_cut",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    revisionId: idColumn("revision_id")
      .notNull()
      .references(() => orderRevision.id),
    kind: varchar("kind", { length: 12, enum: ["kerf", "size", "spoiled"] }).notNull(),
    /** What it is about, from `asCutSubject`: of one thing there is one entry. */
    subject: varchar("subject", { length: 120 }).notNull(),
    entry: jsonOf(asCutEntrySchema)("entry").notNull(),
    /** Counts corrections, so that two who correct at once do not undo each other unseen. */
    version: int("version").notNull(),
    enteredBy: idColumn("entered_by")
      .notNull()
      .references(() => user.id),
    enteredAt: utcColumn("entered_at").notNull(),
  },
  (table) => [
    // Also finds all entries of a revision.
    uniqueIndex("as_cut_subject").on(table.revisionId, table.subject),
    index("as_cut_shop").on(table.shopId),
  ],
);
