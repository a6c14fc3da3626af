/** Movement settings of a shop, choices for a face, and what is known of the wood on a layout's table. */
import "server-only";
import { and, asc, eq, max } from "drizzle-orm";
import type { Connection } from "../client";
import { board, face, faceMovement, job, layout, layoutBoard, moistureReading, shopMovement } from "../schema";
import type { ShopId } from "../shop-id";

export type ShopMovementFields = Omit<typeof shopMovement.$inferInsert, "shopId" | "revision">;
type Choices = typeof faceMovement.$inferInsert.choices;

export async function readShopMovement(db: Connection, shopId: ShopId) {
  const [row] = await db.select().from(shopMovement).where(eq(shopMovement.shopId, shopId));
  return row;
}

/** Saves from a base revision, 0 where there is no row yet; false when somebody saved in between. */
export async function saveShopMovement(tx: Connection, shopId: ShopId, baseRevision: number, fields: ShopMovementFields) {
  const revision = baseRevision + 1;
  if (baseRevision === 0) {
    const [inserted] = await tx
      .insert(shopMovement)
      .ignore()
      .values({ ...fields, shopId, revision });
    return inserted.affectedRows === 1;
  }
  const [result] = await tx
    .update(shopMovement)
    .set({ ...fields, revision })
    .where(and(eq(shopMovement.shopId, shopId), eq(shopMovement.revision, baseRevision)));
  return result.affectedRows === 1;
}

/** The face with its job's own climate and what was chosen for it; undefined when there is no such face. */
export async function findFaceMovement(db: Connection, shopId: ShopId, faceId: string) {
  const [row] = await db
    .select({ jobClimate: job.climate, choices: faceMovement.choices, revision: faceMovement.revision })
    .from(face)
    .innerJoin(job, eq(job.id, face.jobId))
    .leftJoin(faceMovement, eq(faceMovement.faceId, face.id))
    .where(and(eq(face.shopId, shopId), eq(face.id, faceId)));
  return row;
}

/** Saves from a base revision, 0 where nothing was chosen yet; false when somebody saved in between. */
export async function saveFaceMovement(
  tx: Connection,
  shopId: ShopId,
  faceId: string,
  baseRevision: number,
  change: { readonly choices: Choices; readonly updatedBy: string; readonly updatedAt: Date },
): Promise<boolean> {
  const revision = baseRevision + 1;
  if (baseRevision === 0) {
    const [inserted] = await tx
      .insert(faceMovement)
      .ignore()
      .values({ ...change, faceId, shopId, revision });
    return inserted.affectedRows === 1;
  }
  const [result] = await tx
    .update(faceMovement)
    .set({ ...change, revision })
    .where(and(eq(faceMovement.shopId, shopId), eq(faceMovement.faceId, faceId), eq(faceMovement.revision, baseRevision)));
  return result.affectedRows === 1;
}

export async function deleteFaceMovement(tx: Connection, shopId: ShopId, faceId: string) {
  await tx.delete(faceMovement).where(and(eq(faceMovement.shopId, shopId), eq(faceMovement.faceId, faceId)));
}

/** The wood of the boards on a face's table, in the order of their tags, with the day of the latest reading. */
export async function listWoodsOnTable(db: Connection, shopId: ShopId, faceId: string) {
  return db
    .select({
      boardId: board.id,
      tagNumber: board.tagNumber,
      species: board.species,
      cut: board.cut,
      moistureTenths: board.moistureTenths,
      takenOn: max(moistureReading.takenOn),
    })
    .from(layout)
    .innerJoin(layoutBoard, eq(layoutBoard.layoutId, layout.id))
    .innerJoin(board, eq(board.id, layoutBoard.boardId))
    .leftJoin(moistureReading, eq(moistureReading.boardId, board.id))
    .where(and(eq(layout.shopId, shopId), eq(layout.faceId, faceId)))
    .groupBy(board.id)
    .orderBy(asc(board.tagNumber), asc(board.id));
}
