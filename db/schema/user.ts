import { index, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { idColumn, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";

/** A person who can sign in. */
export const user = mysqlTable(
  "user",
  {
    id: idColumn("id").primaryKey(),
    /** Kept in lower case. */
    email: varchar("email", { length: 254 }).notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    passwordHash: varchar("password_hash", { length: 255 }).notNull(),
    createdAt: utcColumn("created_at").notNull(),
  },
  (table) => [uniqueIndex("user_email").on(table.email)],
);

/** Who belongs to which shop, and as what. */
export const membership = mysqlTable(
  "membership",
  {
    shopId: shopIdColumn(),
    userId: idColumn("user_id")
      .notNull()
      .references(() => user.id),
    role: varchar("role", { length: 12, enum: ["owner", "maker", "assistant"] }).notNull(),
    createdAt: utcColumn("created_at").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.shopId, table.userId] }),
    // The shops of one person, at sign-in.
    index("membership_user").on(table.userId),
  ],
);
