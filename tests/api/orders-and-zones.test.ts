/** What drawing outlines and keep-clear areas does to cut orders made from them, also when both happen at once. */
import { and, eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from "vitest";
import { history, layoutBoard } from "@/db/schema";
import { umFromMm } from "@/lib/layout";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { KeepClearArea, Zones } from "@/lib/schemas/zones";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { readHistory } from "@/lib/server/history";
import { issueOrder } from "@/lib/server/orders/issue";
import { type Planner, planAndVerify } from "@/lib/server/orders/plan-cuts";
import { readOrder } from "@/lib/server/orders/read-orders";
import { tickStep } from "@/lib/server/orders/ticks";
import { saveZones } from "@/lib/server/straightenings/save-zones";
import { historyWords } from "@/lib/words/history-line";
import { makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";

/** Runs while an order's cuts are planned: nothing is locked then, as in the real thread. */
let whilePlanning: () => Promise<unknown> = async () => undefined;
const planned: Planner = async (request) => {
  await whilePlanning();
  return planAndVerify(request);
};
vi.mock("@/lib/server/orders/plan-pool", () => ({ planInThread: ((request) => planned(request)) satisfies Planner }));

let maker: ShopAccess;
let owner: ShopAccess;
beforeAll(async () => {
  ({ maker, owner } = await makeShop());
});
beforeEach(() => {
  whilePlanning = async () => undefined;
});
afterAll(() => vi.restoreAllMocks());

/** Well clear of the four fronts, which lie between 96 and 1078 mm from the left end. */
const knot = (xMm = 1800, fields: Partial<KeepClearArea> = {}): KeepClearArea => ({
  id: newId(),
  kind: "knot",
  area: {
    shape: "ellipse",
    centre: { x: umFromMm(xMm), y: umFromMm(100) },
    radiusX: umFromMm(20),
    radiusY: umFromMm(15),
    turnDeg: 0,
  },
  note: "",
  ...fields,
});

const zones = (revision: number, keepClear: KeepClearArea[], outline: Zones["outline"] = null): Zones => ({
  outline,
  keepClear,
  glueLines: [],
  revision,
});

const outline: NonNullable<Zones["outline"]> = [
  { x: umFromMm(5), y: umFromMm(5) },
  { x: umFromMm(2300), y: umFromMm(5) },
  { x: umFromMm(2300), y: umFromMm(205) },
  { x: umFromMm(5), y: umFromMm(205) },
];

async function issued() {
  const made = await makeLayout(maker);
  const order = await issueOrder(maker, made.faceId, 1);
  return { ...made, orderId: order.id };
}

describe("saving outline and areas after an order was issued", () => {
  test.each([
    ["a keep-clear area is added", zones(0, [knot()])],
    ["an outline is drawn", zones(0, [], outline)],
  ])("supersedes it when %s, with who and why in the history", async (_, change) => {
    const { orderId, straighteningId } = await issued();
    await saveZones(owner, straighteningId, change);
    expect(await readOrder(maker.shopId, orderId)).toMatchObject({ superseded: true });
    const [last] = await readHistory(maker.shopId, { noun: "order", nounId: orderId, limit: 1 });
    expect(last).toMatchObject({ verb: "superseded", by: owner.userName, detail: { reason: "areas drawn" } });
    expect(last && historyWords(last).after).toBe(`was superseded: ${owner.userName} changed what is marked on its board`);
  });

  test("stops the bench with the way forward, and issuing again gives the next revision with the new areas", async () => {
    const { orderId, straighteningId, faceId } = await issued();
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const area = knot();
    await saveZones(maker, straighteningId, zones(0, [area]));
    const stepId = orderSteps(snapshot)[0]?.id ?? "";
    await expect(tickStep(maker, { orderId, revisionId, stepId })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("Ask the maker to issue the layout again"),
    });
    expect(await issueOrder(maker, faceId, 1)).toMatchObject({ id: orderId, revision: 2, superseded: false });
    expect((await readOrder(maker.shopId, orderId)).snapshot.boards[0]?.keepClear).toEqual([area]);
    expect((await readOrder(maker.shopId, orderId, 1)).snapshot.boards[0]?.keepClear).toEqual([]);
  });

  test("issuing again is refused when the new knot lies under a front", async () => {
    const { straighteningId, faceId } = await issued();
    await saveZones(maker, straighteningId, zones(0, [knot(600)]));
    await expect(issueOrder(maker, faceId, 1)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringMatching(/reaches [\d.]+ mm into the knot at 600\.0 mm/),
    });
  });

  test.each([
    ["moved", (area: KeepClearArea) => [{ ...area, area: knot(1700).area }]],
    ["called a check", (area: KeepClearArea) => [{ ...area, kind: "check" as const }]],
    ["taken away", () => []],
  ])("supersedes it when an area is %s", async (_, change) => {
    const made = await makeLayout(maker);
    const area = knot();
    await saveZones(maker, made.straighteningId, zones(0, [area]));
    const { id } = await issueOrder(maker, made.faceId, 1);
    await saveZones(maker, made.straighteningId, zones(1, change(area)));
    expect((await readOrder(maker.shopId, id)).superseded).toBe(true);
  });

  test("leaves it when nothing but a note or the order of the areas changed", async () => {
    const made = await makeLayout(maker);
    const [one, two] = [knot(1800), knot(2000)];
    await saveZones(maker, made.straighteningId, zones(0, [one, two], outline));
    const { id } = await issueOrder(maker, made.faceId, 1);
    await saveZones(
      maker,
      made.straighteningId,
      zones(1, [two, { ...one, note: "tight, may stay in a drawer's back" }], outline),
    );
    expect((await readOrder(maker.shopId, id)).superseded).toBe(false);
  });

  test("leaves orders of other boards, of boards that only stand on the table, and of other shops", async () => {
    const one = await issued();
    const other = await issued();
    const stranger = (await makeShop({ name: "Otherwhere" })).maker;
    // The other board stands on the table of the first face, and nothing lies on it.
    const { boardId, straighteningId } = other;
    await database().insert(layoutBoard).values({ layoutId: one.layoutId, shopId: maker.shopId, boardId, straighteningId });
    await expect(saveZones(stranger, straighteningId, zones(0, [knot()]))).rejects.toMatchObject({ code: "not-found" });
    expect((await readOrder(maker.shopId, other.orderId)).superseded).toBe(false);
    await saveZones(maker, straighteningId, zones(0, [knot()]));
    expect((await readOrder(maker.shopId, one.orderId)).superseded).toBe(false);
    expect((await readOrder(maker.shopId, other.orderId)).superseded).toBe(true);
  });

  test("that is refused as a conflict supersedes nothing", async () => {
    const { orderId, straighteningId } = await issued();
    await expect(saveZones(maker, straighteningId, zones(7, [knot()]))).rejects.toMatchObject({ code: "conflict" });
    expect((await readOrder(maker.shopId, orderId)).superseded).toBe(false);
  });
});

describe("areas drawn while an order is issued", () => {
  test("make it a conflict when they are saved during the planning, and no order is left behind", async () => {
    const made = await makeLayout(maker);
    whilePlanning = () => saveZones(owner, made.straighteningId, zones(0, [knot(600)]));
    await expect(issueOrder(maker, made.faceId, 1)).rejects.toMatchObject({
      code: "conflict",
      message: "A board of the layout was changed meanwhile. Look at it and issue it again.",
    });
    const rows = await database()
      .select({ detail: history.detail })
      .from(history)
      .where(and(eq(history.shopId, maker.shopId), eq(history.verb, "issued")));
    expect(rows.filter(({ detail }) => detail.faceId === made.faceId)).toEqual([]);
  });

  test("never leave an order standing that was made from the earlier ones, whoever comes first", async () => {
    const outcomes = new Set<string>();
    for (let round = 0; round < 12; round++) {
      const made = await makeLayout(maker);
      const area = knot();
      // Sometimes the one begins first, sometimes the other; both write at the same time, on connections of their own.
      const saving = async () => {
        await new Promise((done) => setTimeout(done, round * 4));
        return saveZones(owner, made.straighteningId, zones(0, [area]));
      };
      const [issue, save] = await Promise.allSettled([issueOrder(maker, made.faceId, 1), saving()]);
      expect(save.status).toBe("fulfilled");
      if (issue.status === "rejected") {
        expect(issue.reason).toMatchObject({ code: "conflict" });
        outcomes.add("conflict");
        continue;
      }
      const { superseded, snapshot } = await readOrder(maker.shopId, issue.value.id);
      const madeFromNew = snapshot.boards[0]?.keepClear.length === 1;
      expect(superseded).toBe(!madeFromNew);
      outcomes.add(madeFromNew ? "issued from the new areas" : "superseded");
    }
    console.info(`issuing against saving areas, twelve times: ${[...outcomes].sort().join(", ")}`);
  });
});
