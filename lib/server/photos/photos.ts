/** Reading, serving and removing photographs. */
import "server-only";
import { recordHistory } from "@/db/queries/history";
import { deletePhoto, findPhoto, listLoosePhotos, listUsesOfPhoto, lockPhoto } from "@/db/queries/photo";
import type { Photo } from "@/lib/schemas/photo";
import { printTag } from "@/lib/schemas/tag";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { pictureResponse } from "../pictures/picture-response";
import { removePhotoFiles } from "./photo-files";
import { photoOf } from "./photo-of";

export async function readPhoto(access: ShopAccess, photoId: string): Promise<Photo> {
  const row = await findPhoto(database(), access.shopId, photoId);
  if (!row) throw notFound("photograph");
  return photoOf(row);
}

export async function readLoosePhotos(access: ShopAccess, limit: number): Promise<Photo[]> {
  return (await listLoosePhotos(database(), access.shopId, limit)).map(photoOf);
}

export async function photoLevel(access: ShopAccess, photoId: string, level: number): Promise<Response> {
  const row = await findPhoto(database(), access.shopId, photoId);
  if (!row) throw notFound("photograph");
  return pictureResponse(row.levels, level, `photo-${photoId}-${level}.jpg`);
}

/** Removes a photograph that no board uses. Its files go when the row is gone for good. */
export async function removePhoto(access: ShopAccess, photoId: string): Promise<void> {
  await database().transaction(async (tx) => {
    const row = await lockPhoto(tx, access.shopId, photoId);
    if (!row) throw notFound("photograph");
    const [tagNumber] = await listUsesOfPhoto(tx, access.shopId, photoId);
    if (tagNumber !== undefined)
      throw refused(`${printTag(tagNumber)} uses this photograph. It stays as long as the board does.`);
    await deletePhoto(tx, access.shopId, photoId);
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "photo", nounId: photoId, verb: "removed", detail: { fileName: row.fileName } },
      new Date(),
    );
  });
  await removePhotoFiles(access.shopId, photoId);
}
