/** What the bench enters while it cuts, against a real database: by several people at once, corrected, taken back, refused. */
import "../support/cookie-jar";
import { beforeAll, describe, expect, test } from "vitest";
import { PUT } from "@/app/api/orders/[orderId]/revisions/[revisionId]/as-cut/route";
import { listHistory } from "@/db/queries/history";
import { umFromMm } from "@/lib/layout";
import { type AsCutEntry, enterAsCut as endpoint } from "@/lib/schemas/as-cut";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";
import { enterAsCut, removeAsCut } from "@/lib/server/orders/as-cut";
import { issueOrder } from "@/lib/server/orders/issue";
import { orderProgress, readOrder } from "@/lib/server/orders/read-orders";
import { tickStep } from "@/lib/server/orders/ticks";
import { actAs } from "../support/act-as";
import { ask } from "../support/ask";
import { makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";

let maker: ShopAccess;
let assistant: ShopAccess;
let owner: ShopAccess;
beforeAll(async () => {
  ({ maker, assistant, owner } = await makeShop());
});

/** An order with four fronts, the steps up to its first front ticked. */
async function begun() {
  const made = await makeLayout(maker);
  const { id: orderId } = await issueOrder(maker, made.faceId, 1);
  const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
  const steps = orderSteps(snapshot);
  const first = steps.findIndex((step) => step.kind === "cut" && step.cut.yields.some(({ label }) => label === "1"));
  for (const { id: stepId } of steps.slice(0, first + 1)) await tickStep(assistant, { orderId, revisionId, stepId });
  return { ...made, orderId, revisionId, snapshot, step: steps[first]?.id ?? "" };
}

const kerf = (stepId: string, mm: number): AsCutEntry => ({ kind: "kerf", stepId, kerf: umFromMm(mm), reach: "on" });
const spoiled = (boardId: string, pieceId: string): AsCutEntry => ({ kind: "spoiled", boardId, pieceId, usable: null });

const verbsOf = async (orderId: string) => {
  const { items } = { items: await listHistory(database(), maker.shopId, { noun: "order", nounId: orderId, limit: 50 }) };
  return items.filter(({ verb }) => verb.startsWith("as-cut")).map(({ verb, by }) => `${verb} by ${by}`);
};

describe("an entry", () => {
  test("of an assistant is on disk with who and when, and everybody who looks at the order sees it", async () => {
    const { orderId, revisionId, step } = await begun();
    await actAs(assistant);
    const answer = await ask(PUT, endpoint, {
      params: { orderId, revisionId },
      body: { entry: kerf(step, 2.8), seenVersion: null },
    });
    expect(answer.status).toBe(200);
    const [entry] = (await readOrder(maker.shopId, orderId)).asCut;
    expect(entry).toMatchObject({ entry: { kind: "kerf", kerf: 2800 }, version: 1, by: assistant.userName });
    expect((await orderProgress(maker.shopId, orderId, revisionId)).asCut).toEqual([entry]);
    expect(await verbsOf(orderId)).toEqual([`as-cut entered by ${assistant.userName}`]);
  });

  test("is corrected from the version that was seen, by anybody of the shop, and the history tells of both", async () => {
    const { orderId, revisionId, step } = await begun();
    await enterAsCut(assistant, { orderId, revisionId }, { entry: kerf(step, 2.8), seenVersion: null });
    const corrected = await enterAsCut(owner, { orderId, revisionId }, { entry: kerf(step, 2.6), seenVersion: 1 });
    expect(corrected.asCut).toMatchObject([{ entry: { kerf: 2600 }, version: 2, by: owner.userName }]);
    const number = numberOf(await readOrder(maker.shopId, orderId), step);
    await expect(enterAsCut(assistant, { orderId, revisionId }, { entry: kerf(step, 3), seenVersion: 1 })).rejects.toMatchObject({
      code: "conflict",
      message: `${owner.userName} entered meanwhile: Kerf 2.6 mm instead of 2.4 mm, from step ${number} on. Look at it before you correct it.`,
    });
    expect(await verbsOf(orderId)).toEqual([`as-cut corrected by ${owner.userName}`, `as-cut entered by ${assistant.userName}`]);
  });

  test("is taken back", async () => {
    const { orderId, revisionId, boardId } = await begun();
    const { asCut } = await enterAsCut(assistant, { orderId, revisionId }, { entry: spoiled(boardId, "p1"), seenVersion: null });
    const asCutId = asCut[0]?.id ?? "";
    await expect(removeAsCut(maker, { orderId, revisionId, asCutId }, 2)).rejects.toMatchObject({ code: "conflict" });
    expect(await removeAsCut(maker, { orderId, revisionId, asCutId }, 1)).toEqual({ asCut: [] });
    await expect(removeAsCut(assistant, { orderId, revisionId, asCutId }, 1)).rejects.toMatchObject({ code: "not-found" });
    expect(await verbsOf(orderId)).toEqual([`as-cut taken back by ${maker.userName}`, `as-cut entered by ${assistant.userName}`]);
  });
});

const numberOf = ({ snapshot }: Awaited<ReturnType<typeof readOrder>>, stepId: string) =>
  orderSteps(snapshot).find(({ id }) => id === stepId)?.number;

describe("at the same time", () => {
  test("two who enter the same thing: one entry, and the other is told of it, every time", async () => {
    for (let round = 0; round < 6; round++) {
      const { orderId, revisionId, step } = await begun();
      const outcomes = await Promise.allSettled([
        enterAsCut(assistant, { orderId, revisionId }, { entry: kerf(step, 2.8), seenVersion: null }),
        enterAsCut(owner, { orderId, revisionId }, { entry: kerf(step, 3), seenVersion: null }),
      ]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
      expect(outcomes.find(({ status }) => status === "rejected")).toMatchObject({
        reason: {
          code: "conflict",
          message: expect.stringContaining("entered meanwhile: Kerf"),
          detail: { asCut: [{ version: 1 }] },
        },
      });
      expect((await readOrder(maker.shopId, orderId)).asCut).toHaveLength(1);
    }
  });

  test("two who correct one entry from the same version: one correction, every time", async () => {
    for (let round = 0; round < 4; round++) {
      const { orderId, revisionId, step } = await begun();
      await enterAsCut(assistant, { orderId, revisionId }, { entry: kerf(step, 2.8), seenVersion: null });
      const outcomes = await Promise.allSettled([
        enterAsCut(assistant, { orderId, revisionId }, { entry: kerf(step, 2.7), seenVersion: 1 }),
        enterAsCut(owner, { orderId, revisionId }, { entry: kerf(step, 2.9), seenVersion: 1 }),
      ]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
      expect((await readOrder(maker.shopId, orderId)).asCut).toMatchObject([{ version: 2 }]);
    }
  });

  test("many who enter different things: all of them are kept", async () => {
    const { orderId, revisionId, boardId, step } = await begun();
    const entries = [kerf(step, 2.8), spoiled(boardId, "p1"), spoiled(boardId, "p2"), spoiled(boardId, "p3")];
    const people = [assistant, owner, maker, assistant];
    await Promise.all(
      entries.map((entry, i) => enterAsCut(people[i] ?? maker, { orderId, revisionId }, { entry, seenVersion: null })),
    );
    expect((await readOrder(maker.shopId, orderId)).asCut).toHaveLength(4);
  });

  test("an entry and a tick follow one another", async () => {
    for (let round = 0; round < 4; round++) {
      const { orderId, revisionId, snapshot, step } = await begun();
      const next = orderSteps(snapshot).findIndex(({ id }) => id === step) + 1;
      const stepId = orderSteps(snapshot)[next]?.id ?? "";
      await Promise.all([
        enterAsCut(assistant, { orderId, revisionId }, { entry: kerf(step, 2.8), seenVersion: null }),
        tickStep(owner, { orderId, revisionId, stepId }),
      ]);
      const order = await readOrder(maker.shopId, orderId);
      expect([order.asCut.length, order.ticks.some((tick) => tick.stepId === stepId)]).toEqual([1, true]);
    }
  });
});

describe("is refused", () => {
  test("on a revision that is superseded", async () => {
    const { orderId, revisionId, step, faceId } = await begun();
    const { revision, document } = await readLayout(maker, faceId);
    await saveLayout(maker, faceId, {
      baseRevision: revision,
      document: faceLayoutSchema.parse(document),
      crosscutSawId: null,
      ripSawId: null,
    });
    await expect(
      enterAsCut(assistant, { orderId, revisionId }, { entry: kerf(step, 2.8), seenVersion: null }),
    ).rejects.toMatchObject({ code: "conflict", message: expect.stringContaining("Revision A is superseded") });
  });

  test("when it is about nothing in the order, or cannot be true of it", async () => {
    const { orderId, revisionId, boardId, snapshot, step } = await begun();
    const enter = (entry: AsCutEntry) => enterAsCut(assistant, { orderId, revisionId }, { entry, seenVersion: null });
    const cut = orderSteps(snapshot).find(({ id }) => id === step);
    const part = cut?.kind === "cut" ? cut.cut.yields.find(({ label }) => label === "1") : undefined;
    const size = (edge: "top" | "right", mm: number): AsCutEntry => ({
      kind: "size",
      boardId,
      partId: part?.id ?? "",
      edge,
      by: umFromMm(mm),
    });
    const refused = (words: string) => ({ code: "refused", message: expect.stringContaining(words) });
    await expect(enter(kerf("B-999:1", 2.8))).rejects.toMatchObject(refused("nothing that this entry could be about"));
    await expect(enter(spoiled(boardId, "p9"))).rejects.toMatchObject(refused("no such front"));
    await expect(enter({ kind: "size", boardId, partId: "99.1", edge: "left", by: umFromMm(-1) })).rejects.toMatchObject(
      refused("no such part"),
    );
    await expect(enter(size("top", 1))).rejects.toMatchObject(refused("made by an earlier cut"));
    await expect(enter(size("right", 9000))).rejects.toMatchObject(refused("more wood than there is"));
    expect((await readOrder(maker.shopId, orderId)).asCut).toEqual([]);
  });

  test("of another shop: there is no such order", async () => {
    const { orderId, revisionId, step } = await begun();
    const stranger = (await makeShop()).maker;
    await expect(
      enterAsCut(stranger, { orderId, revisionId }, { entry: kerf(step, 2.8), seenVersion: null }),
    ).rejects.toMatchObject({ code: "not-found" });
  });
});
