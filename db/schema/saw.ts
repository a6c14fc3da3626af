import { boolean, index, mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { um } from "@/lib/layout";
import { idColumn, umColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";

/** A saw of the shop with what it takes from the wood. */
export const saw = mysqlTable(
  "saw",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    name: varchar("name", { length: 80 }).notNull(),
    kind: varchar("kind", { length: 8, enum: ["table", "track", "band", "hand"] }).notNull(),
    kerf: umColumn("kerf_um").notNull(),
    /** Taken off each sawn edge afterwards; 0 for an edge left from the saw. */
    cleanUp: umColumn("clean_up_um").notNull(),
    /** What it may take in hand; `usualLimits` says what is usual for each kind. */
    rips: boolean("rips").notNull().default(true),
    crosscuts: boolean("crosscuts").notNull().default(true),
    /** null: as wide as it comes. */
    widestRip: umColumn("widest_rip_um"),
    longestCrosscut: umColumn("longest_crosscut_um"),
    shortest: umColumn("shortest_um").notNull().default(um(0)),
    narrowest: umColumn("narrowest_um").notNull().default(um(0)),
  },
  // Saws of a shop by name: the settings page and every saw picker.
  (table) => [uniqueIndex("saw_shop_name").on(table.shopId, table.name), index("saw_shop").on(table.shopId)],
);
