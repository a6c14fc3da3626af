/** Which revisions of cut orders cut from which boards. */
import "server-only";
import { and, asc, desc, eq, gte, inArray, isNotNull, isNull, lte, ne, or, type SQL, type SQLWrapper, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import type { Connection } from "../client";
import {
  board,
  cutOrder,
  cutOrderFace,
  layout,
  layoutBoard,
  orderRevision,
  orderRevisionBoard,
  photo,
  straightening,
} from "../schema";
import type { ShopId } from "../shop-id";

/** The pictures that are to be cut from. */
const used = alias(straightening, "used");

/**
 * Every revision that cuts from a board as one of these pictures shows it: from that picture, from another one marked on the same
 * photograph, or from a newer one, after which the older ones are no truer. Face and back are the same wood: an order from one side has
 * the pictures of the other that were photographed before it was issued. Of each board the highest order number first, and of it the
 * newest revision.
 */
export async function listRevisionsOnPictures(db: Connection, shopId: ShopId, straighteningIds: readonly string[]) {
  if (straighteningIds.length === 0) return [];
  return revisionsOn(db, shopId, inArray(used.id, [...straighteningIds]), "");
}

/** The same of the boards on the layout's table, each on the picture that the layout lies on. */
export async function listRevisionsOnBoards(db: Connection, shopId: ShopId, layoutId: string) {
  const pictures = db
    .select({ id: layoutBoard.straighteningId })
    .from(layoutBoard)
    .where(and(eq(layoutBoard.shopId, shopId), eq(layoutBoard.layoutId, layoutId)));
  const faceId = db.select({ faceId: layout.faceId }).from(layout).where(eq(layout.id, layoutId));
  return revisionsOn(db, shopId, inArray(used.id, pictures), faceId);
}

/** `faceId`: whose orders are told apart as its own. */
async function revisionsOn(db: Connection, shopId: ShopId, onPictures: SQL, faceId: SQLWrapper | string) {
  const cutFrom = alias(straightening, "cut_from");
  const usedPhoto = alias(photo, "used_photo");
  return db
    .select({
      boardId: board.id,
      tagNumber: board.tagNumber,
      revisionId: orderRevision.id,
      revision: orderRevision.revision,
      supersededAt: orderRevision.supersededAt,
      summary: orderRevision.summary,
      orderId: cutOrder.id,
      orderNumber: cutOrder.number,
      state: cutOrder.state,
      ofThisFace: isNotNull(cutOrderFace.faceId).mapWith(Boolean),
    })
    .from(used)
    .innerJoin(board, eq(board.id, used.boardId))
    .leftJoin(usedPhoto, eq(usedPhoto.id, used.photoId))
    .innerJoin(orderRevisionBoard, eq(orderRevisionBoard.boardId, used.boardId))
    .innerJoin(cutFrom, eq(cutFrom.id, orderRevisionBoard.straighteningId))
    .innerJoin(orderRevision, eq(orderRevision.id, orderRevisionBoard.revisionId))
    .innerJoin(cutOrder, eq(cutOrder.id, orderRevision.orderId))
    .leftJoin(cutOrderFace, and(eq(cutOrderFace.orderId, cutOrder.id), eq(cutOrderFace.faceId, sql`(${faceId})`)))
    .where(
      and(
        eq(used.shopId, shopId),
        onPictures,
        eq(orderRevisionBoard.shopId, shopId),
        or(
          eq(cutFrom.photoId, used.photoId),
          and(eq(cutFrom.side, used.side), gte(cutFrom.version, used.version)),
          // The other side of the same wood: only a photograph that came in after the order was issued can show it cut.
          and(ne(cutFrom.side, used.side), or(isNull(usedPhoto.id), lte(usedPhoto.createdAt, orderRevision.issuedAt))),
        ),
      ),
    )
    .orderBy(asc(board.tagNumber), asc(board.id), desc(cutOrder.number), desc(orderRevision.revision));
}
