/**
 * The rest of an order that the bench has begun: previewed, and issued as its next revision. What is done is done in that revision too,
 * ticked by whoever ticked it; the layout follows the pieces that had to move in the same transaction.
 */
import "server-only";
import type { Connection } from "@/db/client";
import { recordHistory } from "@/db/queries/history";
import { touchJob } from "@/db/queries/job";
import { lockLayout, updateLayout } from "@/db/queries/layout";
import { findRevision, insertRevision, lockOrder, lockRevision, setOrderState } from "@/db/queries/order";
import { insertTicks, listTickRows } from "@/db/queries/step-tick";
import { lockZones } from "@/db/queries/straightening";
import type { OrderRow } from "@/lib/schemas/order";
import type { OrderSnapshot } from "@/lib/schemas/order-snapshot";
import { doneBefore, orderSteps } from "@/lib/schemas/order-steps";
import type { RescueChoicesByBoard, Rest } from "@/lib/schemas/rest";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound } from "../faults";
import { type BegunOrder, basisOf, readBegun } from "./begun-order";
import { fingerprintOf } from "./fingerprint";
import { boardsUsed } from "./freeze";
import { type FrozenRest, freezeRest } from "./freeze-rest";
import { lockInOrder, refuseGluedMeanwhile, refuseOtherTable, summaryOf } from "./issue";
import { planInThread, planRestInThread } from "./plan-pool";
import { orderRow } from "./read-orders";
import { refuseTaken } from "./refuse-taken";
import { markSuperseded } from "./supersede";

export async function previewRest(access: ShopAccess, orderId: string, choices: RescueChoicesByBoard): Promise<Rest> {
  const begun = await readBegun(database(), access, orderId);
  return (await frozen(begun, choices)).preview;
}

/** `basis`: of the preview that is issued. Asked twice, it answers twice with the one revision. */
export async function issueRest(
  access: ShopAccess,
  orderId: string,
  { basis, choices }: { readonly basis: string; readonly choices: RescueChoicesByBoard },
): Promise<OrderRow> {
  const { shopId } = access;
  const db = database();
  const newest = await findRevision(db, shopId, orderId, undefined);
  if (!newest) throw notFound("cut order");
  if (newest.snapshot.rest?.basis === basis) return orderRow(shopId, orderId);

  // As when a layout is issued: nothing is locked while the cuts are planned, and everything is looked at again under the lock.
  const begun = await readBegun(db, access, orderId);
  if (basisOf(begun, choices) !== basis) throw changedMeanwhile(begun);
  await refuseTaken(db, shopId, begun.layoutId, boardsUsed(begun.given), orderId);
  const rest = await frozen(begun, choices);
  await db.transaction((tx) => issueLocked(tx, access, begun, rest, choices));
  return orderRow(shopId, orderId);
}

const frozen = (begun: BegunOrder, choices: RescueChoicesByBoard): Promise<FrozenRest> =>
  freezeRest(begun, choices, { plan: planInThread, planRest: planRestInThread });

/** Layout, boards, zones, order, revision: in the order in which everything else locks them. */
async function issueLocked(
  tx: Connection,
  access: ShopAccess,
  begun: BegunOrder,
  rest: FrozenRest,
  choices: RescueChoicesByBoard,
): Promise<void> {
  const { shopId } = access;
  const { given, orderId } = begun;
  const layout = await lockLayout(tx, shopId, given.face.faceId);
  if (!layout) throw notFound("face");
  await lockInOrder(tx, shopId, given.boards);
  await lockZones(
    tx,
    shopId,
    given.boards.map(({ straightening }) => straightening.id),
  );
  await refuseOtherTable(tx, shopId, layout.id, given);
  await lockOrder(tx, shopId, orderId);
  await lockRevision(tx, shopId, orderId, begun.revision.id);
  const newest = await findRevision(tx, shopId, orderId, undefined);
  // The same was asked twice at once, and the other request came first.
  if (newest?.snapshot.rest?.basis === basisOf(begun, choices)) return;
  const now = await readBegun(tx, access, orderId);
  if (basisOf(now, choices) !== basisOf(begun, choices)) throw changedMeanwhile(now);
  await refuseTaken(tx, shopId, layout.id, boardsUsed(given), orderId);
  await refuseGluedMeanwhile(tx, shopId, given);
  await store(tx, access, begun, rest, layout);
}

async function store(
  tx: Connection,
  access: ShopAccess,
  begun: BegunOrder,
  { snapshot, layoutMoved }: FrozenRest,
  layout: NonNullable<Awaited<ReturnType<typeof lockLayout>>>,
): Promise<void> {
  const { shopId, userId } = access;
  const { orderId, number } = begun;
  const at = new Date();
  const [face] = snapshot.faces;
  if (!face) throw new Error("an order without a face");
  const { faceId, layoutRevision } = face;
  if (layoutMoved) {
    const { crosscutSawId, ripSawId } = layout;
    const fields = { document: face.layout, crosscutSawId, ripSawId, revision: layoutRevision };
    await updateLayout(tx, shopId, layout.id, fields, userId, at);
    await touchJob(tx, shopId, snapshot.job.id, at);
    const detail = { revision: layoutRevision, faceId, orderId };
    await recordHistory(tx, shopId, { userId, noun: "layout", nounId: layout.id, verb: "followed the cutting", detail }, at);
  }
  await markSuperseded(tx, shopId, faceId, { userId, reason: "rest issued" }, at);
  const fingerprint = fingerprintOf(snapshot);
  const revision = begun.revision.revision + 1;
  const summary = summaryOf(snapshot);
  const revisionId = await insertRevision(tx, shopId, {
    orderId,
    revision,
    snapshot,
    summary,
    fingerprint,
    issuedBy: userId,
    issuedAt: at,
  });
  const ticked = await carryTicks(tx, access, begun, { revisionId, snapshot }, at);
  await setOrderState(tx, shopId, orderId, ticked === summary.steps ? "cut" : "issued", at);
  const detail = { number, revision, faceId, layoutRevision, fingerprint };
  await recordHistory(tx, shopId, { userId, noun: "order", nounId: orderId, verb: "rest issued", detail }, at);
}

/** Ticks of steps that the revision has too stay with who made them; a step that counts as done because a later one is, is ticked by who issues. */
async function carryTicks(
  tx: Connection,
  { shopId, userId }: ShopAccess,
  begun: BegunOrder,
  { revisionId, snapshot }: { readonly revisionId: string; readonly snapshot: OrderSnapshot },
  at: Date,
): Promise<number> {
  const before = new Map((await listTickRows(tx, shopId, begun.revision.id)).map((tick) => [tick.stepId, tick]));
  const done = doneBefore(snapshot);
  const rows = orderSteps(snapshot).flatMap(({ id: stepId }) => {
    const tick = before.get(stepId);
    if (!tick && !done.has(stepId)) return [];
    const { tickedBy, tickedAt } = tick ?? { tickedBy: userId, tickedAt: at };
    return [{ revisionId, stepId, shopId, tickedBy, tickedAt }];
  });
  await insertTicks(tx, rows);
  return rows.length;
}

function changedMeanwhile({ revision }: BegunOrder) {
  return conflict("Something was ticked, entered or moved meanwhile. Look at the rest as it is now and issue it then.", {
    revision: revision.revision,
  });
}
