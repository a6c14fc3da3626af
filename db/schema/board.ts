import { boolean, date, index, int, mysqlTable, smallint, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { boardKinds, boardStates, cuts, trueEdges } from "@/lib/schemas/board";
import { idColumn, minorUnitsColumn, umColumn, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { user } from "./user";

/** A board in the rack. Its size is that of its current straightened picture (`boardPicture`), or was entered by hand. */
export const board = mysqlTable(
  "board",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    /** Tag "B-041" is number 41. */
    tagNumber: int("tag_number").notNull(),
    kind: varchar("kind", { length: 8, enum: boardKinds }).notNull().default("board"),
    state: varchar("state", { length: 8, enum: boardStates }).notNull(),
    species: varchar("species", { length: 80 }).notNull(),
    cut: varchar("cut", { length: 8, enum: cuts }).notNull(),
    /** 4 for 4/4; null when not sold by quarters. */
    nominalQuarters: smallint("nominal_quarters"),
    thickness: umColumn("thickness_um").notNull(),
    trueEdges: varchar("true_edges", { length: 8, enum: trueEdges }).notNull().default("none"),
    toBeFlattened: boolean("to_be_flattened").notNull().default(false),
    length: umColumn("length_um").notNull(),
    width: umColumn("width_um").notNull(),
    /** The latest reading, kept here so that the rack can sort by it; all readings are in `moisture_reading`. */
    moistureTenths: smallint("moisture_tenths"),
    place: varchar("place", { length: 80 }).notNull(),
    source: varchar("source", { length: 120 }).notNull(),
    costMinor: minorUnitsColumn("cost_minor"),
    note: text("note").notNull(),
    revision: int("revision").notNull(),
    createdAt: utcColumn("created_at").notNull(),
    updatedAt: utcColumn("updated_at").notNull(),
  },
  (table) => [
    uniqueIndex("board_tag").on(table.shopId, table.tagNumber),
    // One index a sort order of the rack, each with the id as its last tie-break.
    index("board_species").on(table.shopId, table.species, table.id),
    index("board_length").on(table.shopId, table.length, table.id),
    index("board_width").on(table.shopId, table.width, table.id),
    index("board_thickness").on(table.shopId, table.thickness, table.id),
    index("board_moisture").on(table.shopId, table.moistureTenths, table.id),
    index("board_place").on(table.shopId, table.place, table.id),
    index("board_created").on(table.shopId, table.createdAt, table.id),
  ],
);

/** Moisture content of a board as read on a day. */
export const moistureReading = mysqlTable(
  "moisture_reading",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    boardId: idColumn("board_id")
      .notNull()
      .references(() => board.id),
    /** Percent of dry weight, in tenths. */
    tenths: smallint("tenths").notNull(),
    takenOn: date("taken_on", { mode: "string" }).notNull(),
    takenBy: idColumn("taken_by")
      .notNull()
      .references(() => user.id),
    createdAt: utcColumn("created_at").notNull(),
  },
  (table) => [index("moisture_board").on(table.boardId, table.takenOn)],
);
