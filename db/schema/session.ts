import { index, mysqlTable, varchar } from "drizzle-orm/mysql-core";
import { idColumn, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { user } from "./user";

/** A signed-in device. The cookie carries the id only; a row that is gone or past its end signs the device out. */
export const session = mysqlTable(
  "session",
  {
    id: idColumn("id").primaryKey(),
    userId: idColumn("user_id")
      .notNull()
      .references(() => user.id),
    shopId: shopIdColumn(),
    device: varchar("device", { length: 200 }).notNull(),
    createdAt: utcColumn("created_at").notNull(),
    expiresAt: utcColumn("expires_at").notNull(),
  },
  (table) => [
    // Sign-out everywhere.
    index("session_user").on(table.userId),
    // Sweeping out ended sessions.
    index("session_expires").on(table.expiresAt),
  ],
);
