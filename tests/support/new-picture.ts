/** A board photographed or marked again: the next version of its picture, of the same size, done and shown in the rack. */
import { and, desc, eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import { boardPicture, photo, straightening } from "@/db/schema";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";

/** Of a photograph of its own, or marked anew on the one before. Answers with the version's id. */
export async function newPicture({ shopId }: ShopAccess, boardId: string, of: "new photo" | "same photo"): Promise<string> {
  const db = database();
  const [newest] = await db
    .select({ version: straightening, photo })
    .from(straightening)
    .innerJoin(photo, eq(photo.id, straightening.photoId))
    .where(and(eq(straightening.shopId, shopId), eq(straightening.boardId, boardId)))
    .orderBy(desc(straightening.version))
    .limit(1);
  if (!newest) throw new Error("the board has no picture yet");
  const id = newId();
  const photoId = of === "same photo" ? newest.photo.id : newId();
  if (photoId !== newest.photo.id) await db.insert(photo).values({ ...newest.photo, id: photoId, uploadKey: photoId });
  await db.insert(straightening).values({ ...newest.version, id, photoId, version: newest.version.version + 1 });
  await db.update(boardPicture).set({ straighteningId: id }).where(eq(boardPicture.boardId, boardId));
  return id;
}
