import { char, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { orderSnapshotSchema, orderSummarySchema } from "@/lib/schemas/order-snapshot";
import { idColumn, jsonOf, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { board } from "./board";
import { face, job } from "./job";
import { straightening } from "./straightening";
import { user } from "./user";

/** A numbered cut order. What is cut is in its revisions. */
export const cutOrder = mysqlTable(
  "cut_order",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    number: int("number").notNull(),
    jobId: idColumn("job_id")
      .notNull()
      .references(() => job.id),
    state: varchar("state", { length: 12, enum: ["issued", "cut"] }).notNull(),
    createdAt: utcColumn("created_at").notNull(),
    updatedAt: utcColumn("updated_at").notNull(),
  },
  (table) => [
    uniqueIndex("cut_order_number").on(table.shopId, table.number),
    index("cut_order_recent").on(table.shopId, table.state, table.updatedAt),
    index("cut_order_job").on(table.jobId),
  ],
);

/** The faces an order cuts. */
export const cutOrderFace = mysqlTable(
  "cut_order_face",
  {
    orderId: idColumn("order_id")
      .notNull()
      .references(() => cutOrder.id),
    faceId: idColumn("face_id")
      .notNull()
      .references(() => face.id),
    shopId: shopIdColumn(),
  },
  (table) => [primaryKey({ columns: [table.orderId, table.faceId] }), index("cut_order_face_face").on(table.faceId)],
);

/** One frozen state of an order. Nothing in it changes but the moment it was superseded. */
export const orderRevision = mysqlTable(
  "order_revision",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    orderId: idColumn("order_id")
      .notNull()
      .references(() => cutOrder.id),
    /** 1 prints as A, 2 as B; I and O are left out. */
    revision: int("revision").notNull(),
    snapshot: jsonOf(orderSnapshotSchema)("snapshot").notNull(),
    summary: jsonOf(orderSummarySchema)("summary").notNull(),
    /** SHA-256 of the snapshot's JSON, printed in short on every page. */
    fingerprint: char("fingerprint", { length: 64 }).notNull(),
    issuedBy: idColumn("issued_by")
      .notNull()
      .references(() => user.id),
    issuedAt: utcColumn("issued_at").notNull(),
    /** Set when a later change of the layout, or a later revision, makes this one out of date. */
    supersededAt: utcColumn("superseded_at"),
  },
  (table) => [
    uniqueIndex("order_revision_number").on(table.orderId, table.revision),
    index("order_revision_shop").on(table.shopId),
  ],
);

/** The boards that a revision cuts and the version of each one's picture: of its snapshot, which is far too large to be searched for them. */
export const orderRevisionBoard = mysqlTable(
  "order_revision_board",
  {
    revisionId: idColumn("revision_id")
      .notNull()
      .references(() => orderRevision.id),
    boardId: idColumn("board_id")
      .notNull()
      .references(() => board.id),
    straighteningId: idColumn("straightening_id")
      .notNull()
      .references(() => straightening.id),
    shopId: shopIdColumn(),
  },
  (table) => [
    primaryKey({ columns: [table.revisionId, table.boardId] }),
    // Which revisions cut from this board: whether its picture still belongs to nobody.
    index("order_revision_board_board").on(table.boardId),
  ],
);

/** A step ticked at the bench. No row: not done. */
export const stepTick = mysqlTable(
  "step_tick",
  {
    revisionId: idColumn("revision_id")
      .notNull()
      .references(() => orderRevision.id),
    stepId: varchar("step_id", { length: 40 }).notNull(),
    shopId: shopIdColumn(),
    tickedBy: idColumn("ticked_by")
      .notNull()
      .references(() => user.id),
    tickedAt: utcColumn("ticked_at").notNull(),
  },
  (table) => [primaryKey({ columns: [table.revisionId, table.stepId] })],
);
