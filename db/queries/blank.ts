/** Blanks that are planned, and the boards they are glued up from. */
import "server-only";
import { and, asc, eq, inArray, isNotNull, isNull } from "drizzle-orm";
import type { Connection } from "../client";
import { blank, blankMember, board, orderRevisionBoard, stepTick, straightening } from "../schema";
import type { ShopId } from "../shop-id";

export type BlankMemberRow = typeof blankMember.$inferSelect;

export async function findBlank(db: Connection, shopId: ShopId, boardId: string) {
  const [row] = await db
    .select()
    .from(blank)
    .where(and(eq(blank.shopId, shopId), eq(blank.boardId, boardId)));
  return row;
}

/** Throws a duplicate-key error when one of the boards has got into another blank. */
export async function insertBlank(
  tx: Connection,
  shopId: ShopId,
  row: Omit<typeof blank.$inferInsert, "shopId">,
  members: readonly Omit<typeof blankMember.$inferInsert, "shopId" | "blankId">[],
) {
  await tx.insert(blank).values({ ...row, shopId });
  await tx.insert(blankMember).values(members.map((member) => ({ ...member, shopId, blankId: row.boardId })));
}

/** The boards are free again; the blank's own row in the rack stays. */
export async function deleteBlank(tx: Connection, shopId: ShopId, boardId: string) {
  await tx.delete(blankMember).where(and(eq(blankMember.shopId, shopId), eq(blankMember.blankId, boardId)));
  await tx.delete(blank).where(and(eq(blank.shopId, shopId), eq(blank.boardId, boardId)));
}

/** The boards of a blank with the picture each was planned with, from the upper edge down. */
export async function listMembers(db: Connection, shopId: ShopId, blankId: string) {
  return db
    .select({ member: blankMember, board, straightening })
    .from(blankMember)
    .innerJoin(board, eq(board.id, blankMember.boardId))
    .innerJoin(straightening, eq(straightening.id, blankMember.straighteningId))
    .where(and(eq(blankMember.shopId, shopId), eq(blankMember.blankId, blankId)))
    .orderBy(asc(blankMember.position));
}

/** Of these boards, those that are in a blank, with its tag number. */
export async function listInBlanks(db: Connection, shopId: ShopId, boardIds: readonly string[]) {
  if (boardIds.length === 0) return [];
  return db
    .select({ boardId: blankMember.boardId, blankId: blankMember.blankId, blankTagNumber: board.tagNumber })
    .from(blankMember)
    .innerJoin(board, eq(board.id, blankMember.blankId))
    .where(and(eq(blankMember.shopId, shopId), inArray(blankMember.boardId, [...boardIds])))
    .orderBy(asc(blankMember.boardId));
}

/** Whether any revision of a cut order, superseded ones included, was issued from the board. */
export async function isIssued(db: Connection, shopId: ShopId, boardId: string): Promise<boolean> {
  const [row] = await db
    .select({ revisionId: orderRevisionBoard.revisionId })
    .from(orderRevisionBoard)
    .where(and(eq(orderRevisionBoard.shopId, shopId), eq(orderRevisionBoard.boardId, boardId)))
    .limit(1);
  return row !== undefined;
}

/**
 * Whether a planned blank is there in one piece: its gluing up is ticked in a revision that cuts from it, or it was photographed, which
 * only glued boards can be together. `glueUpId`: of the step.
 */
export async function isGlued(db: Connection, shopId: ShopId, boardId: string, glueUpId: string): Promise<boolean> {
  const [ticked] = await db
    .select({ stepId: stepTick.stepId })
    .from(orderRevisionBoard)
    .innerJoin(stepTick, eq(stepTick.revisionId, orderRevisionBoard.revisionId))
    .where(and(eq(orderRevisionBoard.shopId, shopId), eq(orderRevisionBoard.boardId, boardId), eq(stepTick.stepId, glueUpId)))
    .limit(1);
  if (ticked) return true;
  const [photographed] = await db
    .select({ id: straightening.id })
    .from(straightening)
    .where(
      and(
        eq(straightening.shopId, shopId),
        eq(straightening.boardId, boardId),
        eq(straightening.state, "done"),
        isNotNull(straightening.photoId),
      ),
    )
    .limit(1);
  return photographed !== undefined;
}

/** Of these boards, those that were planned as blanks and taken apart: they have a composed picture, and there is no such wood. */
export async function listTakenApart(db: Connection, shopId: ShopId, boardIds: readonly string[]): Promise<ReadonlySet<string>> {
  if (boardIds.length === 0) return new Set();
  const rows = await db
    .selectDistinct({ boardId: straightening.boardId })
    .from(straightening)
    .leftJoin(blank, eq(blank.boardId, straightening.boardId))
    .where(
      and(
        eq(straightening.shopId, shopId),
        inArray(straightening.boardId, [...boardIds]),
        isNull(straightening.photoId),
        isNull(blank.boardId),
      ),
    );
  return new Set(rows.map(({ boardId }) => boardId));
}
