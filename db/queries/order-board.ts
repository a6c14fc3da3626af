/** Which revisions of cut orders cut from which boards. */
import "server-only";
import { and, asc, desc, eq, gte, isNotNull, or } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import type { Connection } from "../client";
import { board, cutOrder, cutOrderFace, layout, layoutBoard, orderRevision, orderRevisionBoard, straightening } from "../schema";
import type { ShopId } from "../shop-id";

/**
 * Every revision that cuts from a board on the layout's table, as the picture that the layout lies on shows it: from that picture, from
 * another one marked on the same photograph, or from a newer one, after which the older ones are no truer. Of each board the highest
 * order number first, and of it the newest revision.
 */
export async function listRevisionsOnBoards(db: Connection, shopId: ShopId, layoutId: string) {
  const used = alias(straightening, "used");
  const cutFrom = alias(straightening, "cut_from");
  return db
    .select({
      boardId: board.id,
      tagNumber: board.tagNumber,
      revisionId: orderRevision.id,
      revision: orderRevision.revision,
      supersededAt: orderRevision.supersededAt,
      summary: orderRevision.summary,
      orderNumber: cutOrder.number,
      state: cutOrder.state,
      ofThisFace: isNotNull(cutOrderFace.faceId).mapWith(Boolean),
    })
    .from(layoutBoard)
    .innerJoin(layout, eq(layout.id, layoutBoard.layoutId))
    .innerJoin(board, eq(board.id, layoutBoard.boardId))
    .innerJoin(used, eq(used.id, layoutBoard.straighteningId))
    .innerJoin(orderRevisionBoard, eq(orderRevisionBoard.boardId, layoutBoard.boardId))
    .innerJoin(cutFrom, eq(cutFrom.id, orderRevisionBoard.straighteningId))
    .innerJoin(orderRevision, eq(orderRevision.id, orderRevisionBoard.revisionId))
    .innerJoin(cutOrder, eq(cutOrder.id, orderRevision.orderId))
    .leftJoin(cutOrderFace, and(eq(cutOrderFace.orderId, cutOrder.id), eq(cutOrderFace.faceId, layout.faceId)))
    .where(
      and(
        eq(layoutBoard.shopId, shopId),
        eq(layoutBoard.layoutId, layoutId),
        eq(orderRevisionBoard.shopId, shopId),
        or(gte(cutFrom.version, used.version), eq(cutFrom.photoId, used.photoId)),
      ),
    )
    .orderBy(asc(board.tagNumber), asc(board.id), desc(cutOrder.number), desc(orderRevision.revision));
}
