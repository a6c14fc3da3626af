import { double, index, int, mysqlTable, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { markingSchema } from "@/lib/schemas/marking";
import { pictureLevelsSchema } from "@/lib/schemas/photo";
import { boardSides, straighteningStates } from "@/lib/schemas/straightening";
import { keepClearKinds, keepClearShapeSchema, outlineSchema } from "@/lib/schemas/zones";
import { idColumn, jsonOf, umColumn, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { board } from "./board";
import { photo } from "./photo";
import { task } from "./task";
import { user } from "./user";

/**
 * One version of a board's straightened picture with its stock frame. Marking again makes a new version; outline and keep-clear
 * areas belong to a version because their coordinates are in its frame.
 */
export const straightening = mysqlTable(
  "straightening",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    boardId: idColumn("board_id")
      .notNull()
      .references(() => board.id),
    /** null, and no marks: composed from the pictures of the boards that a blank is glued up from. */
    photoId: idColumn("photo_id").references(() => photo.id),
    /** Which face of the board it shows. The back's frame is the face's turned over about the long edge: y_back = width − y_face. */
    side: varchar("side", { length: 4, enum: boardSides }).notNull().default("face"),
    /** Versions of both sides count together. */
    version: int("version").notNull(),
    marking: jsonOf(markingSchema)("marking"),
    state: varchar("state", { length: 12, enum: straighteningStates }).notNull(),
    /** Why it failed, in words for the maker; null unless failed. */
    failure: text("failure"),
    length: umColumn("length_um").notNull(),
    width: umColumn("width_um").notNull(),
    /** Of level 0; 0 until done. */
    pxPerMm: double("px_per_mm").notNull(),
    levels: jsonOf(pictureLevelsSchema)("levels").notNull(),
    /** Root mean square of the marks' residuals. */
    residual: umColumn("residual_um"),
    outline: jsonOf(outlineSchema)("outline"),
    /** Counts changes of outline and keep-clear areas. */
    zonesRevision: int("zones_revision").notNull(),
    /** The task that makes, or made, the picture. */
    taskId: idColumn("task_id").references(() => task.id),
    createdBy: idColumn("created_by")
      .notNull()
      .references(() => user.id),
    createdAt: utcColumn("created_at").notNull(),
  },
  (table) => [
    uniqueIndex("straightening_version").on(table.boardId, table.version),
    index("straightening_shop").on(table.shopId, table.createdAt),
  ],
);

/**
 * The version of a board's picture that the rack shows and new layouts start from: of its face. No row until one is straightened. The
 * picture of its back is told apart by name, so that whoever asks for the board's picture gets the face.
 */
export const boardPicture = mysqlTable("board_picture", {
  boardId: idColumn("board_id")
    .primaryKey()
    .references(() => board.id),
  straighteningId: idColumn("straightening_id")
    .notNull()
    .references(() => straightening.id),
  /** null while the back has no picture. */
  backStraighteningId: idColumn("back_straightening_id").references(() => straightening.id),
  shopId: shopIdColumn(),
});

/** An area of a board that no show piece may touch. */
export const keepClear = mysqlTable(
  "keep_clear",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    straighteningId: idColumn("straightening_id")
      .notNull()
      .references(() => straightening.id),
    kind: varchar("kind", { length: 8, enum: keepClearKinds }).notNull(),
    area: jsonOf(keepClearShapeSchema)("area").notNull(),
    note: varchar("note", { length: 200 }).notNull(),
  },
  (table) => [index("keep_clear_straightening").on(table.straighteningId)],
);
