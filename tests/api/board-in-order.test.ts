/** A board's picture belongs to one cut order at a time, and to nobody once the board was cut into: against a real database. */
import { eq } from "drizzle-orm";
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from "vitest";
import { cutOrder, job, layout, layoutBoard, orderRevisionBoard } from "@/db/schema";
import { umFromMm } from "@/lib/layout";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { ShopAccess } from "@/lib/server/access";
import { database, openPool } from "@/lib/server/database";
import { moveToVersion } from "@/lib/server/layouts/boards-on-table";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";
import { issueOrder } from "@/lib/server/orders/issue";
import { type Planner, planAndVerify } from "@/lib/server/orders/plan-cuts";
import { readOrder } from "@/lib/server/orders/read-orders";
import { tickStep, untickStep } from "@/lib/server/orders/ticks";
import { type MadeLayout, makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";
import { newPicture } from "../support/new-picture";

/** Runs while an order's cuts are planned: nothing is locked then, as in the real thread. */
let whilePlanning: () => Promise<unknown> = async () => undefined;
const planned: Planner = async (request) => {
  await whilePlanning();
  return planAndVerify(request);
};
vi.mock("@/lib/server/orders/plan-pool", () => ({ planInThread: ((request) => planned(request)) satisfies Planner }));

let maker: ShopAccess;
beforeAll(async () => {
  maker = (await makeShop()).maker;
});
beforeEach(() => {
  whilePlanning = async () => undefined;
});
afterAll(() => vi.restoreAllMocks());

/** Two faces on one board, their fronts 222 mm apart: no front lies on wood of the other. */
async function twoFaces(access: ShopAccess = maker) {
  const one = await makeLayout(access);
  return { one, two: await besides(one, access) };
}

const besides = (one: MadeLayout, access: ShopAccess = maker) =>
  makeLayout(access, {
    at: { x: umFromMm(1300), y: umFromMm(13) },
    jobTitle: "Pair of bedside cabinets",
    stock: one,
  });

async function boardOf({ faceId, boardId }: MadeLayout, access: ShopAccess = maker) {
  const board = (await readLayout(access, faceId)).boards.find((one) => one.boardId === boardId);
  if (!board) throw new Error("the board is not on the table");
  return board;
}

const issue = async ({ faceId }: MadeLayout, access: ShopAccess = maker) =>
  issueOrder(access, faceId, (await readLayout(access, faceId)).revision);

type Kind = ReturnType<typeof orderSteps>[number]["kind"];

/** Ticks every step of these kinds, or the first of them only. */
async function tick(orderId: string, kinds: readonly Kind[], which: "all" | "first" = "all"): Promise<readonly string[]> {
  const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
  const steps = orderSteps(snapshot).filter(({ kind }) => kinds.includes(kind));
  const ids = steps.slice(0, which === "first" ? 1 : undefined).map(({ id }) => id);
  for (const stepId of ids) await tickStep(maker, { orderId, revisionId, stepId });
  return ids;
}

const beforeCuts: readonly Kind[] = ["fetch", "mark", "test-cut"];
const everything: readonly Kind[] = [...beforeCuts, "cut", "clean-up", "rack"];

/** Saved as it lies: its order is superseded. */
async function save({ faceId }: MadeLayout): Promise<void> {
  const { revision, document } = await readLayout(maker, faceId);
  await saveLayout(maker, faceId, {
    baseRevision: revision,
    document: faceLayoutSchema.parse(document),
    crosscutSawId: null,
    ripSawId: null,
  });
}

const moveOver = ({ faceId, boardId }: MadeLayout, straighteningId: string) =>
  moveToVersion(maker, faceId, boardId, straighteningId);

const ordersOf = async ({ jobId }: MadeLayout) =>
  (await database().select({ id: cutOrder.id }).from(cutOrder).where(eq(cutOrder.jobId, jobId))).length;

/** A refusal with exactly these words after the usual first sentence. */
const refusal = (words: string) => ({ code: "refused", message: `This layout cannot be cut yet. ${words}` });

const cutInto = (tag: string, order: string) =>
  `${tag} was already cut into by cut order ${order}. ` +
  "Photograph what is left and mark it anew, then move this layout over to the new picture.";

describe("a board that is in an order of another face", () => {
  test("is refused while that order holds, however far apart the fronts lie; the layout tells before", async () => {
    const { one, two } = await twoFaces();
    expect((await boardOf(two)).takenBy).toBeNull();
    const { number } = await issue(one);
    const { tag, takenBy } = await boardOf(two);
    expect(takenBy).toEqual({
      orderNumber: number,
      revision: 1,
      faceTitle: "Top row",
      by: "another-face",
      cutInto: false,
      unfinished: true,
    });
    await expect(issue(two)).rejects.toMatchObject(
      refusal(
        `${tag} is issued for cutting with cut order ${number}, Top row. ` +
          "Cut that order first, then photograph what is left of the board and mark it anew.",
      ),
    );
    expect(await ordersOf(two)).toBe(0);
  });

  test("is refused while it is being cut", async () => {
    const { one, two } = await twoFaces();
    const { id, number } = await issue(one);
    await tick(id, ["cut"], "first");
    const { tag } = await boardOf(two);
    await expect(issue(two)).rejects.toMatchObject(
      refusal(
        `${tag} is being cut with cut order ${number}, Top row. ` +
          "Finish that order first, then photograph what is left of the board and mark it anew.",
      ),
    );
  });

  test("is refused once it is cut, also when that layout was changed afterwards", async () => {
    const { one, two } = await twoFaces();
    const { id, number } = await issue(one);
    await tick(id, everything);
    const { tag, takenBy } = await boardOf(two);
    expect(takenBy).toMatchObject({ cutInto: true, unfinished: false });
    await expect(issue(two)).rejects.toMatchObject(refusal(cutInto(tag, `${number} A`)));
    await save(one);
    await expect(issue(two)).rejects.toMatchObject(refusal(cutInto(tag, `${number} A`)));
  });

  test("is refused when that order was begun and superseded, and names the revision that was begun", async () => {
    const { one, two } = await twoFaces();
    const { id, number } = await issue(one);
    await save(one);
    await issue(one);
    await tick(id, ["cut"], "first");
    await save(one);
    const { tag } = await boardOf(two);
    await expect(issue(two)).rejects.toMatchObject(refusal(cutInto(tag, `${number} B`)));
  });

  test.each(["cut", "clean-up", "rack"] as const)("counts as cut into by a tick on a step of kind %s", async (kind) => {
    const one = await makeLayout(maker, { cleanUpMm: 0.2 });
    const two = await besides(one);
    const { id } = await issue(one);
    expect(await tick(id, [kind], "first")).toHaveLength(1);
    await save(one);
    expect((await boardOf(two)).takenBy).toMatchObject({ cutInto: true });
  });

  test("is free again when that order is superseded before any wood was taken", async () => {
    const { one, two } = await twoFaces();
    const { id } = await issue(one);
    expect(await tick(id, beforeCuts)).not.toHaveLength(0);
    await save(one);
    expect((await boardOf(two)).takenBy).toBeNull();
    await expect(issue(two)).resolves.toMatchObject({ revision: 1 });
    // And now the first face has to wait.
    await expect(issue(one)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("is issued for cutting"),
    });
  });

  test("stays with that order when its job is closed: the bench may still cut by it", async () => {
    const { one, two } = await twoFaces();
    await issue(one);
    await database().update(job).set({ state: "closed" }).where(eq(job.id, one.jobId));
    await expect(issue(two)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("is issued for cutting"),
    });
  });

  test("does not matter while it only stands on the table", async () => {
    const one = await makeLayout(maker);
    const two = await makeLayout(maker);
    await issue(one);
    const { boardId, straighteningId } = one;
    await database().insert(layoutBoard).values({ layoutId: two.layoutId, shopId: maker.shopId, boardId, straighteningId });
    expect((await boardOf({ ...two, boardId })).takenBy).not.toBeNull();
    await expect(issue(two)).resolves.toMatchObject({ revision: 1 });
  });
});

describe("a new picture", () => {
  test("of a new photograph frees the board", async () => {
    const { one, two } = await twoFaces();
    const { id } = await issue(one);
    await tick(id, everything);
    await moveOver(two, await newPicture(maker, one.boardId, "new photo"));
    expect((await boardOf(two)).takenBy).toBeNull();
    await expect(issue(two)).resolves.toMatchObject({ revision: 1 });
  });

  test("marked again on the photograph from before the cutting does not", async () => {
    const { one, two } = await twoFaces();
    const { id, number } = await issue(one);
    await tick(id, everything);
    await moveOver(two, await newPicture(maker, one.boardId, "same photo"));
    const { tag } = await boardOf(two);
    await expect(issue(two)).rejects.toMatchObject(refusal(cutInto(tag, `${number} A`)));
  });

  test("that an order was issued from takes the older ones with it", async () => {
    const { one, two } = await twoFaces();
    await moveOver(one, await newPicture(maker, one.boardId, "new photo"));
    const { id, number } = await issue(one);
    await tick(id, everything);
    const { tag } = await boardOf(two);
    await expect(issue(two)).rejects.toMatchObject(refusal(cutInto(tag, `${number} A`)));
  });
});

describe("a face's own order", () => {
  test("gets its next revision while nothing is cut, whatever was ticked before the first cut", async () => {
    const one = await makeLayout(maker);
    const { id, number } = await issue(one);
    await tick(id, beforeCuts);
    await save(one);
    expect((await boardOf(one)).takenBy).toBeNull();
    expect(await issue(one)).toMatchObject({ id, number, revision: 2 });
  });

  test("gets none once it has cut, and says what can be done instead", async () => {
    const one = await makeLayout(maker);
    const { id, number } = await issue(one);
    await tick(id, ["cut"], "first");
    await save(one);
    const { tag, takenBy } = await boardOf(one);
    expect(takenBy).toMatchObject({ by: "this-order", cutInto: true, revision: 1 });
    await expect(issue(one)).rejects.toMatchObject(
      refusal(
        `${tag} was already cut into by cut order ${number} A of this face. ` +
          "Issue the rest on the page of that order: it is planned around what is cut, with the fronts that are not cut yet where they lie here.",
      ),
    );
    expect((await readOrder(maker.shopId, id)).revisions).toHaveLength(1);
  });

  test("gets it when the cut was ticked by mistake and the tick was taken back", async () => {
    const one = await makeLayout(maker);
    const { id } = await issue(one);
    const [stepId = ""] = await tick(id, ["cut"], "first");
    const { revisionId } = await readOrder(maker.shopId, id);
    await untickStep(maker, { orderId: id, revisionId, stepId });
    await save(one);
    expect(await issue(one)).toMatchObject({ id, revision: 2 });
  });

  test("that is cut leaves nothing for another one, but on a new picture", async () => {
    const one = await makeLayout(maker);
    const { id, number } = await issue(one);
    await tick(id, everything);
    await save(one);
    const { tag, takenBy } = await boardOf(one);
    expect(takenBy).toMatchObject({ by: "earlier-order" });
    await expect(issue(one)).rejects.toMatchObject(refusal(cutInto(tag, `${number} A`)));
    await moveOver(one, await newPicture(maker, one.boardId, "new photo"));
    const next = await issue(one);
    expect(next).toMatchObject({ revision: 1 });
    expect(next.id).not.toBe(id);
  });

  test("sent twice still answers with the order, begun or not", async () => {
    const one = await makeLayout(maker);
    const first = await issue(one);
    await tick(first.id, ["cut"], "first");
    expect(await issue(one)).toMatchObject({ id: first.id, revision: 1 });
  });
});

describe("at the same time", () => {
  test("two faces of one board: one is issued, the other refused, every time", async () => {
    for (let round = 0; round < 6; round += 1) {
      const { one, two } = await twoFaces();
      const outcomes = await Promise.allSettled([issue(one), issue(two)]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
      expect(outcomes.find(({ status }) => status === "rejected")).toMatchObject({
        reason: { code: "refused", message: expect.stringContaining("is issued for cutting with cut order") },
      });
      expect((await ordersOf(one)) + (await ordersOf(two))).toBe(1);
    }
  });

  test("two faces on two pictures of one photograph: one is issued, every time", async () => {
    for (let round = 0; round < 6; round += 1) {
      const { one, two } = await twoFaces();
      await moveOver(two, await newPicture(maker, one.boardId, "same photo"));
      const outcomes = await Promise.allSettled([issue(one), issue(two)]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    }
  });

  test("five faces of one board: one is issued", async () => {
    const one = await makeLayout(maker);
    const faces = [one, ...(await Promise.all([1, 2, 3, 4].map(() => besides(one))))];
    const outcomes = await Promise.allSettled(faces.map((face) => issue(face)));
    expect(outcomes.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    expect(outcomes.filter((one) => one.status === "rejected" && one.reason.code === "refused")).toHaveLength(4);
  });

  test("another face that is issued while the cuts are planned has the board", async () => {
    const { one, two } = await twoFaces();
    whilePlanning = async () => {
      whilePlanning = async () => undefined;
      await issue(one);
    };
    await expect(issue(two)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("is issued for cutting"),
    });
    expect([await ordersOf(one), await ordersOf(two)]).toEqual([1, 0]);
  });

  test("the bench's first cut while the next revision is planned stops it", async () => {
    const one = await makeLayout(maker);
    const { id } = await issue(one);
    // The layout is one revision on though its order still holds: saving supersedes, and nothing is ticked any more.
    await database().update(layout).set({ revision: 2 }).where(eq(layout.id, one.layoutId));
    whilePlanning = () => tick(id, ["cut"], "first");
    await expect(issue(one)).rejects.toMatchObject({ code: "refused", message: expect.stringContaining("of this face") });
    expect(await readOrder(maker.shopId, id)).toMatchObject({ revision: 1, superseded: false });
  });
});

test("another shop's orders take no board, whatever board their rows name", async () => {
  const stranger = (await makeShop()).maker;
  const one = await makeLayout(maker);
  const theirs = await makeLayout(stranger);
  const { id } = await issue(theirs, stranger);
  const { revisionId } = await readOrder(stranger.shopId, id);
  const { boardId, straighteningId } = one;
  await database().insert(orderRevisionBoard).values({ revisionId, boardId, straighteningId, shopId: stranger.shopId });
  expect((await boardOf(one)).takenBy).toBeNull();
  await expect(issue(one)).resolves.toMatchObject({ revision: 1 });
});

test("a layout is read with as many queries for many orders as for one, and no snapshot", async () => {
  const { one, two } = await twoFaces();
  const { id } = await issue(one);
  await tick(id, beforeCuts);
  const few = await statementsOf(() => boardOf(two));
  for (let revision = 2; revision < 6; revision += 1) {
    await save(one);
    await issue(one);
    await tick(id, beforeCuts);
  }
  const many = await statementsOf(() => boardOf(two));
  expect(many).toHaveLength(few.length);
  expect(many.some((statement) => statement.includes("order_revision_board"))).toBe(true);
  expect(many.filter((statement) => statement.includes("snapshot"))).toEqual([]);
});

async function statementsOf(run: () => Promise<unknown>): Promise<readonly string[]> {
  const { pool } = openPool();
  const spies = [vi.spyOn(pool, "query"), vi.spyOn(pool, "execute")];
  await run();
  const statements = spies.flatMap(({ mock }) => mock.calls.map((call) => JSON.stringify(call[0])));
  for (const spy of spies) spy.mockRestore();
  return statements;
}
