/** Issuing: freezes a face's layout as a numbered cut order, or as the next revision of the order it has. */
import "server-only";
import type { Connection } from "@/db/client";
import { recordHistory } from "@/db/queries/history";
import { findFace, findJob } from "@/db/queries/job";
import { listLayoutBoards, lockLayout } from "@/db/queries/layout";
import { findRevision, insertOrder, insertRevision, lockNewestOrderOfFace, setOrderState } from "@/db/queries/order";
import { findSaw, readShop, takeNumber } from "@/db/queries/shop";
import { listKeepClear } from "@/db/queries/straightening";
import { type CutLoss, um } from "@/lib/layout";
import type { OrderRow } from "@/lib/schemas/order";
import type { OrderSnapshot, OrderSummary } from "@/lib/schemas/order-snapshot";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound } from "../faults";
import { fingerprintOf } from "./fingerprint";
import { freeze } from "./freeze";
import { orderRow } from "./read-orders";
import { markSuperseded } from "./supersede";

/**
 * Asked again for a layout that is issued already, it answers with that order: a request sent twice makes no second revision. An
 * order whose steps are all ticked is done; what is issued for its face afterwards gets a number of its own.
 */
export async function issueOrder(access: ShopAccess, faceId: string, layoutRevision: number): Promise<OrderRow> {
  const orderId = await database().transaction(async (tx) => {
    const layout = await lockLayout(tx, access.shopId, faceId);
    if (!layout) throw notFound("face");
    if (layout.revision !== layoutRevision) {
      throw conflict("The layout was changed meanwhile. Look at it as it is now and issue it again.", {
        revision: layout.revision,
      });
    }
    const before = await lockNewestOrderOfFace(tx, access.shopId, faceId);
    const newest = before && (await findRevision(tx, access.shopId, before.id, undefined));
    if (before && newest?.supersededAt === null && layoutRevisionIn(newest.snapshot, faceId) === layoutRevision) return before.id;

    const at = new Date();
    const snapshot = await snapshotOf(tx, access, faceId, layout);
    const revised =
      before?.state === "issued" && newest ? { id: before.id, number: before.number, revision: newest.revision + 1 } : null;
    const order = revised ?? (await newOrder(tx, access, snapshot, at));
    // After the number: history rows hold on to the shop's row, and two that both do could never take its counter.
    await markSuperseded(tx, access.shopId, faceId, at);
    await setOrderState(tx, access.shopId, order.id, "issued", at);
    const fingerprint = fingerprintOf(snapshot);
    await insertRevision(tx, access.shopId, {
      orderId: order.id,
      revision: order.revision,
      snapshot,
      summary: summaryOf(snapshot),
      fingerprint,
      issuedBy: access.userId,
      issuedAt: at,
    });
    const detail = { number: order.number, revision: order.revision, faceId, layoutRevision, fingerprint };
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "order", nounId: order.id, verb: "issued", detail },
      at,
    );
    return order.id;
  });
  return orderRow(access.shopId, orderId);
}

const layoutRevisionIn = (snapshot: OrderSnapshot, faceId: string) =>
  snapshot.faces.find((face) => face.faceId === faceId)?.layoutRevision;

async function newOrder(tx: Connection, access: ShopAccess, snapshot: OrderSnapshot, at: Date) {
  const number = await takeNumber(tx, access.shopId, "nextOrderNumber");
  const faceIds = snapshot.faces.map(({ faceId }) => faceId);
  const id = await insertOrder(tx, access.shopId, { number, jobId: snapshot.job.id, faceIds, at });
  return { id, number, revision: 1 };
}

type LayoutRow = NonNullable<Awaited<ReturnType<typeof lockLayout>>>;

async function snapshotOf(tx: Connection, access: ShopAccess, faceId: string, layout: LayoutRow): Promise<OrderSnapshot> {
  const shop = await readShop(tx, access.shopId);
  const found = await findFace(tx, access.shopId, faceId);
  const job = found && (await findJob(tx, access.shopId, found.face.jobId));
  if (!shop || !found || !job) throw notFound("face");
  const { id, number, title, client } = job;
  const rows = await listLayoutBoards(tx, access.shopId, layout.id);
  const boards = await Promise.all(
    rows.map(async (row) => ({ ...row, keepClear: await listKeepClear(tx, access.shopId, row.straightening.id) })),
  );
  return freeze({
    shop,
    job: { id, number, title, client },
    face: { faceId, title: found.face.title, layoutRevision: layout.revision, layout: layout.document },
    crosscutSaw: await sawOf(tx, access, layout.crosscutSawId, "Crosscut saw", layout.document.crosscut),
    ripSaw: await sawOf(tx, access, layout.ripSawId, "Rip saw", layout.document.rip),
    boards,
  });
}

/** The saw by the name it has now; what it takes is what the layout was made with. */
async function sawOf(tx: Connection, access: ShopAccess, sawId: string | null, unnamed: string, loss: CutLoss) {
  const saw = sawId === null ? undefined : await findSaw(tx, access.shopId, sawId);
  const cleanUp = um(Math.max(loss.cleanUpBefore, loss.cleanUpAfter));
  return { name: saw?.name ?? unnamed, kerf: loss.kerf, cleanUp };
}

function summaryOf(snapshot: OrderSnapshot): OrderSummary {
  return {
    faceTitles: snapshot.faces.map(({ title }) => title),
    boards: snapshot.boards.map(({ tag }) => tag),
    steps: orderSteps(snapshot).length,
  };
}
