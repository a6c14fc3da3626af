/** Photographs taken in. */
import "server-only";
import { and, asc, desc, eq, inArray, notExists } from "drizzle-orm";
import type { Connection } from "../client";
import { board, photo, straightening } from "../schema";
import type { ShopId } from "../shop-id";

export type PhotoRow = typeof photo.$inferSelect;

export async function findPhoto(db: Connection, shopId: ShopId, photoId: string) {
  const [row] = await db
    .select()
    .from(photo)
    .where(and(eq(photo.shopId, shopId), eq(photo.id, photoId)));
  return row;
}

export async function findPhotoByUploadKey(db: Connection, shopId: ShopId, uploadKey: string) {
  const [row] = await db
    .select()
    .from(photo)
    .where(and(eq(photo.shopId, shopId), eq(photo.uploadKey, uploadKey)));
  return row;
}

/** The photograph's row, locked until the transaction ends: it is not removed while a board begins to use it. */
export async function lockPhoto(tx: Connection, shopId: ShopId, photoId: string) {
  const [row] = await tx
    .select()
    .from(photo)
    .where(and(eq(photo.shopId, shopId), eq(photo.id, photoId)))
    .for("update");
  return row;
}

/** Throws a duplicate-key error when this upload is here already. */
export async function insertPhoto(tx: Connection, shopId: ShopId, row: Omit<typeof photo.$inferInsert, "shopId">) {
  await tx.insert(photo).values({ ...row, shopId });
}

/** States of a version that use its photograph; a try that failed or was stopped does not. */
const using = ["waiting", "done"] as const;

/** Photographs that no board uses, the newest first. */
export async function listLoosePhotos(db: Connection, shopId: ShopId, limit: number): Promise<PhotoRow[]> {
  const uses = db
    .select({ id: straightening.id })
    .from(straightening)
    .where(and(eq(straightening.photoId, photo.id), inArray(straightening.state, [...using])));
  return db
    .select()
    .from(photo)
    .where(and(eq(photo.shopId, shopId), notExists(uses)))
    .orderBy(desc(photo.createdAt), desc(photo.id))
    .limit(limit);
}

/** Tag numbers of the boards that use a photograph. */
export async function listUsesOfPhoto(db: Connection, shopId: ShopId, photoId: string): Promise<number[]> {
  const rows = await db
    .selectDistinct({ tagNumber: board.tagNumber })
    .from(straightening)
    .innerJoin(board, eq(board.id, straightening.boardId))
    .where(and(eq(straightening.shopId, shopId), eq(straightening.photoId, photoId), inArray(straightening.state, [...using])))
    .orderBy(asc(board.tagNumber));
  return rows.map(({ tagNumber }) => tagNumber);
}

/** Removes a photograph that nothing uses, with the tries on it that came to nothing. */
export async function deletePhoto(tx: Connection, shopId: ShopId, photoId: string) {
  await tx.delete(straightening).where(and(eq(straightening.shopId, shopId), eq(straightening.photoId, photoId)));
  await tx.delete(photo).where(and(eq(photo.shopId, shopId), eq(photo.id, photoId)));
}
