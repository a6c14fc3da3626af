/** Ticks of the bench. On disk before they are answered; ticking twice is once, and who did it first stands. */
import "server-only";
import type { Connection } from "@/db/client";
import { recordHistory } from "@/db/queries/history";
import { findOrder, lockOrder, lockRevision, setOrderState } from "@/db/queries/order";
import { deleteTick, insertTick, listTicks } from "@/db/queries/step-tick";
import { orderSteps } from "@/lib/schemas/order-steps";
import { revisionLetter } from "@/lib/words/revision-letter";
import { supersededWhy } from "@/lib/words/superseded";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound } from "../faults";

/** Names one step of one revision. */
export interface StepAddress {
  readonly orderId: string;
  readonly revisionId: string;
  readonly stepId: string;
}

export async function tickStep(access: ShopAccess, step: StepAddress) {
  return onLockedRevision(access, step, "ticked", (tx, at) =>
    insertTick(tx, {
      revisionId: step.revisionId,
      stepId: step.stepId,
      shopId: access.shopId,
      tickedBy: access.userId,
      tickedAt: at,
    }),
  );
}

export async function untickStep(access: ShopAccess, step: StepAddress) {
  return onLockedRevision(access, step, "unticked", (tx) => deleteTick(tx, access.shopId, step.revisionId, step.stepId));
}

/** Answers with all ticks of the revision, so that the screen also learns what others did. `act` says whether anything changed. */
async function onLockedRevision(
  access: ShopAccess,
  { orderId, revisionId, stepId }: StepAddress,
  verb: "ticked" | "unticked",
  act: (tx: Connection, at: Date) => Promise<boolean>,
) {
  return database().transaction(async (tx) => {
    const { shopId, userId } = access;
    // Order first, then revision, as issuing does: two that lock crosswise would wait for each other.
    await lockOrder(tx, shopId, orderId);
    const revision = await lockRevision(tx, shopId, orderId, revisionId);
    if (!revision) throw notFound("revision of this cut order");
    const steps = orderSteps(revision.snapshot);
    if (!steps.some(({ id }) => id === stepId)) throw notFound("step of this cut order");
    if (revision.supersededAt !== null) throw await supersededConflict(tx, access, orderId, revision.revision);

    const at = new Date();
    const changed = await act(tx, at);
    const ticks = await listTicks(tx, shopId, revisionId);
    if (changed) {
      await setOrderState(tx, shopId, orderId, ticks.length === steps.length ? "cut" : "issued", at);
      const detail = { revision: revision.revision, stepId };
      await recordHistory(tx, shopId, { userId, noun: "order", nounId: orderId, verb, detail }, at);
    }
    return { ticks: ticks.map((tick) => ({ ...tick, at: tick.at.toISOString() })) };
  });
}

/** Stops the work and says what to do instead; the detail carries the newest revision for the screen. */
async function supersededConflict(tx: Connection, access: ShopAccess, orderId: string, revision: number) {
  const order = await findOrder(tx, access.shopId, orderId);
  const newer = order && order.revision > revision;
  const way = newer
    ? `Go on with revision ${revisionLetter(order.revision)}.`
    : "Ask the maker to issue the layout again before anything more is cut.";
  const message = `Revision ${revisionLetter(revision)} is superseded: ${supersededWhy}. ${way}`;
  return conflict(message, { newestRevision: order?.revision ?? revision });
}
