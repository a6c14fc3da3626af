import { double, index, int, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import { boardFindingSchema, searchScopes, weightsSchema } from "@/lib/schemas/wood-search";
import { idColumn, jsonOf, umColumn, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { board } from "./board";
import { face } from "./job";
import { straightening } from "./straightening";
import { task } from "./task";
import { user } from "./user";

/** A search for wood. The layout is the one it was started with, so that a search goes on unchanged while the table is worked at. */
export const woodSearch = mysqlTable(
  "wood_search",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    faceId: idColumn("face_id")
      .notNull()
      .references(() => face.id),
    scope: varchar("scope", { length: 8, enum: searchScopes }).notNull(),
    groupId: varchar("group_id", { length: 40 }).notNull(),
    layoutRevision: int("layout_revision").notNull(),
    document: jsonOf(faceLayoutSchema)("document").notNull(),
    weights: jsonOf(weightsSchema)("weights").notNull(),
    /** Of the rack; null: any. */
    species: varchar("species", { length: 80 }),
    leastThickness: umColumn("least_thickness_um"),
    mostThickness: umColumn("most_thickness_um"),
    taskId: idColumn("task_id").references(() => task.id),
    startedBy: idColumn("started_by")
      .notNull()
      .references(() => user.id),
    startedAt: utcColumn("started_at").notNull(),
  },
  // The searches of a face: starting another one ends them.
  (table) => [index("wood_search_face").on(table.faceId, table.scope), index("wood_search_shop").on(table.shopId)],
);

/** A board of a search: waiting while it has no finding. Found again after a restart, so that what is searched is not searched twice. */
export const woodSearchBoard = mysqlTable(
  "wood_search_board",
  {
    searchId: idColumn("search_id")
      .notNull()
      .references(() => woodSearch.id),
    boardId: idColumn("board_id")
      .notNull()
      .references(() => board.id),
    shopId: shopIdColumn(),
    tagNumber: int("tag_number").notNull(),
    /** The picture it is judged by; null where it was left out without one. */
    straighteningId: idColumn("straightening_id").references(() => straightening.id),
    /** How glad the shop is to use it, 0 to 1. */
    stock: double("stock").notNull(),
    /** 0 to 1; −1: left out; null: not searched yet. */
    total: double("total"),
    finding: jsonOf(boardFindingSchema)("finding"),
  },
  (table) => [
    primaryKey({ columns: [table.searchId, table.boardId] }),
    // The best found so far, those waiting, and those left out.
    index("wood_search_board_total").on(table.searchId, table.total, table.tagNumber),
    index("wood_search_board_board").on(table.boardId),
  ],
);
