/** Ticks of the bench. On disk before they are answered; ticking twice is once, and who did it first stands. */
import "server-only";
import type { Connection } from "@/db/client";
import { recordHistory } from "@/db/queries/history";
import { lockOrder, lockRevision, setOrderState } from "@/db/queries/order";
import { deleteTick, insertTick, listTicks } from "@/db/queries/step-tick";
import type { OrderSnapshot } from "@/lib/schemas/order-snapshot";
import { doneBefore, orderSteps } from "@/lib/schemas/order-steps";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { supersededConflict } from "./superseded-conflict";

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

/** What was cut before the revision was issued is what it is planned around. */
function refuseBegun(snapshot: OrderSnapshot, stepId: string): void {
  if (!doneBefore(snapshot).has(stepId)) return;
  throw refused("This was done before the revision was issued, and the rest is planned around it. Enter what is there instead.");
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
    if (verb === "unticked") refuseBegun(revision.snapshot, stepId);
    if (revision.supersededAt !== null) throw await supersededConflict(tx, shopId, orderId, revision.revision);

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
