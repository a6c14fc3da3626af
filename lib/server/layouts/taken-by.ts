/**
 * Which cut orders the boards of a layout belong to. A cut program starts from the whole board as photographed, so a picture belongs to
 * one order at a time, and to nobody any more once the board was cut into.
 */
import "server-only";
import type { Connection } from "@/db/client";
import { listRevisionsOnBoards, listRevisionsOnPictures } from "@/db/queries/order-board";
import { listTickedSteps } from "@/db/queries/step-tick";
import type { ShopId } from "@/db/shop-id";
import { takesWood } from "@/lib/schemas/order-steps";
import { printTag } from "@/lib/schemas/tag";
import type { TakenBy } from "@/lib/schemas/taken-by";

/**
 * By board id; a board whose picture is free is left out. A revision of another face takes a picture while it holds, cut or not; any
 * revision takes it that has wood-taking steps ticked.
 */
export async function takersOf(db: Connection, shopId: ShopId, layoutId: string): Promise<ReadonlyMap<string, TakenBy>> {
  return takersAmong(db, shopId, await listRevisionsOnBoards(db, shopId, layoutId));
}

/** The same, but for one order: its own rest is planned around what it has cut itself. */
export async function takersBesides(
  db: Connection,
  shopId: ShopId,
  layoutId: string,
  orderId: string,
): Promise<ReadonlyMap<string, TakenBy>> {
  const revisions = await listRevisionsOnBoards(db, shopId, layoutId);
  return takersAmong(
    db,
    shopId,
    revisions.filter((revision) => revision.orderId !== orderId),
  );
}

/** The same of boards that lie on no table, by the pictures of theirs that are to be used. Every order is another face's. */
export async function takersOfPictures(
  db: Connection,
  shopId: ShopId,
  straighteningIds: readonly string[],
): Promise<ReadonlyMap<string, TakenBy>> {
  return takersAmong(db, shopId, await listRevisionsOnPictures(db, shopId, straighteningIds));
}

type Revisions = Awaited<ReturnType<typeof listRevisionsOnBoards>>;

async function takersAmong(db: Connection, shopId: ShopId, revisions: Revisions): Promise<ReadonlyMap<string, TakenBy>> {
  // After the revisions: one that is superseded gets no tick any more, so none can be missed.
  const ticks = await listTickedSteps(
    db,
    shopId,
    revisions.map(({ revisionId }) => revisionId),
  );
  const takers = new Map<string, TakenBy>();
  for (const { boardId, tagNumber, revisionId, orderNumber, revision, ofThisFace, state, supersededAt, summary } of revisions) {
    const tag = printTag(tagNumber);
    const cutInto = ticks.some((tick) => tick.revisionId === revisionId && takesWood(tick.stepId, tag));
    const holds = supersededAt === null;
    if (!cutInto && (ofThisFace || !holds)) continue;
    const unfinished = holds && state !== "cut";
    const by = !ofThisFace ? "another-face" : state === "cut" ? "earlier-order" : "this-order";
    const taker = { orderNumber, revision, faceTitle: summary.faceTitles.join(", "), by, cutInto, unfinished } as const;
    // The newest, but one that the bench is still to finish first: there is no use in photographing the board before.
    const before = takers.get(boardId);
    if (!before || (unfinished && !before.unfinished)) takers.set(boardId, taker);
  }
  return takers;
}
