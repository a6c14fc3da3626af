/** Layouts and the boards they lie on. */
import "server-only";
import { and, asc, eq, inArray, ne } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import {
  board,
  boardPicture,
  cutOrder,
  cutOrderFace,
  face,
  job,
  layout,
  layoutBoard,
  orderRevision,
  straightening,
  user,
} from "../schema";
import type { ShopId } from "../shop-id";

type Document = typeof layout.$inferSelect.document;

export interface LayoutFields {
  readonly document: Document;
  readonly crosscutSawId: string | null;
  readonly ripSawId: string | null;
}

export async function insertLayout(
  db: Connection,
  shopId: ShopId,
  faceId: string,
  fields: LayoutFields,
  userId: string,
  at: Date,
) {
  const id = newId();
  await db.insert(layout).values({ ...fields, id, shopId, faceId, revision: 1, updatedBy: userId, updatedAt: at });
  return id;
}

export async function findLayout(db: Connection, shopId: ShopId, faceId: string) {
  const [row] = await db
    .select({ layout, faceTitle: face.title, jobId: job.id, jobTitle: job.title, updatedByName: user.name })
    .from(layout)
    .innerJoin(face, eq(face.id, layout.faceId))
    .innerJoin(job, eq(job.id, face.jobId))
    .innerJoin(user, eq(user.id, layout.updatedBy))
    .where(and(eq(layout.shopId, shopId), eq(layout.faceId, faceId)));
  return row;
}

/** The layout's row, locked until the transaction ends: saves and issuing of one layout follow one another. */
export async function lockLayout(tx: Connection, shopId: ShopId, faceId: string) {
  const [row] = await tx
    .select()
    .from(layout)
    .where(and(eq(layout.shopId, shopId), eq(layout.faceId, faceId)))
    .for("update");
  return row;
}

export async function updateLayout(
  tx: Connection,
  shopId: ShopId,
  layoutId: string,
  fields: LayoutFields & { revision: number },
  userId: string,
  at: Date,
) {
  await tx
    .update(layout)
    .set({ ...fields, updatedBy: userId, updatedAt: at })
    .where(and(eq(layout.shopId, shopId), eq(layout.id, layoutId)));
}

export async function deleteLayout(tx: Connection, shopId: ShopId, layoutId: string) {
  await tx.delete(layoutBoard).where(and(eq(layoutBoard.shopId, shopId), eq(layoutBoard.layoutId, layoutId)));
  await tx.delete(layout).where(and(eq(layout.shopId, shopId), eq(layout.id, layoutId)));
}

/** The boards on a layout's table with the picture version used and the present ones of both sides, in the order of their tags. */
export async function listLayoutBoards(db: Connection, shopId: ShopId, layoutId: string) {
  return db
    .select({
      board,
      straightening,
      faceStraighteningId: boardPicture.straighteningId,
      backStraighteningId: boardPicture.backStraighteningId,
    })
    .from(layoutBoard)
    .innerJoin(board, eq(board.id, layoutBoard.boardId))
    .innerJoin(straightening, eq(straightening.id, layoutBoard.straighteningId))
    .leftJoin(boardPicture, eq(boardPicture.boardId, board.id))
    .where(and(eq(layoutBoard.shopId, shopId), eq(layoutBoard.layoutId, layoutId)))
    .orderBy(asc(board.tagNumber), asc(board.id));
}

export async function insertLayoutBoard(
  tx: Connection,
  shopId: ShopId,
  layoutId: string,
  boardId: string,
  straighteningId: string,
) {
  await tx.insert(layoutBoard).values({ shopId, layoutId, boardId, straighteningId });
}

export async function updateLayoutBoard(
  tx: Connection,
  shopId: ShopId,
  layoutId: string,
  boardId: string,
  straighteningId: string,
) {
  await tx
    .update(layoutBoard)
    .set({ straighteningId })
    .where(and(eq(layoutBoard.shopId, shopId), eq(layoutBoard.layoutId, layoutId), eq(layoutBoard.boardId, boardId)));
}

export async function deleteLayoutBoard(tx: Connection, shopId: ShopId, layoutId: string, boardId: string) {
  await tx
    .delete(layoutBoard)
    .where(and(eq(layoutBoard.shopId, shopId), eq(layoutBoard.layoutId, layoutId), eq(layoutBoard.boardId, boardId)));
}

/** Other layouts of open jobs with one of these boards on their table, and the version of its picture they lie on. */
export async function listHolds(db: Connection, shopId: ShopId, boardIds: readonly string[], exceptLayoutId: string) {
  if (boardIds.length === 0) return [];
  return db
    .select({
      boardId: layoutBoard.boardId,
      straighteningId: layoutBoard.straighteningId,
      document: layout.document,
      faceId: face.id,
      faceTitle: face.title,
      jobTitle: job.title,
    })
    .from(layoutBoard)
    .innerJoin(layout, eq(layout.id, layoutBoard.layoutId))
    .innerJoin(face, eq(face.id, layout.faceId))
    .innerJoin(job, eq(job.id, face.jobId))
    .where(
      and(
        eq(layoutBoard.shopId, shopId),
        inArray(layoutBoard.boardId, [...boardIds]),
        ne(layout.id, exceptLayoutId),
        eq(job.state, "open"),
      ),
    )
    .orderBy(asc(job.number), asc(face.position), asc(face.id));
}

/** Every layout that has this version of a board's picture on its table. */
export async function listLayoutsOnVersion(db: Connection, shopId: ShopId, straighteningId: string) {
  return db
    .select({ faceId: layout.faceId, document: layout.document })
    .from(layoutBoard)
    .innerJoin(layout, eq(layout.id, layoutBoard.layoutId))
    .where(and(eq(layoutBoard.shopId, shopId), eq(layoutBoard.straighteningId, straighteningId)))
    .orderBy(asc(layout.faceId));
}

/** Layouts of several faces with the tags of their boards, for the page of a job. */
export async function listLayoutsOfFaces(db: Connection, shopId: ShopId, faceIds: readonly string[]) {
  if (faceIds.length === 0) return [];
  return db
    .select({ faceId: layout.faceId, revision: layout.revision, document: layout.document, tagNumber: board.tagNumber })
    .from(layout)
    .leftJoin(layoutBoard, eq(layoutBoard.layoutId, layout.id))
    .leftJoin(board, eq(board.id, layoutBoard.boardId))
    .where(and(eq(layout.shopId, shopId), inArray(layout.faceId, [...faceIds])))
    .orderBy(asc(board.tagNumber));
}

/** The newest revision of the newest order of each face. */
export async function listNewestOrders(db: Connection, shopId: ShopId, faceIds: readonly string[]) {
  if (faceIds.length === 0) return new Map<string, { id: string; number: number; revision: number; superseded: boolean }>();
  const rows = await db
    .select({
      faceId: cutOrderFace.faceId,
      id: cutOrder.id,
      number: cutOrder.number,
      revision: orderRevision.revision,
      supersededAt: orderRevision.supersededAt,
    })
    .from(cutOrderFace)
    .innerJoin(cutOrder, eq(cutOrder.id, cutOrderFace.orderId))
    .innerJoin(orderRevision, eq(orderRevision.orderId, cutOrder.id))
    .where(and(eq(cutOrderFace.shopId, shopId), inArray(cutOrderFace.faceId, [...faceIds])))
    .orderBy(asc(cutOrder.number), asc(orderRevision.revision));
  // Later rows win: the newest order, and of it the newest revision.
  return new Map(
    rows.map((row) => [
      row.faceId,
      { id: row.id, number: row.number, revision: row.revision, superseded: row.supersededAt !== null },
    ]),
  );
}

/** The straightening new layouts start from, or undefined while the board has no picture. */
export async function findCurrentStraightening(db: Connection, shopId: ShopId, boardId: string) {
  const [row] = await db
    .select({ straighteningId: boardPicture.straighteningId })
    .from(boardPicture)
    .where(and(eq(boardPicture.shopId, shopId), eq(boardPicture.boardId, boardId)));
  return row?.straighteningId;
}

/** A finished version of this board's picture. */
export async function findDoneStraightening(db: Connection, shopId: ShopId, boardId: string, straighteningId: string) {
  const [row] = await db
    .select()
    .from(straightening)
    .where(
      and(
        eq(straightening.shopId, shopId),
        eq(straightening.id, straighteningId),
        eq(straightening.boardId, boardId),
        eq(straightening.state, "done"),
      ),
    );
  return row;
}
