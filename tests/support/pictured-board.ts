/** A board of the rack with a finished picture of its face, and of its back, without any pixel having been moved. */
import { eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import { findBoard } from "@/db/queries/board";
import { boardPicture, photo, straightening } from "@/db/schema";
import { um } from "@/lib/layout";
import type { BoardSide } from "@/lib/schemas/straightening";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { enter, soundMarking, wire } from "./rack";

type Levels = (typeof straightening.$inferInsert)["levels"];

export interface Pictured {
  readonly boardId: string;
  readonly tag: string;
  readonly straighteningId: string;
}

/** In the rack, on no table. */
export async function picturedBoard(
  access: ShopAccess,
  fields: Parameters<typeof enter>[1] = {},
  levels: Levels = [],
): Promise<Pictured> {
  const { id: boardId, tag } = await enter(access, fields);
  const straighteningId = await addPicture(access, boardId, { side: "face", levels });
  return { boardId, tag, straighteningId };
}

export interface PictureWanted {
  readonly side: BoardSide;
  /** When its photograph came in. */
  readonly photographedAt?: Date;
  readonly levels?: Levels;
}

/** The next version of one side, of a photograph of its own and of the board's size, shown as that side's picture. */
export async function addPicture({ shopId, userId }: ShopAccess, boardId: string, wanted: PictureWanted): Promise<string> {
  const { side, photographedAt = new Date(), levels = [] } = wanted;
  const db = database();
  const found = await findBoard(db, shopId, boardId);
  if (!found) throw new Error("no such board");
  const [photoId, straighteningId] = [newId(), newId()];
  await db.insert(photo).values({
    id: photoId,
    shopId,
    uploadKey: photoId,
    fileName: "board.jpg",
    sha256: "0".repeat(64),
    kind: "jpeg",
    bytes: 1,
    widthPx: 1000,
    heightPx: 100,
    takenAt: null,
    camera: null,
    focalLengthHundredths: null,
    originalKey: `tests/${photoId}`,
    levels: [],
    uploadedBy: userId,
    createdAt: photographedAt,
  });
  const before = await db.select({ id: straightening.id }).from(straightening).where(eq(straightening.boardId, boardId));
  await db.insert(straightening).values({
    id: straighteningId,
    shopId,
    boardId,
    photoId,
    side,
    version: before.length + 1,
    state: "done",
    failure: null,
    marking: wire(soundMarking),
    length: found.board.length,
    width: found.board.width,
    pxPerMm: 4,
    levels,
    residual: um(0),
    outline: null,
    zonesRevision: 0,
    taskId: null,
    createdBy: userId,
    createdAt: photographedAt,
  });
  const row = { boardId, shopId, straighteningId };
  if (side === "face") await db.insert(boardPicture).values(row).onDuplicateKeyUpdate({ set: { straighteningId } });
  else await db.update(boardPicture).set({ backStraighteningId: straighteningId }).where(eq(boardPicture.boardId, boardId));
  return straighteningId;
}
