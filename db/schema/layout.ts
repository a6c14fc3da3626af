import { index, int, mysqlTable, primaryKey, uniqueIndex } from "drizzle-orm/mysql-core";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import { idColumn, jsonOf, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { board } from "./board";
import { face } from "./job";
import { saw } from "./saw";
import { straightening } from "./straightening";
import { user } from "./user";

/** The layout of one face: the document, and a revision that every save moves on by one. */
export const layout = mysqlTable(
  "layout",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    faceId: idColumn("face_id")
      .notNull()
      .references(() => face.id),
    document: jsonOf(faceLayoutSchema)("document").notNull(),
    /** Which saws the document's losses were taken from; null where typed in by hand. */
    crosscutSawId: idColumn("crosscut_saw_id").references(() => saw.id),
    ripSawId: idColumn("rip_saw_id").references(() => saw.id),
    revision: int("revision").notNull(),
    updatedBy: idColumn("updated_by")
      .notNull()
      .references(() => user.id),
    updatedAt: utcColumn("updated_at").notNull(),
  },
  (table) => [uniqueIndex("layout_face").on(table.faceId), index("layout_shop").on(table.shopId)],
);

/** The boards a layout lies on, each with the version of its picture that the layout was made on. */
export const layoutBoard = mysqlTable(
  "layout_board",
  {
    layoutId: idColumn("layout_id")
      .notNull()
      .references(() => layout.id),
    boardId: idColumn("board_id")
      .notNull()
      .references(() => board.id),
    straighteningId: idColumn("straightening_id")
      .notNull()
      .references(() => straightening.id),
    shopId: shopIdColumn(),
  },
  (table) => [
    primaryKey({ columns: [table.layoutId, table.boardId] }),
    // Which layouts lie on this board: the rack's "held for".
    index("layout_board_board").on(table.boardId),
  ],
);
