/** The revision after the bench has begun, without a database: ticked so far, with what was found, frozen by the code that issues real ones. */
import { v7 as newId } from "uuid";
import type { AsCutEntry } from "@/lib/schemas/as-cut";
import type { Order } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { BegunOrder } from "@/lib/server/orders/begun-order";
import { fingerprintOf } from "@/lib/server/orders/fingerprint";
import { freezeRest } from "@/lib/server/orders/freeze-rest";
import { planAndVerify, planRestAndVerify } from "@/lib/server/orders/plan-cuts";
import { makeGiven, type OrderWanted } from "./make-order";

export interface RestWanted {
  /** Everything up to the first part with this label is done. */
  readonly doneTo: string;
  readonly found: (order: Order, lastStepId: string) => readonly AsCutEntry[];
}

export async function makeRest({ doneTo, found }: RestWanted, change: Partial<OrderWanted> = {}): Promise<Order> {
  const { order, given } = await makeGiven(change);
  const { snapshot } = order;
  const steps = orderSteps(snapshot);
  const at = steps.findIndex((step) => step.kind === "cut" && step.cut.yields.some(({ label }) => label === doneTo));
  const ticks = steps.slice(0, at + 1).map(({ id }) => ({ stepId: id, by: "Asha Noor", at: "2026-03-14T10:00:00.000Z" }));
  const entries = found(order, steps[at]?.id ?? "");
  const asCut = entries.map((entry) => ({ id: newId(), entry, version: 1, by: "Asha Noor", at: "2026-03-14T10:05:00.000Z" }));
  const begun: BegunOrder = {
    snapshot,
    ticked: new Set(ticks.map(({ stepId }) => stepId)),
    entries,
    asCut,
    orderId: order.id,
    number: order.number,
    revision: {
      id: order.revisionId,
      shopId: newId() as BegunOrder["revision"]["shopId"],
      orderId: order.id,
      revision: 1,
      snapshot,
      summary: { faceTitles: order.faceTitles, boards: order.boards, steps: order.steps },
      fingerprint: order.fingerprint,
      issuedBy: newId(),
      issuedAt: new Date(order.issuedAt),
      supersededAt: null,
    },
    given,
    layoutId: newId(),
    layoutChanged: false,
  };
  const planners = { plan: async (request: Parameters<typeof planAndVerify>[0]) => planAndVerify(request) };
  const rest = await freezeRest(begun, {}, { ...planners, planRest: async (task) => planRestAndVerify(task) });
  const revisionId = newId();
  return {
    ...order,
    revision: 2,
    revisionId,
    snapshot: rest.snapshot,
    fingerprint: fingerprintOf(rest.snapshot),
    steps: orderSteps(rest.snapshot).length,
    ticked: ticks.length,
    ticks,
    revisions: [
      { id: revisionId, revision: 2, issuedAt: order.issuedAt, issuedBy: "Mats Lind", supersededAt: null },
      ...order.revisions.map((one) => ({ ...one, supersededAt: order.issuedAt })),
    ],
  };
}
