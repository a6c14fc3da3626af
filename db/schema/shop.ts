import { char, int, mysqlTable, smallint, varchar } from "drizzle-orm/mysql-core";
import { um } from "@/lib/layout";
import { idColumn, umColumn, utcColumn } from "../columns";
import type { ShopId } from "../shop-id";

/** A shop: one account space with its settings. Counters are taken with the row locked. */
export const shop = mysqlTable("shop", {
  id: idColumn("id").$type<ShopId>().primaryKey(),
  name: varchar("name", { length: 120 }).notNull(),
  units: varchar("units", { length: 8, enum: ["mm", "inch"] }).notNull(),
  /** Inches print to the nearest 1/32 or 1/64. */
  inchFraction: smallint("inch_fraction").notNull(),
  timeZone: varchar("time_zone", { length: 64 }).notNull(),
  paper: varchar("paper", { length: 8, enum: ["a4", "letter"] }).notNull(),
  currency: char("currency", { length: 3 }).notNull(),
  shortestCrosscut: umColumn("shortest_crosscut_um").notNull(),
  narrowestRip: umColumn("narrowest_rip_um").notNull(),
  shortestMachined: umColumn("shortest_machined_um").notNull(),
  offcutLength: umColumn("offcut_length_um").notNull(),
  offcutWidth: umColumn("offcut_width_um").notNull(),
  /** What jointing takes off each edge that is glued. 1.5 mm: common practice, no source. */
  jointing: umColumn("jointing_um").notNull().default(um(1500)),
  /** What a rough part keeps at both ends together, and at both long edges together: 1/2 in (12.5 mm) and 3/16 in (5 mm), the allowances
   *  of cutting lists in a furniture maker's text. */
  roughLength: umColumn("rough_length_um").notNull().default(um(12_500)),
  roughWidth: umColumn("rough_width_um").notNull().default(um(5000)),
  nextBoardNumber: int("next_board_number").notNull(),
  nextJobNumber: int("next_job_number").notNull(),
  nextOrderNumber: int("next_order_number").notNull(),
  revision: int("revision").notNull(),
  createdAt: utcColumn("created_at").notNull(),
});
