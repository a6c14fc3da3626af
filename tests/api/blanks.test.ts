/** Blanks: boards of the rack planned into one stock, its picture composed as a task, and the order that glues it up. */
import "../support/cookie-jar";
import { and, eq } from "drizzle-orm";
import sharp from "sharp";
import { v7 as newId } from "uuid";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import * as blankRoute from "@/app/api/blanks/[boardId]/route";
import * as blanksRoute from "@/app/api/blanks/route";
import { findTask } from "@/db/queries/task";
import { blankMember, boardPicture, board as boardTable, layoutBoard, straightening, task } from "@/db/schema";
import { um, umFromMm } from "@/lib/layout";
import type { PlanBlank } from "@/lib/schemas/blank";
import * as endpoint from "@/lib/schemas/blank";
import { boardQuerySchema } from "@/lib/schemas/board";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { ShopAccess } from "@/lib/server/access";
import { planBlank } from "@/lib/server/blanks/plan-blank";
import { takeApart } from "@/lib/server/blanks/take-apart";
import { changeBoard } from "@/lib/server/boards/change-board";
import { readBoardPage } from "@/lib/server/boards/list-boards";
import { readBoard } from "@/lib/server/boards/read-board";
import { database } from "@/lib/server/database";
import { putBoardOnTable } from "@/lib/server/layouts/boards-on-table";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";
import { issueOrder } from "@/lib/server/orders/issue";
import { type Planner, planAndVerify } from "@/lib/server/orders/plan-cuts";
import { readOrder } from "@/lib/server/orders/read-orders";
import { tickStep, untickStep } from "@/lib/server/orders/ticks";
import { closePixelPool } from "@/lib/server/pictures/pixel-pool";
import { saveShopSettings, shopSettings } from "@/lib/server/shops";
import { storage } from "@/lib/server/storage";
import { saveZones } from "@/lib/server/straightenings/save-zones";
import { startStraightening } from "@/lib/server/straightenings/start-straightening";
import { readStraightening, readStraightenings } from "@/lib/server/straightenings/straightenings";
import { kinds } from "@/lib/server/tasks/kinds";
import { runTask } from "@/lib/server/tasks/run-task";
import { stepWords, styleOf } from "@/lib/words/order-step";
import { actAs } from "../support/act-as";
import { ask } from "../support/ask";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";
import { makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";
import { addPicture, type Pictured, picturedBoard } from "../support/pictured-board";
import { enter, filesOf, point, soundMarking, takeIn, wire } from "../support/rack";

/** Runs while an order's cuts are planned: nothing is locked then, as in the real thread. */
let whilePlanning: () => Promise<unknown> = async () => undefined;
const planned: Planner = async (request) => {
  await whilePlanning();
  return planAndVerify(request);
};
vi.mock("@/lib/server/orders/plan-pool", () => ({ planInThread: ((request) => planned(request)) satisfies Planner }));

let maker: ShopAccess;
let owner: ShopAccess;
let assistant: ShopAccess;
let stranger: ShopAccess;
beforeAll(async () => {
  await bundlePixelWorker();
  ({ maker, owner, assistant } = await makeShop());
  stranger = (await makeShop()).maker;
}, 60_000);
afterAll(async () => {
  vi.restoreAllMocks();
  await closePixelPool();
});

const place = (pictured: Pictured, more: Partial<PlanBlank["members"][number]> = {}): PlanBlank["members"][number] => ({
  boardId: pictured.boardId,
  straighteningId: pictured.straighteningId,
  endForEnd: false,
  along: um(0),
  trim: { upper: um(0), lower: um(0) },
  ...more,
});
const planOf = (members: PlanBlank["members"], jointingMm = 1.5): PlanBlank => ({
  members,
  jointing: umFromMm(jointingMm),
  place: "bench",
  note: "",
});

/** Two boards of the rack, 1200 × 200 mm unless said otherwise, and the plan that glues them flush. */
async function twoBoards(access = maker, fields: Parameters<typeof enter>[1] = {}) {
  const [a, b] = [await picturedBoard(access, fields), await picturedBoard(access, fields)];
  return { a, b, plan: planOf([place(a), place(b)]) };
}

async function workOff(access: ShopAccess, taskId: string | null): Promise<void> {
  const claim = { state: "running", claimId: newId(), attempts: 1, leaseUntil: new Date(Date.now() + 30_000) } as const;
  await database()
    .update(task)
    .set(claim)
    .where(and(eq(task.id, taskId ?? ""), eq(task.state, "queued")));
  const row = await findTask(database(), access.shopId, taskId ?? "");
  if (!row) throw new Error("no such task");
  await runTask(database(), kinds[row.kind], row, new AbortController().signal);
}

/** A board whose picture was really made of a photograph. */
async function photographed(access: ShopAccess): Promise<Pictured> {
  const { id: boardId, tag } = await enter(access);
  const photo = await takeIn(access);
  const { id, taskId } = await startStraightening(access, boardId, { photoId: photo.id, marking: wire(soundMarking) });
  await workOff(access, taskId);
  return { boardId, tag, straighteningId: id };
}

const versionOf = async (access: ShopAccess, boardId: string) => {
  const [version] = await readStraightenings(access, boardId);
  if (!version) throw new Error("no version");
  return version;
};

/** Whoever has begun to make the picture, or would, makes none: the tests that do without need not wait for it. */
async function noPicture(boardId: string): Promise<void> {
  const version = await versionOf(maker, boardId);
  await database().update(straightening).set({ state: "cancelled" }).where(eq(straightening.id, version.id));
  await database()
    .update(task)
    .set({ state: "cancelled", claimId: null })
    .where(eq(task.id, version.taskId ?? ""));
}

describe("planning a blank", () => {
  test("makes a board of the rack with a tag of its own, and binds its boards to it", async () => {
    const { a, b, plan } = await twoBoards();
    const blank = await planBlank(maker, { ...plan, note: "table top" });
    expect(blank).toMatchObject({
      kind: "blank",
      state: "rack",
      species: "Black walnut",
      length: 1_200_000,
      width: 397_000,
      thickness: 27_000,
      place: "bench",
      note: "table top",
      costMinor: null,
      inBlank: null,
      blank: { jointing: 1500, glued: false, issued: false },
    });
    expect(blank.blank?.members).toMatchObject([
      { tag: a.tag, side: "face", endForEnd: false, rect: { x: 0, y: 0, width: 1_200_000, height: 198_500 } },
      { tag: b.tag, takes: { upper: 1500, lower: 0 }, rect: { y: 198_500, height: 198_500 } },
    ]);
    for (const { boardId } of [a, b]) {
      expect((await readBoard(maker, boardId)).inBlank).toEqual({ boardId: blank.id, tag: blank.tag });
    }
    const free = await readBoardPage(maker, boardQuerySchema.parse({ free: "yes", pageSize: 100 }));
    expect(free.items.map(({ id }) => id)).toContain(blank.id);
    expect(free.items.map(({ id }) => id)).not.toContain(a.boardId);
  });

  test("carries outline, areas with their notes, and glue lines over by the boards' maps", async () => {
    const { a, b } = await twoBoards();
    const area = (x: number, y: number) => ({
      id: newId(),
      kind: "knot" as const,
      area: { shape: "ellipse" as const, centre: point(x, y), radiusX: um(20_000), radiusY: um(10_000), turnDeg: 30 },
      note: "dead",
    });
    const outline = [point(0, 0), point(1200, 0), point(1200, 200), point(100, 200), point(0, 150)];
    await saveZones(maker, a.straighteningId, { outline, keepClear: [area(400, 60)], revision: 0 });
    await saveZones(maker, b.straighteningId, { outline: null, keepClear: [area(300, 40)], revision: 0 });
    const blank = await planBlank(maker, planOf([place(a), place(b, { endForEnd: true })], 2));
    const { zones } = await versionOf(maker, blank.id);
    expect(zones.keepClear.map(({ area: at, note }) => [at.shape === "ellipse" && [at.centre, at.turnDeg], note])).toEqual(
      expect.arrayContaining([
        [[point(400, 60), 30], "dead"],
        // Turned by half a turn: 1200 − 300 along, 198 + (200 − 40) − 2 across.
        [[point(900, 356), 30], "dead"],
      ]),
    );
    expect(zones.glueLines).toMatchObject([{ across: 198_000, aboveBoardId: a.boardId, belowBoardId: b.boardId }]);
    // Board a is cut off at 198 mm, where its wane has come in by 96 mm.
    expect(zones.outline).toEqual(expect.arrayContaining([point(0, 150), point(96, 198), point(0, 198), point(1200, 396)]));
  });

  test("takes the back of a board where its back comes up", async () => {
    const { a, b } = await twoBoards();
    const straighteningId = await addPicture(maker, b.boardId, { side: "back" });
    const { blank } = await planBlank(maker, planOf([place(a), place({ ...b, straighteningId })]));
    expect(blank?.members.map(({ side }) => side)).toEqual(["face", "back"]);
  });

  test.each<[string, (plan: PlanBlank) => PlanBlank, RegExp]>([
    [
      "trimmed to nothing",
      (plan) => ({ ...plan, members: [trimmed(plan.members[0]), ...plan.members.slice(1)] }),
      /Nothing is left of B-/,
    ],
    ["that do not meet", (plan) => ({ ...plan, members: [shifted(plan.members[0]), ...plan.members.slice(1)] }), /do not meet/],
  ])("refuses boards %s, in words with the figure", async (_, change, words) => {
    const { plan } = await twoBoards();
    await expect(planBlank(maker, change(plan))).rejects.toMatchObject({
      code: "refused",
      message: expect.stringMatching(words),
    });
  });

  test("refuses boards of thicknesses too far apart", async () => {
    const { a } = await twoBoards();
    const thick = await picturedBoard(maker, { thickness: umFromMm(31) });
    await expect(planBlank(maker, planOf([place(a), place(thick)]))).rejects.toMatchObject({
      code: "refused",
      message: `${thick.tag} is 4.0 mm thicker than ${a.tag}, too much to flatten away. Plane it first and enter its thickness.`,
    });
  });

  test("names both species where they differ", async () => {
    const { a } = await twoBoards();
    const oak = await picturedBoard(maker, { species: "European oak", nominalQuarters: 5 });
    expect(await planBlank(maker, planOf([place(a), place(oak)]))).toMatchObject({
      species: "Black walnut and European oak",
      nominalQuarters: null,
    });
  });
});

const trimmed = (one: PlanBlank["members"][number] | undefined): PlanBlank["members"][number] => ({
  ...(one as PlanBlank["members"][number]),
  trim: { upper: umFromMm(150), lower: umFromMm(50) },
});
const shifted = (one: PlanBlank["members"][number] | undefined): PlanBlank["members"][number] => ({
  ...(one as PlanBlank["members"][number]),
  along: umFromMm(1200),
});

const refusedWith = (words: string) => ({ code: "refused", message: expect.stringContaining(words) });

describe("a board that is bound already", () => {
  test("to another blank cannot be glued into a second one, laid out, or written off", async () => {
    const { a, b, plan } = await twoBoards();
    const { tag } = await planBlank(maker, plan);
    const other = await picturedBoard(maker);
    await expect(planBlank(maker, planOf([place(other), place(a)]))).rejects.toMatchObject(
      refusedWith(`${a.tag} is in blank ${tag}.`),
    );
    const { faceId } = await makeLayout(maker);
    await expect(putBoardOnTable(maker, faceId, b.boardId)).rejects.toMatchObject(refusedWith(`${b.tag} is in blank ${tag}.`));
    const { revision } = await readBoard(maker, a.boardId);
    await expect(changeBoard(maker, a.boardId, { baseRevision: revision, state: "gone" })).rejects.toMatchObject(
      refusedWith(`${a.tag} is in blank ${tag}.`),
    );
  });

  test("to the table of a face, to a cut order, or to nothing any more, says so", async () => {
    const one = await makeLayout(maker);
    const other = await picturedBoard(maker, { thickness: umFromMm(26) });
    const onTable: Pictured = { ...one, tag: "" };
    await expect(planBlank(maker, planOf([place(onTable), place(other)]))).rejects.toMatchObject(
      refusedWith("is on the table of Top row"),
    );
    const { number } = await issueOrder(maker, one.faceId, 1);
    await database().delete(layoutBoard).where(eq(layoutBoard.layoutId, one.layoutId));
    await expect(planBlank(maker, planOf([place(onTable), place(other)]))).rejects.toMatchObject(
      refusedWith(`is issued with cut order ${number} A. Cut that order first`),
    );
    await database().update(boardTable).set({ state: "cut" }).where(eq(boardTable.id, other.boardId));
    await expect(planBlank(maker, planOf([place(other), place(await picturedBoard(maker))]))).rejects.toMatchObject(
      refusedWith("is no longer in the rack"),
    );
  });

  test("as a planned blank itself is no board for another one", async () => {
    const { plan } = await twoBoards();
    const { id, tag } = await planBlank(maker, plan);
    const { id: straighteningId } = await versionOf(maker, id);
    const other = await picturedBoard(maker);
    await expect(planBlank(maker, planOf([place({ boardId: id, tag, straighteningId }), place(other)]))).rejects.toMatchObject(
      refusedWith(`${tag} is a blank that is planned itself`),
    );
  });

  test("marked anew since the plan was drawn is a conflict", async () => {
    const { a, plan } = await twoBoards();
    await addPicture(maker, a.boardId, { side: "face" });
    await expect(planBlank(maker, plan)).rejects.toMatchObject({ code: "conflict" });
  });

  test("laid out before it came into the blank is not issued: a draft on it is told, an order refused", async () => {
    const one = await makeLayout(maker);
    // As a layout of a closed job that is opened again would have it.
    await database().delete(layoutBoard).where(eq(layoutBoard.layoutId, one.layoutId));
    const other = await picturedBoard(maker, { thickness: umFromMm(26) });
    const { tag, id } = await planBlank(maker, planOf([place({ ...one, tag: "" }), place(other)]));
    await database()
      .insert(layoutBoard)
      .values({ layoutId: one.layoutId, shopId: maker.shopId, boardId: one.boardId, straighteningId: one.straighteningId });
    expect((await readLayout(maker, one.faceId)).boards[0]?.inBlank).toEqual({ boardId: id, tag });
    await expect(issueOrder(maker, one.faceId, 1)).rejects.toMatchObject(refusedWith(`is in blank ${tag}.`));
  });
});

describe("taking a blank apart", () => {
  test("frees its boards; its tag stays its own, and the story is told on all of them", async () => {
    const { a, b, plan } = await twoBoards();
    const { id, tag } = await planBlank(maker, plan);
    await noPicture(id);
    await takeApart(maker, id);
    expect(await readBoard(maker, id)).toMatchObject({ tag, state: "gone", blank: null });
    for (const { boardId } of [a, b]) expect((await readBoard(maker, boardId)).inBlank).toBeNull();
    expect((await planBlank(maker, plan)).tag).not.toBe(tag);
    const { faceId } = await makeLayout(maker);
    await expect(putBoardOnTable(maker, faceId, id)).rejects.toMatchObject(refusedWith(`Blank ${tag} was taken apart`));
  });

  test("waits for its picture, and for its place on a table", async () => {
    const { plan } = await twoBoards();
    const { id } = await planBlank(maker, plan);
    await expect(takeApart(maker, id)).rejects.toMatchObject(refusedWith("A picture of"));
    await noPicture(id);
    const { layoutId } = await makeLayout(maker);
    const straighteningId = (await versionOf(maker, id)).id;
    await database().insert(layoutBoard).values({ layoutId, shopId: maker.shopId, boardId: id, straighteningId });
    await expect(takeApart(maker, id)).rejects.toMatchObject(refusedWith("is on the table of Top row"));
  });

  test("is over once an order was issued from it, superseded or not", async () => {
    const { blankId, faceId } = await laidOut();
    await issueOrder(maker, faceId, (await readLayout(maker, faceId)).revision);
    await save(faceId);
    expect((await readBoard(maker, blankId)).blank?.issued).toBe(true);
    await expect(takeApart(maker, blankId)).rejects.toMatchObject(refusedWith("A cut order was issued from"));
  });

  test("is for planned blanks", async () => {
    const { boardId } = await picturedBoard(maker);
    await expect(takeApart(maker, boardId)).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("the picture", () => {
  test("is composed from those of the boards, and shown in the rack with what was carried over", async () => {
    const access = (await makeShop()).maker;
    const [a, b] = [await photographed(access), await photographed(access)];
    const { id } = await planBlank(access, planOf([place(a), place(b, { endForEnd: true })]));
    const waiting = await versionOf(access, id);
    expect(waiting).toMatchObject({ state: "waiting", photoId: null, marking: null, side: "face", levels: [] });
    await workOff(access, waiting.taskId);
    const version = await readStraightening(access, waiting.id);
    const single = await readStraightening(access, a.straighteningId);
    expect(version).toMatchObject({ state: "done", pxPerMm: single.pxPerMm, residual: null, length: 1_200_000, width: 397_000 });
    const [full] = version.levels;
    expect([full?.widthPx, full?.heightPx]).toEqual([Math.round(1200 * version.pxPerMm), Math.round(397 * version.pxPerMm)]);
    const blank = await readBoard(access, id);
    expect(blank).toMatchObject({ straighteningId: version.id, kind: "blank" });
    expect(version.zones.glueLines).toHaveLength(1);
    const bytes = await storage().get(`shops/${access.shopId}/straightenings/${version.id}/level-0.jpg`);
    expect((await sharp(bytes ?? new Uint8Array()).metadata()).width).toBe(full?.widthPx);
  });

  test("that cannot be made says so, and leaves no file and no picture", async () => {
    const access = (await makeShop()).maker;
    const [a, b] = [await photographed(access), await photographed(access)];
    const { id } = await planBlank(access, planOf([place(a), place(b)]));
    const { id: straighteningId, taskId } = await versionOf(access, id);
    await storage().remove(`shops/${access.shopId}/straightenings/${b.straighteningId}/level-0.jpg`);
    await workOff(access, taskId);
    const version = await readStraightening(access, straighteningId);
    expect(version).toMatchObject({ state: "failed", failure: expect.stringContaining("went wrong on our side") });
    expect(version.failure).not.toMatch(/shops\//);
    expect(filesOf(access).filter((file) => file.includes(straighteningId))).toEqual([]);
    expect((await readBoard(access, id)).straighteningId).toBeNull();
    await takeApart(access, id);
  });
});

/** The composed picture is done without any pixel having been moved. */
async function composedAtOnce(boardId: string): Promise<string> {
  await noPicture(boardId);
  const { id: straighteningId } = await versionOf(maker, boardId);
  await database().update(straightening).set({ state: "done", pxPerMm: 4 }).where(eq(straightening.id, straighteningId));
  await database().insert(boardPicture).values({ boardId, straighteningId, shopId: maker.shopId });
  return straighteningId;
}

/** A blank of two boards 2350 × 110 mm with a row of four fronts on it; its picture is not needed. */
async function laidOut() {
  const { a, b, plan } = await twoBoards(maker, { length: umFromMm(2350), width: umFromMm(110), thickness: umFromMm(26) });
  const blank = await planBlank(maker, plan);
  const straighteningId = await composedAtOnce(blank.id);
  const layout = await makeLayout(maker, { stock: { boardId: blank.id, straighteningId } });
  return { a, b, blankId: blank.id, tag: blank.tag, ...layout };
}

async function save(faceId: string): Promise<void> {
  const { revision, document } = await readLayout(maker, faceId);
  await saveLayout(maker, faceId, {
    baseRevision: revision,
    document: faceLayoutSchema.parse(document),
    crosscutSawId: null,
    ripSawId: null,
  });
}

const issue = async (faceId: string) => issueOrder(maker, faceId, (await readLayout(maker, faceId)).revision);

describe("an order from a planned blank", () => {
  test("begins with fetching its boards, jointing and gluing up, and goes on with the cuts", async () => {
    const { a, b, tag, faceId } = await laidOut();
    const { snapshot } = await readOrder(maker.shopId, (await issue(faceId)).id);
    const steps = orderSteps(snapshot);
    expect(steps.slice(0, 6).map(({ kind }) => kind)).toEqual([
      "fetch-member",
      "fetch-member",
      "arrange",
      "joint",
      "glue-up",
      "mark",
    ]);
    const said = steps.slice(0, 5).map((step) => {
      const { verb, rest } = stepWords(step, styleOf(snapshot));
      return `${verb} ${rest}`;
    });
    expect(said).toEqual([
      `Fetch board ${a.tag} from rack 2 left`,
      `Fetch board ${b.tag} from rack 2 left`,
      `Lay out the boards of blank ${tag}`,
      `Joint the lower edge of ${a.tag} and the upper edge of ${b.tag}`,
      `Glue up blank ${tag} of ${a.tag} and ${b.tag}`,
    ]);
    for (const { id } of steps) expect(id.length).toBeLessThanOrEqual(40);
  });

  test("is superseded without losing the blank: what only glues it up takes no wood of its picture", async () => {
    const { faceId, tag } = await laidOut();
    const { id: orderId } = await issue(faceId);
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const gluing = orderSteps(snapshot).slice(0, 5);
    for (const { id: stepId } of gluing) await tickStep(maker, { orderId, revisionId, stepId });
    await save(faceId);
    const next = await issue(faceId);
    expect(next).toMatchObject({ id: orderId, revision: 2 });
    // It is glued: the next revision fetches the blank itself.
    const steps = orderSteps((await readOrder(maker.shopId, orderId)).snapshot);
    expect(steps.slice(0, 2).map(({ kind }) => kind)).toEqual(["fetch", "mark"]);
    expect(stepWords(steps[0] as (typeof steps)[number], { unit: "mm" }).rest).toContain(tag);
  });

  test("glued up by a tick that was taken back is still to be glued", async () => {
    const { faceId, blankId } = await laidOut();
    const { id: orderId } = await issue(faceId);
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const stepId = orderSteps(snapshot).find(({ kind }) => kind === "glue-up")?.id ?? "";
    await tickStep(maker, { orderId, revisionId, stepId });
    expect((await readBoard(maker, blankId)).blank?.glued).toBe(true);
    await untickStep(maker, { orderId, revisionId, stepId });
    expect((await readBoard(maker, blankId)).blank?.glued).toBe(false);
    await save(faceId);
    await issue(faceId);
    expect(orderSteps((await readOrder(maker.shopId, orderId)).snapshot)[0]?.kind).toBe("fetch-member");
  });

  test("is a conflict when the blank is glued up while its cuts are planned", async () => {
    const { faceId } = await laidOut();
    const { id: orderId } = await issue(faceId);
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const stepId = orderSteps(snapshot).find(({ kind }) => kind === "glue-up")?.id ?? "";
    // The layout is one revision on though its order still holds: saving supersedes, and nothing is ticked any more.
    const { layout } = await import("@/db/schema");
    await database().update(layout).set({ revision: 2 }).where(eq(layout.faceId, faceId));
    whilePlanning = () => tickStep(maker, { orderId, revisionId, stepId });
    await expect(issueOrder(maker, faceId, 2)).rejects.toMatchObject({ code: "conflict" });
    whilePlanning = async () => undefined;
    await expect(issueOrder(maker, faceId, 2)).resolves.toMatchObject({ revision: 2 });
  });

  test("from a blank that was glued without an order, and photographed since, begins with the blank", async () => {
    const { faceId, blankId, tag } = await laidOut();
    await addPicture(maker, blankId, { side: "face" });
    expect((await readBoard(maker, blankId)).blank?.glued).toBe(true);
    await expect(takeApart(maker, blankId)).rejects.toMatchObject(refusedWith(`${tag} was photographed in one piece`));
    const { snapshot } = await readOrder(maker.shopId, (await issue(faceId)).id);
    expect(orderSteps(snapshot)[0]?.kind).toBe("fetch");
  });

  test("from a blank that came glued already has its lines and no gluing", async () => {
    const one = await makeLayout(maker);
    const line = { id: newId(), across: umFromMm(100), aboveBoardId: null, belowBoardId: null };
    await saveZones(maker, one.straighteningId, { outline: null, keepClear: [], glueLines: [line], revision: 0 });
    const { snapshot } = await readOrder(maker.shopId, (await issue(one.faceId)).id);
    expect(snapshot.boards[0]).toMatchObject({ glueLines: [100_000] });
    expect(snapshot.boards[0]).not.toHaveProperty("gluing");
    expect(orderSteps(snapshot)[0]?.kind).toBe("fetch");
  });
});

describe("who may", () => {
  test("owners and makers plan blanks and take them apart; assistants look on", async () => {
    const { plan } = await twoBoards();
    await actAs(assistant);
    expect((await ask(blanksRoute.POST, endpoint.planBlank, { body: plan })).status).toBe(403);
    await actAs(owner);
    const made = await ask(blanksRoute.POST, endpoint.planBlank, { body: plan });
    expect(made).toMatchObject({ status: 200, body: { kind: "blank" } });
    const boardId = (made.body as { id: string }).id;
    await noPicture(boardId);
    await actAs(assistant);
    expect((await ask(blankRoute.DELETE, endpoint.takeApartBlank, { params: { boardId } })).status).toBe(403);
    expect((await readBoard(assistant, boardId)).blank?.members).toHaveLength(2);
    await actAs(owner);
    expect((await ask(blankRoute.DELETE, endpoint.takeApartBlank, { params: { boardId } })).status).toBe(204);
  });

  test("another shop's boards, pictures and blanks are not found", async () => {
    const { a, plan } = await twoBoards();
    const theirs = await picturedBoard(stranger);
    await expect(planBlank(maker, planOf([place(a), place(theirs)]))).rejects.toMatchObject({ code: "not-found" });
    const mixed = place({ ...a, straighteningId: theirs.straighteningId });
    await expect(planBlank(maker, planOf([mixed, ...plan.members.slice(1)]))).rejects.toMatchObject({ code: "not-found" });
    const { id } = await planBlank(maker, plan);
    await expect(takeApart(stranger, id)).rejects.toMatchObject({ code: "not-found" });
    await actAs(stranger);
    expect((await ask(blankRoute.DELETE, endpoint.takeApartBlank, { params: { boardId: id } })).status).toBe(404);
  });

  test("a body with one board is a bad request", async () => {
    const { plan } = await twoBoards();
    await actAs(maker);
    const answer = await ask(blanksRoute.POST, endpoint.planBlank, { body: { ...plan, members: plan.members.slice(1) } });
    expect(answer).toMatchObject({ status: 400, body: { title: expect.stringContaining("two boards at least") } });
  });
});

const membersOf = async (boardId: string) => database().select().from(blankMember).where(eq(blankMember.boardId, boardId));

describe("at the same time", () => {
  test("two people who glue one board into two blanks: one gets it, every time, and no tag is left behind for the other", async () => {
    for (let round = 0; round < 6; round += 1) {
      const { a, b } = await twoBoards();
      const c = await picturedBoard(maker);
      const outcomes = await Promise.allSettled([
        planBlank(maker, planOf([place(a), place(b)])),
        planBlank(owner, planOf([place(c), place(a)])),
      ]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
      expect(outcomes.find(({ status }) => status === "rejected")).toMatchObject({
        reason: { code: "refused", message: expect.stringContaining(`${a.tag} is in blank`) },
      });
      expect(await membersOf(a.boardId)).toHaveLength(1);
      const lost = outcomes[0]?.status === "rejected" ? b : c;
      expect(await membersOf(lost.boardId)).toEqual([]);
    }
  });

  test("five blanks around a ring of boards: no board is in two", async () => {
    const ring = await Promise.all([1, 2, 3, 4, 5].map(() => picturedBoard(maker)));
    const plans = ring.map((one, i) => planOf([place(one), place(ring[(i + 1) % 5] ?? one)]));
    const outcomes = await Promise.allSettled(plans.map((plan) => planBlank(maker, plan)));
    const made = outcomes.filter(({ status }) => status === "fulfilled").length;
    expect(made).toBeGreaterThanOrEqual(1);
    expect(made).toBeLessThanOrEqual(2);
    expect(outcomes.filter((one) => one.status === "rejected" && one.reason.code === "refused")).toHaveLength(5 - made);
    const members = await Promise.all(ring.map(({ boardId }) => membersOf(boardId)));
    expect(members.map(({ length }) => length).filter((count) => count > 0)).toHaveLength(2 * made);
  });

  test("a board laid on a table and glued into a blank: only one of the two, every time", async () => {
    for (let round = 0; round < 6; round += 1) {
      const { a, plan } = await twoBoards();
      const { faceId } = await makeLayout(maker);
      const outcomes = await Promise.allSettled([planBlank(maker, plan), putBoardOnTable(owner, faceId, a.boardId)]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    }
  });

  test("taken apart twice: once", async () => {
    const { plan } = await twoBoards();
    const { id } = await planBlank(maker, plan);
    await noPicture(id);
    const outcomes = await Promise.allSettled([takeApart(maker, id), takeApart(owner, id)]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  });

  test("taken apart while an order is issued from it: one of the two", async () => {
    for (let round = 0; round < 4; round += 1) {
      const { faceId, blankId } = await laidOut();
      // The face's job is closed: its table does not hold the blank, and its layout may still be issued.
      const { face, job } = await import("@/db/schema");
      const [row] = await database().select({ jobId: face.jobId }).from(face).where(eq(face.id, faceId));
      await database()
        .update(job)
        .set({ state: "closed" })
        .where(eq(job.id, row?.jobId ?? ""));
      const outcomes = await Promise.allSettled([takeApart(maker, blankId), issue(faceId)]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    }
  });
});

test("what jointing takes is the shop's own; settings saved without it leave it", async () => {
  const { saws: _saws, id: _id, revision, ...settings } = await shopSettings(owner.shopId);
  expect(settings.jointing).toBe(1500);
  const saved = await saveShopSettings(owner, { ...settings, jointing: umFromMm(0.8), baseRevision: revision });
  expect(saved.jointing).toBe(800);
  const { jointing: _jointing, ...without } = settings;
  expect((await saveShopSettings(owner, { ...without, baseRevision: saved.revision })).jointing).toBe(800);
});
