/** Glue lines of versions of boards' pictures. */
import "server-only";
import { and, asc, eq } from "drizzle-orm";
import type { Connection } from "../client";
import { glueLine } from "../schema";
import type { ShopId } from "../shop-id";

export type GlueLineRow = Omit<typeof glueLine.$inferSelect, "shopId" | "straighteningId">;

/** From the upper edge down. */
export async function listGlueLines(db: Connection, shopId: ShopId, straighteningId: string): Promise<GlueLineRow[]> {
  return db
    .select({
      id: glueLine.id,
      across: glueLine.across,
      aboveBoardId: glueLine.aboveBoardId,
      belowBoardId: glueLine.belowBoardId,
    })
    .from(glueLine)
    .where(and(eq(glueLine.shopId, shopId), eq(glueLine.straighteningId, straighteningId)))
    .orderBy(asc(glueLine.across), asc(glueLine.id));
}

/** Puts these lines in the place of all there were. */
export async function replaceGlueLines(tx: Connection, shopId: ShopId, straighteningId: string, lines: readonly GlueLineRow[]) {
  await tx.delete(glueLine).where(and(eq(glueLine.shopId, shopId), eq(glueLine.straighteningId, straighteningId)));
  if (lines.length > 0) await tx.insert(glueLine).values(lines.map((line) => ({ ...line, shopId, straighteningId })));
}
