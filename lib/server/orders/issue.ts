/** Issuing: freezes a face's layout as a numbered cut order, or as the next revision of the order it has. */
import "server-only";
import type { Connection } from "@/db/client";
import { lockBoard } from "@/db/queries/board";
import { listGlueLines } from "@/db/queries/glue-line";
import { recordHistory } from "@/db/queries/history";
import { findFace, findJob } from "@/db/queries/job";
import { findLayout, listLayoutBoards, lockLayout } from "@/db/queries/layout";
import { findNewestOrderOfFace, findRevision, insertOrder, insertRevision, lockOrder, setOrderState } from "@/db/queries/order";
import { findSaw, readShop, takeNumber } from "@/db/queries/shop";
import { listKeepClear, lockZones } from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import { type CutLoss, um } from "@/lib/layout";
import type { OrderRow } from "@/lib/schemas/order";
import type { OrderSnapshot, OrderSummary } from "@/lib/schemas/order-snapshot";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { ShopAccess } from "../access";
import { gluingOf } from "../blanks/gluing-of";
import { database } from "../database";
import { conflict, notFound } from "../faults";
import { fingerprintOf } from "./fingerprint";
import { boardsUsed, freeze, type LayoutBoard, type ToFreeze } from "./freeze";
import { planInThread } from "./plan-pool";
import { orderRow } from "./read-orders";
import { refuseTaken } from "./refuse-taken";
import { markSuperseded } from "./supersede";

/**
 * Asked again for a layout that is issued already, it answers with that order: a request sent twice makes no second revision. An
 * order whose steps are all ticked is done; what is issued for its face afterwards gets a number of its own.
 */
export async function issueOrder(access: ShopAccess, faceId: string, layoutRevision: number): Promise<OrderRow> {
  const db = database();
  const seen = await findLayout(db, access.shopId, faceId);
  if (!seen) throw notFound("face");
  refuseOther(seen.layout.revision, layoutRevision);
  const there = await issuedAlready(db, access.shopId, faceId, layoutRevision);
  if (there) return orderRow(access.shopId, there);

  // Planning may take seconds: nothing is locked meanwhile, and what it was made from is looked at again under the lock.
  const given = await toFreeze(db, access, faceId, seen.layout);
  await refuseTaken(db, access.shopId, seen.layout.id, boardsUsed(given));
  const snapshot = await freeze(given, planInThread);
  const orderId = await db.transaction(async (tx) => {
    const layout = await lockLayout(tx, access.shopId, faceId);
    if (!layout) throw notFound("face");
    refuseOther(layout.revision, layoutRevision);
    await lockInOrder(tx, access.shopId, given.boards);
    await lockZones(
      tx,
      access.shopId,
      given.boards.map(({ straightening }) => straightening.id),
    );
    await refuseOtherTable(tx, access.shopId, layout.id, given);
    const already = await issuedAlready(tx, access.shopId, faceId, layoutRevision);
    if (already) return already;
    const next = await nextRevision(tx, access.shopId, faceId);
    // Another face may have been issued from the same board, or the bench may have begun to cut it, while the cuts were planned.
    await refuseTaken(tx, access.shopId, layout.id, boardsUsed(given));
    await refuseGluedMeanwhile(tx, access.shopId, given);
    return insertIssued(tx, access, snapshot, next);
  });
  return orderRow(access.shopId, orderId);
}

function refuseOther(present: number, asked: number): void {
  if (present === asked) return;
  throw conflict("The layout was changed meanwhile. Look at it as it is now and issue it again.", { revision: present });
}

/** While the cuts were planned the layout was moved to another version of a board's picture, or the areas on it were drawn anew. */
export async function refuseOtherTable(
  tx: Connection,
  shopId: ShopId,
  layoutId: string,
  { boards, face }: ToFreeze,
): Promise<void> {
  const key = (rows: readonly Pick<LayoutBoard, "straightening">[]) =>
    rows.map(({ straightening: { id, zonesRevision } }) => `${id} ${zonesRevision}`).join();
  if (key(await listLayoutBoards(tx, shopId, layoutId)) === key(boards)) return;
  throw conflict("A board of the layout was changed meanwhile. Look at it and issue it again.", {
    revision: face.layoutRevision,
  });
}

/** The bench may have glued the blank up, by an earlier revision, while the cuts were planned: its steps begin elsewhere then. */
export async function refuseGluedMeanwhile(tx: Connection, shopId: ShopId, { boards, face }: ToFreeze): Promise<void> {
  for (const { board, gluing } of boards) {
    if (gluing === null || (await gluingOf(tx, shopId, board))) continue;
    throw conflict("A blank of this layout was glued up meanwhile. Issue it again.", { revision: face.layoutRevision });
  }
}

/**
 * Two that issue from one board follow one another: the second sees what the first was given. In the order of ids, so that they do
 * not wait for each other crosswise.
 */
export async function lockInOrder(tx: Connection, shopId: ShopId, boards: readonly LayoutBoard[]): Promise<void> {
  const ids = boards.map(({ board }) => board.id).sort();
  for (const id of ids) await lockBoard(tx, shopId, id);
}

/** The order that still holds for this revision of the layout. */
async function issuedAlready(db: Connection, shopId: ShopId, faceId: string, layoutRevision: number): Promise<string | null> {
  const order = await findNewestOrderOfFace(db, shopId, faceId);
  const newest = order && (await findRevision(db, shopId, order.id, undefined));
  const holds = newest?.supersededAt === null && layoutRevisionIn(newest.snapshot, faceId) === layoutRevision;
  return holds ? newest.orderId : null;
}

/** Call it with the layout locked: that keeps two from issuing one face at once. */
async function insertIssued(
  tx: Connection,
  access: ShopAccess,
  snapshot: OrderSnapshot,
  next: Awaited<ReturnType<typeof nextRevision>>,
): Promise<string> {
  const { shopId, userId } = access;
  const [{ faceId, layoutRevision } = { faceId: "", layoutRevision: 0 }] = snapshot.faces;
  const at = new Date();
  const order = next ?? (await newOrder(tx, access, snapshot, at));
  // After the number: history rows hold on to the shop's row, and two that both do could never take its counter.
  await markSuperseded(tx, shopId, faceId, { userId, reason: "issued again" }, at);
  await setOrderState(tx, shopId, order.id, "issued", at);
  const fingerprint = fingerprintOf(snapshot);
  await insertRevision(tx, shopId, {
    orderId: order.id,
    revision: order.revision,
    snapshot,
    summary: summaryOf(snapshot),
    fingerprint,
    issuedBy: userId,
    issuedAt: at,
  });
  const detail = { number: order.number, revision: order.revision, faceId, layoutRevision, fingerprint };
  await recordHistory(tx, shopId, { userId, noun: "order", nounId: order.id, verb: "issued", detail }, at);
  return order.id;
}

/** Of the face's newest order, unless there is none or it is cut. The order is locked, as ticking locks it: no step is ticked from
 *  here on. */
async function nextRevision(tx: Connection, shopId: ShopId, faceId: string) {
  const found = await findNewestOrderOfFace(tx, shopId, faceId);
  const order = found && (await lockOrder(tx, shopId, found.id));
  const newest = order && (await findRevision(tx, shopId, order.id, undefined));
  if (!newest || order.state === "cut") return null;
  return { id: order.id, number: order.number, revision: newest.revision + 1 };
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

export async function toFreeze(db: Connection, access: ShopAccess, faceId: string, layout: LayoutRow): Promise<ToFreeze> {
  const { shopId } = access;
  const shop = await readShop(db, shopId);
  const found = await findFace(db, shopId, faceId);
  const job = found && (await findJob(db, shopId, found.face.jobId));
  if (!shop || !found || !job) throw notFound("face");
  const { id, number, title, client } = job;
  const rows = await listLayoutBoards(db, shopId, layout.id);
  const boards = rows.map(async (row) => ({
    ...row,
    keepClear: await listKeepClear(db, shopId, row.straightening.id),
    glueLines: (await listGlueLines(db, shopId, row.straightening.id)).map(({ across }) => across),
    gluing: await gluingOf(db, shopId, row.board),
  }));
  return {
    shop,
    job: { id, number, title, client },
    face: { faceId, title: found.face.title, layoutRevision: layout.revision, layout: layout.document },
    crosscutSaw: await sawOf(db, shopId, layout.crosscutSawId, "Crosscut saw", layout.document.crosscut),
    ripSaw: await sawOf(db, shopId, layout.ripSawId, "Rip saw", layout.document.rip),
    boards: await Promise.all(boards),
  };
}

/** The saw by the name it has now; what it takes is what the layout was made with. */
async function sawOf(db: Connection, shopId: ShopId, sawId: string | null, unnamed: string, loss: CutLoss) {
  const saw = sawId === null ? undefined : await findSaw(db, shopId, sawId);
  const cleanUp = um(Math.max(loss.cleanUpBefore, loss.cleanUpAfter));
  return { name: saw?.name ?? unnamed, kerf: loss.kerf, cleanUp };
}

export function summaryOf(snapshot: OrderSnapshot): OrderSummary {
  return {
    faceTitles: snapshot.faces.map(({ title }) => title),
    boards: snapshot.boards.map(({ tag }) => tag),
    steps: orderSteps(snapshot).length,
  };
}
