/** The rest of an order that the bench has begun, issued as its next revision, against a real database. */
import "../support/cookie-jar";
import { eq } from "drizzle-orm";
import { beforeAll, beforeEach, describe, expect, test, vi } from "vitest";
import { POST as postRest } from "@/app/api/orders/[orderId]/rest/route";
import { listHistory } from "@/db/queries/history";
import { layoutBoard, orderRevision } from "@/db/schema";
import { layOut, letLoose, moveGroup, type PieceOnBoard, piecesOnBoard, placeGroup, SET_ID, um, umFromMm } from "@/lib/layout";
import type { AsCutEntry } from "@/lib/schemas/as-cut";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import { orderSnapshotSchema } from "@/lib/schemas/order-snapshot";
import { orderSteps } from "@/lib/schemas/order-steps";
import { issueRest as endpoint, type RescueChoicesByBoard } from "@/lib/schemas/rest";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";
import { enterAsCut } from "@/lib/server/orders/as-cut";
import { issueOrder } from "@/lib/server/orders/issue";
import { issueRest, previewRest } from "@/lib/server/orders/issue-rest";
import { type Planner, planAndVerify, planRestAndVerify, type RestPlanner } from "@/lib/server/orders/plan-cuts";
import { readOrder } from "@/lib/server/orders/read-orders";
import { tickStep, untickStep } from "@/lib/server/orders/ticks";
import { actAs } from "../support/act-as";
import { ask } from "../support/ask";
import { makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";

/** Runs while the rest is planned: nothing is locked then, as in the real thread. */
let whilePlanning: () => Promise<unknown> = async () => undefined;
const planned: RestPlanner = async (task) => {
  await whilePlanning();
  return structuredClone(planRestAndVerify(structuredClone(task)));
};
vi.mock("@/lib/server/orders/plan-pool", () => ({
  planInThread: (async (request) => planAndVerify(request)) satisfies Planner,
  planRestInThread: ((task) => planned(task)) satisfies RestPlanner,
}));

let maker: ShopAccess;
let assistant: ShopAccess;
let owner: ShopAccess;
beforeAll(async () => {
  ({ maker, assistant, owner } = await makeShop());
});
beforeEach(() => {
  whilePlanning = async () => undefined;
});

/** Fronts that leave each other room for a blade of 3.2 mm and no more. */
async function tightLayout(access: ShopAccess = maker, boardMm = { length: 2350, width: 210 }) {
  return makeLayout(access, { kerfMm: 3.2, boardMm });
}

/** An order that is ticked up to the front with this label. */
async function begun(label = "1", made?: Awaited<ReturnType<typeof makeLayout>>) {
  const laid = made ?? (await tightLayout());
  const { id: orderId } = await issueOrder(maker, laid.faceId, 1);
  const order = await readOrder(maker.shopId, orderId);
  const steps = orderSteps(order.snapshot);
  const at = steps.findIndex((step) => step.kind === "cut" && step.cut.yields.some((part) => part.label === label));
  for (const { id: stepId } of steps.slice(0, at + 1)) {
    await tickStep(assistant, { orderId, revisionId: order.revisionId, stepId });
  }
  return { ...laid, orderId, revisionId: order.revisionId, snapshot: order.snapshot, step: steps[at]?.id ?? "", done: at + 1 };
}
type Begun = Awaited<ReturnType<typeof begun>>;

const enter = ({ orderId, revisionId }: Begun, entry: AsCutEntry, by: ShopAccess = assistant) =>
  enterAsCut(by, { orderId, revisionId }, { entry, seenVersion: null });
const kerf = ({ step }: Begun, mm = 3.6): AsCutEntry => ({ kind: "kerf", stepId: step, kerf: umFromMm(mm), reach: "all" });
const spoiled = ({ boardId }: Begun, pieceId: string): AsCutEntry => ({ kind: "spoiled", boardId, pieceId, usable: null });

async function issueAs(access: ShopAccess, orderId: string, choices: RescueChoicesByBoard = {}) {
  const { basis } = await previewRest(access, orderId, choices);
  return issueRest(access, orderId, { basis, choices });
}

const rectsOf = (pieces: readonly Pick<PieceOnBoard, "pieceId" | "rect">[]) =>
  Object.fromEntries(pieces.map(({ pieceId, rect }) => [pieceId, { ...rect }]));

async function save(faceId: string, change: (document: Awaited<ReturnType<typeof readLayout>>["document"]) => unknown) {
  const { revision, document } = await readLayout(maker, faceId);
  await saveLayout(maker, faceId, {
    baseRevision: revision,
    document: faceLayoutSchema.parse(change(document)),
    crosscutSawId: null,
    ripSawId: null,
  });
}

describe("the rest of an order", () => {
  test("is planned around what is cut, and issued as the next revision with what is done done", async () => {
    const at = await begun("2");
    await enter(at, kerf(at));
    await enter(at, spoiled(at, "p2"));
    const preview = await previewRest(maker, at.orderId, {});
    const [board] = preview.boards;
    expect(board).toMatchObject({ cut: ["1"], changed: true, implied: 0 });
    expect(board?.troubles.map(({ chosen, facts }) => [chosen, facts[0]?.kind])).toEqual([
      ["slide", "short"],
      ["elsewhere", "spoiled"],
    ]);

    const issued = await issueRest(maker, at.orderId, { basis: preview.basis, choices: {} });
    expect(issued).toMatchObject({ id: at.orderId, revision: 2, superseded: false, state: "issued" });
    const order = await readOrder(maker.shopId, at.orderId);
    const steps = orderSteps(order.snapshot);
    const before = orderSteps(at.snapshot);
    // What was done is done, under the ids it had and by who did it.
    expect(steps.slice(0, at.done).map(({ id }) => id)).toEqual(before.slice(0, at.done).map(({ id }) => id));
    expect(order.ticks.map(({ stepId, by }) => [stepId, by])).toEqual(
      expect.arrayContaining(before.slice(0, at.done).map(({ id }) => [id, assistant.userName])),
    );
    expect(order.ticks).toHaveLength(at.done);
    expect(order.steps).toBe(steps.length);
    const program = order.snapshot.boards[0]?.program;
    expect(program?.kerf.crosscut).toBe(3600);
    expect(program?.pieces.map(({ label }) => label).sort()).toEqual(["1", "2", "3", "4"]);
    expect(order.snapshot.crosscutSaw.kerf).toBe(3600);
    expect(order.snapshot.rest).toMatchObject({
      revision: 1,
      entries: [{ entry: { kind: "kerf" } }, { entry: { kind: "spoiled" } }],
    });
    expect(order.asCut).toEqual([]);

    const old = await readOrder(maker.shopId, at.orderId, 1);
    expect(old).toMatchObject({ superseded: true, asCut: [{ version: 1 }, { version: 1 }] });
    // And the bench goes on.
    const next = steps[at.done]?.id ?? "";
    await tickStep(assistant, { orderId: at.orderId, revisionId: order.revisionId, stepId: next });
    expect((await readOrder(maker.shopId, at.orderId)).ticked).toBe(at.done + 1);
  });

  test("takes the layout with it: every front lies in the document where the revision cuts it", async () => {
    const at = await begun("2");
    await enter(at, kerf(at));
    await enter(at, spoiled(at, "p2"));
    await issueAs(maker, at.orderId);
    const { snapshot } = await readOrder(maker.shopId, at.orderId);
    const layout = await readLayout(maker, at.faceId);
    expect(layout).toMatchObject({ revision: 2, updatedBy: maker.userName, order: { revision: 2, superseded: false } });
    expect(rectsOf(piecesOnBoard(layout.document, at.boardId))).toEqual(rectsOf(snapshot.boards[0]?.pieces ?? []));
    expect(snapshot.faces[0]).toMatchObject({ layoutRevision: 2, layout: layout.document });
    // Issuing the layout as it is now answers with this revision.
    expect(await issueOrder(maker, at.faceId, 2)).toMatchObject({ id: at.orderId, revision: 2 });
    const story = await listHistory(database(), maker.shopId, { noun: "order", nounId: at.orderId, limit: 50 });
    expect(
      story
        .map(({ verb }) => verb)
        .slice(0, 2)
        .sort(),
    ).toEqual(["rest issued", "superseded"]);
  });

  test("is the steps that were left, and the layout as it was, where nothing was found to differ", async () => {
    const at = await begun("2");
    expect((await previewRest(maker, at.orderId, {})).boards[0]).toMatchObject({ changed: false, troubles: [] });
    await issueAs(maker, at.orderId);
    const { snapshot } = await readOrder(maker.shopId, at.orderId);
    expect(snapshot.boards[0]?.program).toEqual(at.snapshot.boards[0]?.program);
    expect((await readLayout(maker, at.faceId)).revision).toBe(1);
    expect(orderSteps(snapshot).map(({ id }) => id)).toEqual(orderSteps(at.snapshot).map(({ id }) => id));
  });

  test("holds what was done: none of it is unticked, and the revision after it goes on from there", async () => {
    const at = await begun("1");
    await enter(at, kerf(at));
    await issueAs(maker, at.orderId);
    const second = await readOrder(maker.shopId, at.orderId);
    const address = { orderId: at.orderId, revisionId: second.revisionId };
    await expect(untickStep(maker, { ...address, stepId: at.step })).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("done before the revision was issued"),
    });
    const steps = orderSteps(second.snapshot);
    const two = steps.findIndex((step) => step.kind === "cut" && step.cut.yields.some(({ label }) => label === "2"));
    for (const { id: stepId } of steps.slice(at.done, two + 1)) await tickStep(assistant, { ...address, stepId });
    await enterAsCut(assistant, address, { entry: spoiled(at, "p2"), seenVersion: null });
    await issueAs(owner, at.orderId);
    const third = await readOrder(maker.shopId, at.orderId);
    expect(third).toMatchObject({ revision: 3, ticked: two + 1, snapshot: { rest: { revision: 2 } } });
    expect(third.snapshot.rest?.entries).toHaveLength(2);
    expect(third.snapshot.boards[0]?.asCut?.done.length).toBe(two + 1 - steps.findIndex(({ kind }) => kind === "cut"));
    const cut = (order: typeof third) => order.snapshot.boards[0]?.program.pieces.find(({ label }) => label === "1");
    expect(cut(third)).toEqual(cut(second));
  });

  test("counts the steps before a ticked one as done, and ticks them in the name of who issues", async () => {
    const made = await tightLayout();
    const { id: orderId } = await issueOrder(maker, made.faceId, 1);
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const step = orderSteps(snapshot).find((one) => one.kind === "cut" && one.cut.yields.some(({ label }) => label === "1"));
    await tickStep(assistant, { orderId, revisionId, stepId: step?.id ?? "" });
    expect((await previewRest(maker, orderId, {})).boards[0]?.implied).toBeGreaterThan(0);
    await issueAs(maker, orderId);
    const { ticks, snapshot: after } = await readOrder(maker.shopId, orderId);
    const tag = after.boards[0]?.tag;
    expect(ticks.find(({ stepId }) => stepId === `${tag}:fetch`)?.by).toBe(maker.userName);
    expect(ticks.find(({ stepId }) => stepId === step?.id)?.by).toBe(assistant.userName);
  });

  test("leaves a front out that needs another board, and takes it up again once it is laid on one", async () => {
    const full = { length: 4 * 243.2 + 3 * 3.2, width: 184 };
    const made = await makeLayout(maker, { kerfMm: 3.2, boardMm: full, at: { x: um(0), y: um(0) } });
    const at = await begun("2", made);
    await enter(at, spoiled(at, "p2"));
    const preview = await previewRest(maker, at.orderId, {});
    expect(preview).toMatchObject({ unplaced: [{ label: "2" }], boards: [{ troubles: [{ chosen: "other-board" }] }] });
    await issueAs(maker, at.orderId);
    const second = await readLayout(maker, at.faceId);
    expect(layOut(second.document).map(({ label }) => label)).toEqual(["1", "3", "4"]);

    const other = await tightLayout();
    const { boardId, straighteningId } = other;
    await database().insert(layoutBoard).values({ layoutId: at.layoutId, shopId: maker.shopId, boardId, straighteningId });
    const loose = second.document.groups.find(({ pieceIds }) => pieceIds.join() === "p2")?.id ?? "";
    await save(at.faceId, (document) => {
      const placed = placeGroup(document, loose, boardId, { x: umFromMm(50), y: umFromMm(10) }, 0);
      return placed.ok && placed.layout;
    });
    expect((await previewRest(maker, at.orderId, {})).layoutChanged).toBe(true);
    await issueAs(maker, at.orderId);
    const third = await readOrder(maker.shopId, at.orderId);
    expect(third.snapshot.boards.map(({ pieces }) => pieces.map(({ label }) => label))).toEqual([["1", "3", "4"], ["2"]]);
    expect(third.snapshot.boards[1]?.asCut).toBeUndefined();
  });

  test("follows the layout as it was changed since, but for what is cut", async () => {
    const at = await begun("1");
    await save(at.faceId, (document) => {
      const loose = letLoose(document, "p4");
      const group = loose.ok ? loose.layout.groups.find(({ pieceIds }) => pieceIds.join() === "p4")?.id : "";
      const moved = loose.ok && moveGroup(loose.layout, group ?? "", { x: umFromMm(200), y: um(0) });
      return moved ? moved.ok && moved.layout : moved;
    });
    await expect(issueOrder(maker, at.faceId, 2)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("Issue the rest on the page of that order"),
    });
    await issueAs(maker, at.orderId);
    const { snapshot, superseded } = await readOrder(maker.shopId, at.orderId);
    expect(superseded).toBe(false);
    const four = (pieces: readonly { pieceId: string; rect: { x: number } }[] | undefined) =>
      pieces?.find(({ pieceId }) => pieceId === "p4")?.rect.x;
    expect(four(snapshot.boards[0]?.pieces)).toBe((four(at.snapshot.boards[0]?.pieces) ?? 0) + 200_000);

    await save(at.faceId, (document) => {
      const moved = moveGroup(document, SET_ID, { x: umFromMm(5), y: um(0) });
      return moved.ok && moved.layout;
    });
    await expect(previewRest(maker, at.orderId, {})).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("Front 1 is cut already, but was changed on the layout table since."),
    });
  });

  test("can be planned of orders issued before edges were kept", async () => {
    const at = await begun("1");
    const { edges: _, ...board } = at.snapshot.boards[0] ?? { edges: null };
    const old = orderSnapshotSchema.parse({ ...at.snapshot, boards: [board] });
    await database().update(orderRevision).set({ snapshot: old }).where(eq(orderRevision.id, at.revisionId));
    await enter(at, kerf(at));
    await issueAs(maker, at.orderId);
    expect((await readOrder(maker.shopId, at.orderId)).snapshot.boards[0]?.edges).toEqual(at.snapshot.boards[0]?.edges);
  });
});

describe("is refused", () => {
  test("while nothing is cut and nothing was entered: the layout is issued again then", async () => {
    const made = await tightLayout();
    const { id } = await issueOrder(maker, made.faceId, 1);
    await expect(previewRest(maker, id, {})).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("Nothing of revision A is cut yet"),
    });
  });

  test("to an assistant, and to another shop", async () => {
    const at = await begun("1");
    const { basis } = await previewRest(maker, at.orderId, {});
    await actAs(assistant);
    const answer = await ask(postRest, endpoint, { params: { orderId: at.orderId }, body: { basis, choices: {} } });
    expect(answer).toMatchObject({ status: 403, body: { code: "not-allowed" } });
    const stranger = (await makeShop()).maker;
    await expect(issueRest(stranger, at.orderId, { basis, choices: {} })).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("at the same time", () => {
  const meanwhile = { code: "conflict", message: expect.stringContaining("ticked, entered or moved meanwhile") };

  test("what is entered or ticked after the preview has it looked at again", async () => {
    const at = await begun("1");
    const { basis } = await previewRest(maker, at.orderId, {});
    await enter(at, kerf(at));
    await expect(issueRest(maker, at.orderId, { basis, choices: {} })).rejects.toMatchObject(meanwhile);
    expect((await readOrder(maker.shopId, at.orderId)).revisions).toHaveLength(1);
  });

  test.each(["entry", "tick", "layout"] as const)(
    "a new %s while the rest is planned stops it, and nothing is kept of it",
    async (what) => {
      const at = await begun("1");
      const { basis } = await previewRest(maker, at.orderId, {});
      const next = orderSteps(at.snapshot)[at.done]?.id ?? "";
      whilePlanning = async () => {
        whilePlanning = async () => undefined;
        if (what === "entry") await enter(at, kerf(at));
        else if (what === "tick") await tickStep(assistant, { orderId: at.orderId, revisionId: at.revisionId, stepId: next });
        else await save(at.faceId, (document) => document);
      };
      await expect(issueRest(maker, at.orderId, { basis, choices: {} })).rejects.toMatchObject({ code: "conflict" });
      expect((await readOrder(maker.shopId, at.orderId)).revisions).toHaveLength(1);
    },
  );

  test("two who issue the same rest: one revision, and both are answered with it, every time", async () => {
    for (let round = 0; round < 4; round++) {
      const at = await begun("1");
      await enter(at, kerf(at));
      const { basis } = await previewRest(maker, at.orderId, {});
      const outcomes = await Promise.all([maker, owner].map((who) => issueRest(who, at.orderId, { basis, choices: {} })));
      expect(outcomes.map(({ revision }) => revision)).toEqual([2, 2]);
      expect((await readOrder(maker.shopId, at.orderId)).revisions).toHaveLength(2);
    }
  });

  test("two who choose differently: one is issued, the other is told to look again, every time", async () => {
    for (let round = 0; round < 4; round++) {
      const at = await begun("2");
      await enter(at, spoiled(at, "p2"));
      const choices = { [at.boardId]: { "piece p2": "other-board" as const } };
      const bases = [await previewRest(maker, at.orderId, {}), await previewRest(owner, at.orderId, choices)];
      const outcomes = await Promise.allSettled([
        issueRest(maker, at.orderId, { basis: bases[0]?.basis ?? "", choices: {} }),
        issueRest(owner, at.orderId, { basis: bases[1]?.basis ?? "", choices }),
      ]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
      expect(outcomes.find(({ status }) => status === "rejected")).toMatchObject({ reason: { code: "conflict" } });
      expect((await readOrder(maker.shopId, at.orderId)).revisions).toHaveLength(2);
    }
  });

  test("an entry that comes while the rest is issued is either in it or refused, never lost", async () => {
    for (let round = 0; round < 5; round++) {
      const at = await begun("1");
      const { basis } = await previewRest(maker, at.orderId, {});
      const [issued, entered] = await Promise.allSettled([
        issueRest(maker, at.orderId, { basis, choices: {} }),
        enter(at, kerf(at)),
      ]);
      const order = await readOrder(maker.shopId, at.orderId);
      if (issued.status === "fulfilled") {
        expect(entered).toMatchObject({
          status: "rejected",
          reason: { code: "conflict", message: expect.stringContaining("superseded") },
        });
        expect(order).toMatchObject({ revision: 2, asCut: [] });
      } else {
        expect(issued.reason).toMatchObject(meanwhile);
        expect(order).toMatchObject({ revision: 1, asCut: [{ version: 1 }] });
      }
    }
  });
});
