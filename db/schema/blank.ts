import { boolean, index, int, mysqlTable, primaryKey, uniqueIndex } from "drizzle-orm/mysql-core";
import { idColumn, umColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { board } from "./board";
import { straightening } from "./straightening";

/** A blank that was planned: a board of the rack that is to be glued up from others. One that was glued already has glue lines only. */
export const blank = mysqlTable("blank", {
  boardId: idColumn("board_id")
    .primaryKey()
    .references(() => board.id),
  shopId: shopIdColumn(),
  /** What jointing takes off each glued edge. */
  jointing: umColumn("jointing_um").notNull(),
});

/** A board in a planned blank, on the version of its picture that it was planned with. */
export const blankMember = mysqlTable(
  "blank_member",
  {
    blankId: idColumn("blank_id")
      .notNull()
      .references(() => blank.boardId),
    /** From the upper edge of the blank down, from 0. */
    position: int("position").notNull(),
    shopId: shopIdColumn(),
    boardId: idColumn("board_id")
      .notNull()
      .references(() => board.id),
    straighteningId: idColumn("straightening_id")
      .notNull()
      .references(() => straightening.id),
    endForEnd: boolean("end_for_end").notNull(),
    /** Where its left end lies along the blank, as it lies. Only differences among the members count. */
    along: umColumn("along_um").notNull(),
    /** Taken off its edges before they are jointed, as it lies. */
    trimUpper: umColumn("trim_upper_um").notNull(),
    trimLower: umColumn("trim_lower_um").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.blankId, table.position] }),
    // A board is in one blank at most, whoever else is planning with it at the same moment.
    uniqueIndex("blank_member_board").on(table.boardId),
  ],
);

/** Where two boards are glued edge to edge, in the frame of one version of the blank's picture. */
export const glueLine = mysqlTable(
  "glue_line",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    straighteningId: idColumn("straightening_id")
      .notNull()
      .references(() => straightening.id),
    /** Across the grain from the upper edge of the picture. */
    across: umColumn("across_um").notNull(),
    /** Which boards meet there; null where nobody knows any more. */
    aboveBoardId: idColumn("above_board_id").references(() => board.id),
    belowBoardId: idColumn("below_board_id").references(() => board.id),
  },
  (table) => [index("glue_line_straightening").on(table.straighteningId, table.across)],
);
