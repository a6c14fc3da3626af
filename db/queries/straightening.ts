/** Versions of boards' straightened pictures with their zones. */
import "server-only";
import { and, asc, desc, eq, inArray, max } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { BoardSide } from "@/lib/schemas/straightening";
import type { Connection } from "../client";
import { board, boardPicture, keepClear, straightening } from "../schema";
import type { ShopId } from "../shop-id";

export type StraighteningRow = typeof straightening.$inferSelect;

export async function findStraightening(db: Connection, shopId: ShopId, straighteningId: string) {
  const [row] = await db
    .select()
    .from(straightening)
    .where(and(eq(straightening.shopId, shopId), eq(straightening.id, straighteningId)));
  return row;
}

/** The version, locked until the transaction ends: whoever saves its outline and areas, or issues from them, follows one another. */
export async function lockStraightening(tx: Connection, shopId: ShopId, straighteningId: string) {
  const [row] = await tx
    .select()
    .from(straightening)
    .where(and(eq(straightening.shopId, shopId), eq(straightening.id, straighteningId)))
    .for("update");
  return row;
}

/** Keeps the outlines and areas of these versions as they are until the transaction ends. In the order of ids. */
export async function lockZones(tx: Connection, shopId: ShopId, straighteningIds: readonly string[]) {
  if (straighteningIds.length === 0) return;
  await tx
    .select({ id: straightening.id })
    .from(straightening)
    .where(and(eq(straightening.shopId, shopId), inArray(straightening.id, [...straighteningIds])))
    .orderBy(asc(straightening.id))
    .for("update");
}

export async function listKeepClear(db: Connection, shopId: ShopId, straighteningId: string) {
  return db
    .select({ id: keepClear.id, kind: keepClear.kind, area: keepClear.area, note: keepClear.note })
    .from(keepClear)
    .where(and(eq(keepClear.shopId, shopId), eq(keepClear.straighteningId, straighteningId)))
    .orderBy(asc(keepClear.id));
}

/** All versions of a board's picture, the newest first. */
export async function listStraightenings(db: Connection, shopId: ShopId, boardId: string): Promise<StraighteningRow[]> {
  return db
    .select()
    .from(straightening)
    .where(and(eq(straightening.shopId, shopId), eq(straightening.boardId, boardId)))
    .orderBy(desc(straightening.version));
}

/** The version of its face that the rack shows, or that of its back; undefined while there is none. */
export async function findBoardPicture(
  db: Connection,
  shopId: ShopId,
  boardId: string,
  side: BoardSide = "face",
): Promise<StraighteningRow | undefined> {
  const shown = side === "face" ? boardPicture.straighteningId : boardPicture.backStraighteningId;
  const [row] = await db
    .select({ straightening })
    .from(boardPicture)
    .innerJoin(straightening, eq(straightening.id, shown))
    .where(and(eq(boardPicture.shopId, shopId), eq(boardPicture.boardId, boardId)));
  return row?.straightening;
}

type NewVersion = Pick<
  typeof straightening.$inferInsert,
  "boardId" | "photoId" | "side" | "marking" | "length" | "width" | "createdBy" | "createdAt"
>;

/** A version that waits for its picture. The board's row must be locked, so that no number is given twice; both sides count together. */
export async function insertWaitingStraightening(tx: Connection, shopId: ShopId, fields: NewVersion) {
  const [last] = await tx
    .select({ version: max(straightening.version) })
    .from(straightening)
    .where(and(eq(straightening.shopId, shopId), eq(straightening.boardId, fields.boardId)));
  const id = newId();
  const version = (last?.version ?? 0) + 1;
  await tx
    .insert(straightening)
    .values({ ...fields, id, shopId, version, state: "waiting", pxPerMm: 0, levels: [], zonesRevision: 0 });
  return { id, version };
}

export async function setStraighteningTask(tx: Connection, shopId: ShopId, straighteningId: string, taskId: string) {
  await tx
    .update(straightening)
    .set({ taskId })
    .where(and(eq(straightening.shopId, shopId), eq(straightening.id, straighteningId)));
}

/** Ends the waiting of a version; false when it waits no longer. */
export async function endWaitingStraightening(
  tx: Connection,
  shopId: ShopId,
  straighteningId: string,
  end: Partial<typeof straightening.$inferInsert> & { state: "done" | "failed" | "cancelled" },
): Promise<boolean> {
  const [result] = await tx
    .update(straightening)
    .set(end)
    .where(and(eq(straightening.shopId, shopId), eq(straightening.id, straighteningId), eq(straightening.state, "waiting")));
  return result.affectedRows === 1;
}

/** The picture of the back. A board has one of its face before, which holds the row. */
export async function setBackPicture(tx: Connection, shopId: ShopId, boardId: string, straighteningId: string) {
  await tx
    .update(boardPicture)
    .set({ backStraighteningId: straighteningId })
    .where(and(eq(boardPicture.shopId, shopId), eq(boardPicture.boardId, boardId)));
}

/** Shows this version in the rack; the board takes its size from it. */
export async function setBoardPicture(
  tx: Connection,
  shopId: ShopId,
  shown: { boardId: string; straighteningId: string; size: Pick<typeof board.$inferSelect, "length" | "width" | "revision"> },
  at: Date,
) {
  const { boardId, straighteningId, size } = shown;
  await tx.insert(boardPicture).values({ shopId, boardId, straighteningId }).onDuplicateKeyUpdate({ set: { straighteningId } });
  await tx
    .update(board)
    .set({ ...size, updatedAt: at })
    .where(and(eq(board.shopId, shopId), eq(board.id, boardId)));
}

type Outline = StraighteningRow["outline"];
export type KeepClearRow = Omit<typeof keepClear.$inferInsert, "shopId" | "straighteningId">;

/** The outline that a version begins with, before anybody can have drawn on it. */
export async function setOutline(tx: Connection, shopId: ShopId, straighteningId: string, outline: Outline) {
  await tx
    .update(straightening)
    .set({ outline })
    .where(and(eq(straightening.shopId, shopId), eq(straightening.id, straighteningId)));
}

/** Saves the outline from a base revision; false when somebody saved in between. */
export async function updateOutline(
  tx: Connection,
  shopId: ShopId,
  straighteningId: string,
  baseRevision: number,
  outline: Outline,
): Promise<boolean> {
  const [result] = await tx
    .update(straightening)
    .set({ outline, zonesRevision: baseRevision + 1 })
    .where(
      and(eq(straightening.shopId, shopId), eq(straightening.id, straighteningId), eq(straightening.zonesRevision, baseRevision)),
    );
  return result.affectedRows === 1;
}

/** Puts these areas in the place of all there were. */
export async function replaceKeepClear(tx: Connection, shopId: ShopId, straighteningId: string, areas: readonly KeepClearRow[]) {
  await tx.delete(keepClear).where(and(eq(keepClear.shopId, shopId), eq(keepClear.straighteningId, straighteningId)));
  if (areas.length > 0) await tx.insert(keepClear).values(areas.map((area) => ({ ...area, shopId, straighteningId })));
}
