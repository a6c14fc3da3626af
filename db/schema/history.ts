import { index, mysqlTable, varchar } from "drizzle-orm/mysql-core";
import { z } from "zod";
import { idColumn, jsonOf, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { user } from "./user";

/** Who did what to which thing, when. Written in the transaction that makes the change; never updated. */
export const history = mysqlTable(
  "history",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    at: utcColumn("at").notNull(),
    /** null: done by the system (a task). */
    userId: idColumn("user_id").references(() => user.id),
    noun: varchar("noun", { length: 24 }).notNull(),
    nounId: idColumn("noun_id").notNull(),
    verb: varchar("verb", { length: 32 }).notNull(),
    detail: jsonOf(z.record(z.string(), z.json()))("detail").notNull(),
  },
  (table) => [
    // The story of one thing, newest first.
    index("history_thing").on(table.shopId, table.noun, table.nounId, table.at),
    // What happened in the shop lately: the Today page.
    index("history_recent").on(table.shopId, table.at),
  ],
);
