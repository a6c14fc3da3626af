/** Cut orders and their frozen revisions. */
import "server-only";
import { and, count, desc, eq, inArray, isNull, max } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import { cutOrder, cutOrderFace, job, orderRevision, orderRevisionBoard, stepTick, user } from "../schema";
import type { ShopId } from "../shop-id";

export type CutOrderRow = typeof cutOrder.$inferSelect;
type RevisionRow = typeof orderRevision.$inferSelect;
type OrderState = CutOrderRow["state"];

/** The order with the highest number that cuts this face; undefined before the first. */
export async function findNewestOrderOfFace(db: Connection, shopId: ShopId, faceId: string): Promise<CutOrderRow | undefined> {
  const [row] = await db
    .select({ order: cutOrder })
    .from(cutOrder)
    .innerJoin(cutOrderFace, eq(cutOrderFace.orderId, cutOrder.id))
    .where(and(eq(cutOrder.shopId, shopId), eq(cutOrderFace.faceId, faceId)))
    .orderBy(desc(cutOrder.number))
    .limit(1);
  return row?.order;
}

/** The order's row, locked until the transaction ends. */
export async function lockOrder(tx: Connection, shopId: ShopId, orderId: string): Promise<CutOrderRow | undefined> {
  const [row] = await tx
    .select()
    .from(cutOrder)
    .where(and(eq(cutOrder.shopId, shopId), eq(cutOrder.id, orderId)))
    .for("update");
  return row;
}

export async function insertOrder(
  tx: Connection,
  shopId: ShopId,
  fields: { number: number; jobId: string; faceIds: readonly string[]; at: Date },
): Promise<string> {
  const id = newId();
  const { number, jobId, at } = fields;
  await tx.insert(cutOrder).values({ id, shopId, number, jobId, state: "issued", createdAt: at, updatedAt: at });
  await tx.insert(cutOrderFace).values(fields.faceIds.map((faceId) => ({ orderId: id, faceId, shopId })));
  return id;
}

export async function setOrderState(tx: Connection, shopId: ShopId, orderId: string, state: OrderState, at: Date) {
  await tx
    .update(cutOrder)
    .set({ state, updatedAt: at })
    .where(and(eq(cutOrder.shopId, shopId), eq(cutOrder.id, orderId)));
}

/** With the boards it cuts. */
export async function insertRevision(
  tx: Connection,
  shopId: ShopId,
  fields: Pick<RevisionRow, "orderId" | "revision" | "snapshot" | "summary" | "fingerprint" | "issuedBy" | "issuedAt">,
): Promise<string> {
  const id = newId();
  await tx.insert(orderRevision).values({ ...fields, id, shopId, supersededAt: null });
  const boards = fields.snapshot.boards.map(({ boardId, straighteningId }) => ({ boardId, straighteningId }));
  await tx.insert(orderRevisionBoard).values(boards.map((one) => ({ ...one, revisionId: id, shopId })));
  return id;
}

/** The revisions that still hold of every order that cuts this face, locked until the transaction ends. */
export async function lockLiveRevisionsOfFace(tx: Connection, shopId: ShopId, faceId: string) {
  return tx
    .select({ id: orderRevision.id, orderId: orderRevision.orderId, revision: orderRevision.revision })
    .from(orderRevision)
    .innerJoin(cutOrderFace, eq(cutOrderFace.orderId, orderRevision.orderId))
    .where(and(eq(orderRevision.shopId, shopId), eq(cutOrderFace.faceId, faceId), isNull(orderRevision.supersededAt)))
    .orderBy(orderRevision.id)
    .for("update");
}

/** Those of the faces that have a revision which still holds. */
export async function listIssuedFaces(db: Connection, shopId: ShopId, faceIds: readonly string[]): Promise<ReadonlySet<string>> {
  if (faceIds.length === 0) return new Set();
  const rows = await db
    .selectDistinct({ faceId: cutOrderFace.faceId })
    .from(cutOrderFace)
    .innerJoin(orderRevision, eq(orderRevision.orderId, cutOrderFace.orderId))
    .where(and(eq(cutOrderFace.shopId, shopId), inArray(cutOrderFace.faceId, [...faceIds]), isNull(orderRevision.supersededAt)));
  return new Set(rows.map(({ faceId }) => faceId));
}

export async function setSuperseded(tx: Connection, shopId: ShopId, revisionIds: readonly string[], at: Date) {
  if (revisionIds.length === 0) return;
  await tx
    .update(orderRevision)
    .set({ supersededAt: at })
    .where(and(eq(orderRevision.shopId, shopId), inArray(orderRevision.id, [...revisionIds])));
}

/** The revision, locked until the transaction ends, so that ticks and superseding follow one another. */
export async function lockRevision(tx: Connection, shopId: ShopId, orderId: string, revisionId: string) {
  const [row] = await tx
    .select()
    .from(orderRevision)
    .where(and(eq(orderRevision.shopId, shopId), eq(orderRevision.orderId, orderId), eq(orderRevision.id, revisionId)))
    .for("update");
  return row;
}

/** One revision with its snapshot: the one numbered, else the newest. */
export async function findRevision(db: Connection, shopId: ShopId, orderId: string, revision: number | undefined) {
  const [row] = await db
    .select()
    .from(orderRevision)
    .where(
      and(
        eq(orderRevision.shopId, shopId),
        eq(orderRevision.orderId, orderId),
        revision === undefined ? undefined : eq(orderRevision.revision, revision),
      ),
    )
    .orderBy(desc(orderRevision.revision))
    .limit(1);
  return row;
}

/** All revisions of an order without their snapshots, newest first. */
export async function listRevisions(db: Connection, shopId: ShopId, orderId: string) {
  return db
    .select({
      id: orderRevision.id,
      revision: orderRevision.revision,
      issuedAt: orderRevision.issuedAt,
      issuedBy: user.name,
      supersededAt: orderRevision.supersededAt,
      summary: orderRevision.summary,
    })
    .from(orderRevision)
    .innerJoin(user, eq(user.id, orderRevision.issuedBy))
    .where(and(eq(orderRevision.shopId, shopId), eq(orderRevision.orderId, orderId)))
    .orderBy(desc(orderRevision.revision));
}

/** An order with what its newest revision is made of, and how many of its steps are ticked. */
export async function findOrder(db: Connection, shopId: ShopId, orderId: string) {
  const [row] = await orderRows(db, shopId).where(and(eq(cutOrder.shopId, shopId), eq(cutOrder.id, orderId)));
  return row;
}

/** One page of orders, the highest number first. */
export async function listOrders(
  db: Connection,
  shopId: ShopId,
  page: { state: OrderState | "all"; limit: number; offset: number },
) {
  return orderRows(db, shopId)
    .where(and(eq(cutOrder.shopId, shopId), ofState(page.state)))
    .orderBy(desc(cutOrder.number))
    .limit(page.limit)
    .offset(page.offset);
}

export async function countOrders(db: Connection, shopId: ShopId, state: OrderState | "all"): Promise<number> {
  const [row] = await db
    .select({ orders: count() })
    .from(cutOrder)
    .where(and(eq(cutOrder.shopId, shopId), ofState(state)));
  return row?.orders ?? 0;
}

const ofState = (state: OrderState | "all") => (state === "all" ? undefined : eq(cutOrder.state, state));

function newestRevisions(db: Connection, shopId: ShopId) {
  return db
    .select({ orderId: orderRevision.orderId, revision: max(orderRevision.revision).as("newest_revision") })
    .from(orderRevision)
    .where(eq(orderRevision.shopId, shopId))
    .groupBy(orderRevision.orderId)
    .as("newest");
}

function orderRows(db: Connection, shopId: ShopId) {
  const newest = newestRevisions(db, shopId);
  const ticks = db
    .select({ revisionId: stepTick.revisionId, ticked: count().as("ticked") })
    .from(stepTick)
    .where(eq(stepTick.shopId, shopId))
    .groupBy(stepTick.revisionId)
    .as("ticks");
  return db
    .select({
      id: cutOrder.id,
      number: cutOrder.number,
      state: cutOrder.state,
      jobId: job.id,
      jobTitle: job.title,
      revision: orderRevision.revision,
      summary: orderRevision.summary,
      supersededAt: orderRevision.supersededAt,
      issuedAt: orderRevision.issuedAt,
      issuedBy: user.name,
      ticked: ticks.ticked,
    })
    .from(cutOrder)
    .innerJoin(newest, eq(newest.orderId, cutOrder.id))
    .innerJoin(orderRevision, and(eq(orderRevision.orderId, cutOrder.id), eq(orderRevision.revision, newest.revision)))
    .innerJoin(job, eq(job.id, cutOrder.jobId))
    .innerJoin(user, eq(user.id, orderRevision.issuedBy))
    .leftJoin(ticks, eq(ticks.revisionId, orderRevision.id))
    .$dynamic();
}
