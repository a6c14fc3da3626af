/** Reading cut orders: lists with their progress, and one order with a revision's snapshot and ticks. */
import "server-only";
import { countOrders, findOrder, findRevision, listOrders, listRevisions } from "@/db/queries/order";
import { listTicks } from "@/db/queries/step-tick";
import type { ShopId } from "@/db/shop-id";
import type { QueryOf } from "@/lib/schemas/endpoint";
import type * as endpoint from "@/lib/schemas/order";
import type { Order, OrderProgress, OrderRow } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";
import { database } from "../database";
import { notFound } from "../faults";
import { asCutOf } from "./as-cut";

export async function orderPage(shopId: ShopId, { state, page, pageSize }: QueryOf<typeof endpoint.listOrders>) {
  const rows = await listOrders(database(), shopId, { state, limit: pageSize, offset: (page - 1) * pageSize });
  const total = await countOrders(database(), shopId, state);
  return { items: rows.map(rowOf), total, page, pageSize };
}

/** An order with the progress of its newest revision. */
export async function orderRow(shopId: ShopId, orderId: string): Promise<OrderRow> {
  const row = await findOrder(database(), shopId, orderId);
  if (!row) throw notFound("cut order");
  return rowOf(row);
}

/** An order as one of its revisions froze it; the newest unless another is asked for. */
export async function readOrder(shopId: ShopId, orderId: string, revision?: number): Promise<Order> {
  const db = database();
  const row = await findOrder(db, shopId, orderId);
  const frozen = await findRevision(db, shopId, orderId, revision);
  if (!row || !frozen) throw notFound(row ? "revision of this cut order" : "cut order");
  const revisions = await listRevisions(db, shopId, orderId);
  const ticks = await listTicks(db, shopId, frozen.id);
  return {
    ...rowOf(row),
    revision: frozen.revision,
    superseded: frozen.supersededAt !== null,
    steps: orderSteps(frozen.snapshot).length,
    ticked: ticks.length,
    faceTitles: frozen.summary.faceTitles,
    boards: frozen.summary.boards,
    issuedAt: frozen.issuedAt.toISOString(),
    issuedBy: revisions.find(({ id }) => id === frozen.id)?.issuedBy ?? row.issuedBy,
    revisionId: frozen.id,
    fingerprint: frozen.fingerprint,
    snapshot: frozen.snapshot,
    ticks: ticks.map((tick) => ({ ...tick, at: tick.at.toISOString() })),
    asCut: await asCutOf(db, shopId, frozen.id),
    revisions: revisions.map(({ id, revision: number, issuedAt, issuedBy, supersededAt }) => ({
      id,
      revision: number,
      issuedAt: issuedAt.toISOString(),
      issuedBy,
      supersededAt: supersededAt?.toISOString() ?? null,
    })),
  };
}

/** Who ticked what of a revision, and whether it still holds. */
export async function orderProgress(shopId: ShopId, orderId: string, revisionId: string): Promise<OrderProgress> {
  const revisions = await listRevisions(database(), shopId, orderId);
  const asked = revisions.find(({ id }) => id === revisionId);
  const [newest] = revisions;
  if (!asked || !newest) throw notFound("revision of this cut order");
  const ticks = await listTicks(database(), shopId, revisionId);
  return {
    ticks: ticks.map((tick) => ({ ...tick, at: tick.at.toISOString() })),
    asCut: await asCutOf(database(), shopId, revisionId),
    superseded: asked.supersededAt !== null,
    newestRevision: newest.revision,
  };
}

function rowOf({
  summary,
  supersededAt,
  issuedAt,
  ticked,
  ...row
}: NonNullable<Awaited<ReturnType<typeof findOrder>>>): OrderRow {
  return { ...row, ...summary, superseded: supersededAt !== null, issuedAt: issuedAt.toISOString(), ticked: ticked ?? 0 };
}
