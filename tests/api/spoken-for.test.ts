/** Wood of one board is given away once: what layouts tell of each other, and issuing two that overlap, against a real database. */
import { and, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import { boardPicture, cutOrder, job, layout, layoutBoard, straightening } from "@/db/schema";
import { type FaceLayout, umFromMm } from "@/lib/layout";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { ShopAccess } from "@/lib/server/access";
import { database, openPool } from "@/lib/server/database";
import { moveToVersion } from "@/lib/server/layouts/boards-on-table";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";
import { issueOrder } from "@/lib/server/orders/issue";
import { closePlanPool } from "@/lib/server/orders/plan-pool";
import { readOrder } from "@/lib/server/orders/read-orders";
import { tickStep } from "@/lib/server/orders/ticks";
import { bundlePlanWorker } from "../support/bundle-worker";
import { type LayoutWanted, type MadeLayout, makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";

let maker: ShopAccess;
afterAll(closePlanPool);
beforeAll(async () => {
  await bundlePlanWorker();
  maker = (await makeShop()).maker;
});

/** Four fronts of 243.2 mm from 96 mm on, with a kerf of 2.4 mm: to 1077.8 mm. */
const first = { boardMm: { length: 2350, width: 210 } } satisfies Partial<LayoutWanted>;

/** The same row on the board of another face, from `xMm` on. */
async function besides(other: MadeLayout, xMm: number, access: ShopAccess = maker): Promise<MadeLayout> {
  const at = { x: umFromMm(xMm), y: umFromMm(13) };
  return makeLayout(access, { ...first, at, jobTitle: "Pair of bedside cabinets", stock: other });
}

async function boardOnTable(made: MadeLayout) {
  const { boards } = await readLayout(maker, made.faceId);
  if (!boards[0]) throw new Error("there is no board on the table");
  return boards[0];
}

const ordersOf = async ({ jobId }: MadeLayout) =>
  (await database().select({ id: cutOrder.id }).from(cutOrder).where(eq(cutOrder.jobId, jobId))).length;

const offTheWood = (group: FaceLayout["groups"][number]) => ({ ...group, placement: null });

const overlapping = 1000;
const clear = 1300;

describe("the layout of a face", () => {
  test("tells what other faces take of its boards, by piece and whose, and whether it is issued", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, clear);
    const before = await boardOnTable(two);
    expect(before.heldBy).toEqual([
      { faceId: one.faceId, faceTitle: "Top row", jobTitle: "Map chest for the reading room", issued: false, samePicture: true },
    ]);
    expect(before.spokenFor.map(({ label }) => label)).toEqual(["1", "2", "3", "4"]);
    expect(before.spokenFor[1]).toEqual({
      id: `${one.faceId} p2`,
      label: "2",
      rect: { x: 342_200, y: 13_000, width: 243_200, height: 184_000 },
      kerfs: { along: 2_400, across: 2_400 },
      faceId: one.faceId,
      faceTitle: "Top row",
      jobTitle: "Map chest for the reading room",
      issued: false,
    });
    await issueOrder(maker, one.faceId, 1);
    const after = await boardOnTable(two);
    expect(after.heldBy).toMatchObject([{ issued: true }]);
    expect(after.spokenFor.every(({ issued }) => issued)).toBe(true);
  });

  test("a change of an issued layout takes the wood back into the plan", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, clear);
    await issueOrder(maker, one.faceId, 1);
    const document = faceLayoutSchema.parse(one.document);
    await saveLayout(maker, one.faceId, { baseRevision: 1, document, crosscutSawId: null, ripSawId: null });
    expect((await boardOnTable(two)).spokenFor.map(({ issued }) => issued)).toEqual([false, false, false, false]);
  });

  test("that is cut keeps its wood from others, though it was changed afterwards", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, overlapping);
    const { id } = await issueOrder(maker, one.faceId, 1);
    const { revisionId, snapshot } = await readOrder(maker.shopId, id);
    for (const { id: stepId } of orderSteps(snapshot)) await tickStep(maker, { orderId: id, revisionId, stepId });
    const document = faceLayoutSchema.parse({ ...one.document, groups: one.document.groups.map(offTheWood) });
    await saveLayout(maker, one.faceId, { baseRevision: 1, document, crosscutSawId: null, ripSawId: null });
    const { heldBy, spokenFor } = await boardOnTable(two);
    expect(heldBy).toMatchObject([{ faceId: one.faceId, issued: false }]);
    expect(spokenFor.map((wood) => [wood.label, wood.rect.x, wood.issued])).toEqual([
      ["1", 96_000, true],
      ["2", 342_200, true],
      ["3", 588_400, true],
      ["4", 834_600, true],
    ]);
    await expect(issueOrder(maker, two.faceId, 1)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("Front 1 lies 77.8 mm over front 4 of Top row"),
    });
  });

  test("of a closed job counts no more", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, overlapping);
    await issueOrder(maker, one.faceId, 1);
    await database().update(job).set({ state: "closed" }).where(eq(job.id, one.jobId));
    expect(await boardOnTable(two)).toMatchObject({ heldBy: [], spokenFor: [] });
    await expect(issueOrder(maker, two.faceId, 1)).resolves.toMatchObject({ revision: 1 });
  });

  test("on another version of the picture cannot be compared, and is told of all the same", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, overlapping);
    await moveToVersion(maker, one.faceId, one.boardId, await newVersion(one));
    expect(await boardOnTable(two)).toMatchObject({ heldBy: [{ faceId: one.faceId, samePicture: false }], spokenFor: [] });
  });

  test("of another shop is never told of, whatever board its rows name", async () => {
    const stranger = (await makeShop()).maker;
    const one = await makeLayout(maker, first);
    const theirs = await makeLayout(stranger, first);
    await database()
      .insert(layoutBoard)
      .values({ layoutId: theirs.layoutId, shopId: stranger.shopId, boardId: one.boardId, straighteningId: one.straighteningId });
    const document = faceLayoutSchema.parse(one.document);
    await database().update(layout).set({ document }).where(eq(layout.id, theirs.layoutId));
    expect(await boardOnTable(one)).toMatchObject({ heldBy: [], spokenFor: [] });
    await expect(issueOrder(maker, one.faceId, 1)).resolves.toMatchObject({ revision: 1 });
  });

  test("is read with as many queries for five other faces as for one", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, clear);
    const [few] = await queriesOf(() => boardOnTable(two));
    await Promise.all([1, 2, 3, 4].map(() => besides(one, clear)));
    const [many, { heldBy }] = await queriesOf(() => boardOnTable(two));
    expect(heldBy).toHaveLength(5);
    expect(many).toBe(few);
  });
});

describe("issuing", () => {
  test("over wood that is only laid out elsewhere goes through; the other face is then refused by name and amount", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, overlapping);
    await issueOrder(maker, two.faceId, 1);
    await expect(issueOrder(maker, one.faceId, 1)).rejects.toMatchObject({
      code: "refused",
      message:
        "This layout cannot be cut yet. Front 4 lies 77.8 mm over front 1 of Top row, Pair of bedside cabinets, " +
        "which is issued for cutting. Slide the set 80.2 mm left.",
    });
    expect(await ordersOf(one)).toBe(0);
  });

  test("beside it, the saw's kerf away, goes through", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, 1080.2);
    const near = await besides(one, 1080.1);
    await issueOrder(maker, one.faceId, 1);
    await expect(issueOrder(maker, near.faceId, 1)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("Front 1 lies 0.1 mm too close for the saw to front 4 of Top row"),
    });
    await expect(issueOrder(maker, two.faceId, 1)).resolves.toMatchObject({ revision: 1 });
  });

  test("again over one's own wood is no overlap", async () => {
    const one = await makeLayout(maker, first);
    await issueOrder(maker, one.faceId, 1);
    const document = faceLayoutSchema.parse(one.document);
    await saveLayout(maker, one.faceId, { baseRevision: 1, document, crosscutSawId: null, ripSawId: null });
    await expect(issueOrder(maker, one.faceId, 2)).resolves.toMatchObject({ revision: 2 });
  });

  test("two that overlap at the same moment: one is issued, the other refused, every time", async () => {
    for (let round = 0; round < 4; round += 1) {
      const one = await makeLayout(maker, first);
      const two = await besides(one, overlapping);
      const outcomes = await Promise.allSettled([issueOrder(maker, one.faceId, 1), issueOrder(maker, two.faceId, 1)]);
      expect(outcomes.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
      expect(outcomes.find(({ status }) => status === "rejected")).toMatchObject({
        reason: { code: "refused", message: expect.stringContaining("which is issued for cutting") },
      });
      expect((await ordersOf(one)) + (await ordersOf(two))).toBe(1);
    }
  });

  test("many at once, each over its neighbours only: no two that overlap are both issued", async () => {
    const access = (await makeShop()).maker;
    const one = await makeLayout(access, { ...first, boardMm: { length: 6000, width: 210 } });
    const rest = await Promise.all([1, 2, 3, 4].map((step) => besides(one, 96 + step * 900, access)));
    const faces = [one, ...rest];
    const outcomes = await Promise.allSettled(faces.map(({ faceId }) => issueOrder(access, faceId, 1)));
    const issued = outcomes.map(({ status }) => status === "fulfilled");
    expect(issued.some((is, index) => is && issued[index + 1])).toBe(false);
    // And nobody is turned away for nothing: whoever is not issued has a neighbour who is.
    expect(issued.every((is, index) => is || issued[index - 1] || issued[index + 1])).toBe(true);
  });

  test("two that lie apart on one board at the same moment are both issued", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, clear);
    const outcomes = await Promise.allSettled([issueOrder(maker, one.faceId, 1), issueOrder(maker, two.faceId, 1)]);
    expect(outcomes.map(({ status }) => status)).toEqual(["fulfilled", "fulfilled"]);
  });
});

/** The board marked again: a second version of its picture of the same size. */
async function newVersion({ boardId, straighteningId }: MadeLayout): Promise<string> {
  const db = database();
  const [row] = await db
    .select()
    .from(straightening)
    .where(and(eq(straightening.shopId, maker.shopId), eq(straightening.id, straighteningId)));
  if (!row) throw new Error("the first version is gone");
  const id = crypto.randomUUID();
  await db.insert(straightening).values({ ...row, id, version: 2 });
  await db.update(boardPicture).set({ straighteningId: id }).where(eq(boardPicture.boardId, boardId));
  return id;
}

async function queriesOf<T>(run: () => Promise<T>): Promise<readonly [number, T]> {
  const { pool } = openPool();
  const spies = [vi.spyOn(pool, "query"), vi.spyOn(pool, "execute")];
  const answer = await run();
  const count = spies.reduce((sum, { mock }) => sum + mock.calls.length, 0);
  for (const spy of spies) spy.mockRestore();
  return [count, answer];
}
