import { bigint, index, int, mysqlTable, varchar } from "drizzle-orm/mysql-core";

/** Counters of tries, in the shape that rate-limiter-flexible's MySQL store reads and writes. */
export const rateLimit = mysqlTable(
  "rate_limit",
  {
    key: varchar("key", { length: 255 }).primaryKey(),
    points: int("points").notNull().default(0),
    /** Milliseconds since 1970, or null for a counter that never ends. */
    expire: bigint("expire", { mode: "number", unsigned: true }),
  },
  (table) => [index("rate_limit_expire").on(table.expire)],
);
