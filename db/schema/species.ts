import { mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { z } from "zod";
import { woodMovementSchema } from "@/lib/schemas/species";
import { idColumn, jsonOf } from "../columns";
import { shopIdColumn } from "../shop-id-column";

/** A species of the shop's own; the published ones are part of the core. */
export const species = mysqlTable(
  "species",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    name: varchar("name", { length: 80 }).notNull(),
    alsoCalled: jsonOf(z.array(z.string()))("also_called").notNull(),
    movement: jsonOf(woodMovementSchema)("movement").notNull(),
    source: varchar("source", { length: 300 }).notNull(),
  },
  // Species of a shop by name: the settings page and every choice of wood.
  (table) => [uniqueIndex("species_shop_name").on(table.shopId, table.name)],
);
