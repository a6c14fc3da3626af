/** Issuing, superseding and ticking cut orders, against a real database. */
import { and, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import { board, history, layout, orderRevision, shop } from "@/db/schema";
import { gridFace, groupOf, letLoose, moveGroup, placeGroup, umFromMm } from "@/lib/layout";
import type { Role } from "@/lib/schemas/endpoint";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { env } from "@/lib/server/env";
import { moveToVersion } from "@/lib/server/layouts/boards-on-table";
import { fingerprintOf } from "@/lib/server/orders/fingerprint";
import { issueOrder } from "@/lib/server/orders/issue";
import { closePlanPool } from "@/lib/server/orders/plan-pool";
import { orderPage, readOrder } from "@/lib/server/orders/read-orders";
import { markSuperseded } from "@/lib/server/orders/supersede";
import { tickStep, untickStep } from "@/lib/server/orders/ticks";
import { bundlePlanWorker } from "../support/bundle-worker";
import { type MadeLayout, makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";
import { newPicture } from "../support/new-picture";

/** The session that the next handler call finds in its cookie. */
let sessionId: string | null = null;
vi.mock("@/lib/server/session-cookie", () => ({ readSessionId: async () => sessionId }));

let shopOf: Readonly<Record<Role, ShopAccess>>;
let maker: ShopAccess;
afterAll(closePlanPool);
beforeAll(async () => {
  await bundlePlanWorker();
  shopOf = await makeShop();
  maker = shopOf.maker;
});

/** What saving a changed layout does to orders, without the layout's own checks. */
async function moveLayoutOn(made: MadeLayout, access: ShopAccess, revision: number): Promise<void> {
  const moved = moveGroup(made.document, "set", { x: umFromMm(20), y: umFromMm(0) });
  if (!moved.ok) throw new Error("the set cannot be moved");
  await database().transaction(async (tx) => {
    const document = faceLayoutSchema.parse(moved.layout);
    await tx.update(layout).set({ document, revision }).where(eq(layout.id, made.layoutId));
    await markSuperseded(tx, access.shopId, made.faceId, { userId: access.userId, reason: "layout changed" }, new Date());
  });
}

async function verbsOf(orderId: string, access: ShopAccess): Promise<string[]> {
  const rows = await database()
    .select({ verb: history.verb })
    .from(history)
    .where(and(eq(history.shopId, access.shopId), eq(history.nounId, orderId)))
    .orderBy(history.at, history.id);
  return rows.map(({ verb }) => verb);
}

describe("issuing", () => {
  test("freezes the layout as a numbered order, revision 1", async () => {
    const made = await makeLayout(maker);
    const row = await issueOrder(maker, made.faceId, 1);
    expect(row).toMatchObject({
      revision: 1,
      state: "issued",
      superseded: false,
      ticked: 0,
      faceTitles: ["Top row"],
      issuedBy: "Mats Lind",
    });
    expect(row.number).toBeGreaterThanOrEqual(18);

    const order = await readOrder(maker.shopId, row.id);
    expect(order.snapshot.faces[0]?.layout).toEqual(made.document);
    expect(order.snapshot.boards[0]?.program.pieces.map(({ rect }) => [rect.width, rect.height])).toEqual(
      Array.from({ length: 4 }, () => [umFromMm(243.2), umFromMm(184)]),
    );
    expect(order.steps).toBe(orderSteps(order.snapshot).length);
    expect(order.fingerprint).toBe(fingerprintOf(order.snapshot));
    expect(await verbsOf(row.id, maker)).toEqual(["issued"]);
  });

  test("of another revision than the present one is a conflict that names the present one", async () => {
    const made = await makeLayout(maker);
    await expect(issueOrder(maker, made.faceId, 2)).rejects.toMatchObject({ code: "conflict", detail: { revision: 1 } });
  });

  test("sent twice issues once", async () => {
    const made = await makeLayout(maker);
    const first = await issueOrder(maker, made.faceId, 1);
    expect(await issueOrder(maker, made.faceId, 1)).toEqual(first);
  });

  test("at the same time from many faces gives each its own number", async () => {
    const access = (await makeShop()).maker;
    const made = await Promise.all(Array.from({ length: 6 }, () => makeLayout(access)));
    const rows = await Promise.all(made.map(({ faceId }) => issueOrder(access, faceId, 1)));
    expect(rows.map(({ number }) => number).sort((a, b) => a - b)).toEqual([18, 19, 20, 21, 22, 23]);
  });

  test("at the same time from one face gives one order with one revision", async () => {
    const made = await makeLayout(maker);
    const rows = await Promise.all(Array.from({ length: 4 }, () => issueOrder(maker, made.faceId, 1)));
    expect(new Set(rows.map(({ id }) => id)).size).toBe(1);
    expect((await readOrder(maker.shopId, rows[0]?.id ?? "")).revisions).toHaveLength(1);
  });

  test("of fronts that are on no board is refused in words", async () => {
    const made = await makeLayout(maker, { at: null });
    await expect(issueOrder(maker, made.faceId, 1)).rejects.toMatchObject({
      code: "refused",
      message: "This layout cannot be cut yet. Fronts 1–4 are not laid on a board yet.",
    });
  });

  test("of a front that hangs over the board is refused with the amount", async () => {
    const made = await makeLayout(maker, { at: { x: umFromMm(96), y: umFromMm(30) } });
    await expect(issueOrder(maker, made.faceId, 1)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("Front 1 reaches 4.0 mm over the usable outline"),
    });
  });

  test("of fronts closer than the kerf is refused with what is missing", async () => {
    const made = await makeLayout(maker);
    const loose = letLoose(made.document, "p2");
    if (!loose.ok) throw new Error("front 2 cannot be let loose");
    const group = loose.layout.groups.find(({ pieceIds }) => pieceIds.length === 1);
    const close = moveGroup(loose.layout, group?.id ?? "", { x: umFromMm(-1.5), y: umFromMm(0) });
    if (!close.ok) throw new Error("front 2 cannot be moved");
    await database()
      .update(layout)
      .set({ document: faceLayoutSchema.parse(close.layout) })
      .where(eq(layout.id, made.layoutId));
    await expect(issueOrder(maker, made.faceId, 1)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringContaining("Fronts 1–2 lie 0.9 mm too close for the saw"),
    });
  });

  test("of pieces that no straight cut parts is refused by name", async () => {
    const mm = (...lengths: number[]) => lengths.map(umFromMm);
    const face = gridFace(mm(200, 100, 200, 100), mm(100, 200), umFromMm(3), umFromMm(3), "horizontal");
    const made = await makeLayout(maker, { face, boardMm: { length: 2000, width: 450 }, at: null });
    // 1, 6, 3 and 8 round a hole like a pinwheel, each in the way of the next one's cut; the others well apart.
    const corners: readonly (readonly [string, number, number])[] = [
      ["p1", 50, 50],
      ["p6", 253, 50],
      ["p3", 153, 253],
      ["p8", 50, 153],
      ["p2", 500, 50],
      ["p4", 700, 50],
      ["p5", 900, 50],
      ["p7", 1200, 50],
    ];
    let document = made.document;
    for (const [piece, x, y] of corners) {
      const loose = letLoose(document, piece);
      const apart = loose.ok ? loose.layout : document;
      const group = groupOf(apart, piece);
      const placed = placeGroup(apart, group?.id ?? "", made.boardId, { x: umFromMm(x), y: umFromMm(y) }, 0);
      if (!placed.ok) throw new Error(`${piece} cannot be placed`);
      document = placed.layout;
    }
    await database()
      .update(layout)
      .set({ document: faceLayoutSchema.parse(document) })
      .where(eq(layout.id, made.layoutId));
    await expect(issueOrder(maker, made.faceId, 1)).rejects.toMatchObject({
      code: "refused",
      message: expect.stringMatching(
        /Fronts 1, 3, 6, 8 block one another: no straight cut from edge to edge of board B-\d+ parts them/,
      ),
    });
  });
});

describe("a later change of the layout", () => {
  test("marks the issued revision superseded, and issuing again makes revision 2 of the same order", async () => {
    const made = await makeLayout(maker);
    const first = await issueOrder(maker, made.faceId, 1);
    const frozen = await readOrder(maker.shopId, first.id);
    await moveLayoutOn(made, maker, 2);
    expect(await readOrder(maker.shopId, first.id)).toMatchObject({ revision: 1, superseded: true });

    const second = await issueOrder(maker, made.faceId, 2);
    expect(second).toMatchObject({ id: first.id, number: first.number, revision: 2, superseded: false });
    const old = await readOrder(maker.shopId, first.id, 1);
    expect(old.superseded).toBe(true);
    expect(old.snapshot).toEqual(frozen.snapshot);
    expect(old.fingerprint).toBe(frozen.fingerprint);
    expect(second.id && (await readOrder(maker.shopId, second.id)).fingerprint).not.toBe(frozen.fingerprint);
    expect(await verbsOf(first.id, maker)).toEqual(["issued", "superseded", "issued"]);
  });

  test("does not change what was issued, nor does renaming board or shop", async () => {
    const access = (await makeShop()).owner;
    const made = await makeLayout(access);
    const row = await issueOrder(access, made.faceId, 1);
    const before = await readOrder(access.shopId, row.id);
    await moveLayoutOn(made, access, 2);
    await database().update(board).set({ place: "somewhere else", species: "oak" }).where(eq(board.id, made.boardId));
    await database().update(shop).set({ name: "Another name", units: "inch" }).where(eq(shop.id, access.shopId));
    const after = await readOrder(access.shopId, row.id);
    expect(after.snapshot).toEqual(before.snapshot);
    expect(fingerprintOf(after.snapshot)).toBe(before.fingerprint);
  });

  test("after every step is ticked leads to an order with a number of its own", async () => {
    const made = await makeLayout(maker);
    const first = await issueOrder(maker, made.faceId, 1);
    await tickAll(first.id);
    const { faceId, boardId } = made;
    await moveToVersion(maker, faceId, boardId, await newPicture(maker, boardId, "new photo"));
    const second = await issueOrder(maker, faceId, 1);
    expect(second.id).not.toBe(first.id);
    expect(second).toMatchObject({ revision: 1, state: "issued" });
    expect((await readOrder(maker.shopId, first.id)).state).toBe("cut");
  });
});

async function tickAll(orderId: string): Promise<void> {
  const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
  for (const { id: stepId } of orderSteps(snapshot)) await tickStep(maker, { orderId, revisionId, stepId });
}

describe("ticks", () => {
  test("say who and when; ticking twice keeps the first and writes one history row", async () => {
    const made = await makeLayout(maker);
    const { id: orderId } = await issueOrder(maker, made.faceId, 1);
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const stepId = orderSteps(snapshot)[0]?.id ?? "";
    const first = await tickStep(shopOf.assistant, { orderId, revisionId, stepId });
    expect(first.ticks).toMatchObject([{ stepId, by: "Asha Noor" }]);
    const again = await tickStep(maker, { orderId, revisionId, stepId });
    expect(again).toEqual(first);
    expect((await readOrder(maker.shopId, orderId)).ticks).toEqual(first.ticks);

    expect((await untickStep(maker, { orderId, revisionId, stepId })).ticks).toEqual([]);
    expect((await untickStep(maker, { orderId, revisionId, stepId })).ticks).toEqual([]);
    expect(await verbsOf(orderId, maker)).toEqual(["issued", "ticked", "unticked"]);
  });

  test("of all steps make the order cut, and taking one back opens it again", async () => {
    const made = await makeLayout(maker);
    const { id: orderId } = await issueOrder(maker, made.faceId, 1);
    await tickAll(orderId);
    const cut = await readOrder(maker.shopId, orderId);
    expect(cut).toMatchObject({ state: "cut", ticked: cut.steps });
    const stepId = cut.ticks[0]?.stepId ?? "";
    await untickStep(maker, { orderId, revisionId: cut.revisionId, stepId });
    expect(await readOrder(maker.shopId, orderId)).toMatchObject({ state: "issued", ticked: cut.steps - 1 });
  });

  test("at the same time from two people are both kept", async () => {
    const made = await makeLayout(maker);
    const { id: orderId } = await issueOrder(maker, made.faceId, 1);
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const ids = orderSteps(snapshot).map(({ id }) => id);
    await Promise.all(ids.map((stepId, i) => tickStep(i % 2 === 0 ? maker : shopOf.assistant, { orderId, revisionId, stepId })));
    expect(await readOrder(maker.shopId, orderId)).toMatchObject({ state: "cut", ticked: ids.length });
  });

  test("on a superseded revision are refused with the way forward", async () => {
    const made = await makeLayout(maker);
    const { id: orderId } = await issueOrder(maker, made.faceId, 1);
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const stepId = orderSteps(snapshot)[0]?.id ?? "";
    await tickStep(maker, { orderId, revisionId, stepId });
    await moveLayoutOn(made, maker, 2);
    await expect(tickStep(maker, { orderId, revisionId, stepId })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("Ask the maker to issue the layout again"),
    });
    await issueOrder(maker, made.faceId, 2);
    await expect(untickStep(maker, { orderId, revisionId, stepId })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("Revision A is superseded"),
      detail: { newestRevision: 2 },
    });
    expect((await readOrder(maker.shopId, orderId, 1)).ticks).toHaveLength(1);
  });

  test("of a step that the order does not have are not found", async () => {
    const made = await makeLayout(maker);
    const { id: orderId } = await issueOrder(maker, made.faceId, 1);
    const { revisionId } = await readOrder(maker.shopId, orderId);
    await expect(tickStep(maker, { orderId, revisionId, stepId: "B-999:1" })).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("another shop", () => {
  test("finds neither face, order, revision nor step", async () => {
    const made = await makeLayout(maker);
    const { id: orderId } = await issueOrder(maker, made.faceId, 1);
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const stepId = orderSteps(snapshot)[0]?.id ?? "";
    const stranger = (await makeShop({ name: "Otherwhere" })).owner;
    const notFound = { code: "not-found" };
    await expect(issueOrder(stranger, made.faceId, 1)).rejects.toMatchObject(notFound);
    await expect(readOrder(stranger.shopId, orderId)).rejects.toMatchObject(notFound);
    await expect(tickStep(stranger, { orderId, revisionId, stepId })).rejects.toMatchObject(notFound);
    await expect(untickStep(stranger, { orderId, revisionId, stepId })).rejects.toMatchObject(notFound);
    expect(await orderPage(stranger.shopId, { state: "all", page: 1, pageSize: 25 })).toMatchObject({ items: [], total: 0 });
    await database().transaction((tx) =>
      markSuperseded(tx, stranger.shopId, made.faceId, { userId: stranger.userId, reason: "layout changed" }, new Date()),
    );
    expect((await readOrder(maker.shopId, orderId)).superseded).toBe(false);
  });
});

describe("lists", () => {
  test("come newest first, by page and by state, with the newest revision's progress", async () => {
    const access = (await makeShop()).maker;
    const made = await Promise.all([makeLayout(access), makeLayout(access), makeLayout(access)]);
    const ids: string[] = [];
    for (const { faceId } of made) ids.push((await issueOrder(access, faceId, 1)).id);
    const page = await orderPage(access.shopId, { state: "all", page: 1, pageSize: 2 });
    expect(page.items.map(({ number }) => number)).toEqual([20, 19]);
    expect(page.total).toBe(3);
    expect((await orderPage(access.shopId, { state: "all", page: 2, pageSize: 2 })).items.map(({ number }) => number)).toEqual([
      18,
    ]);

    const { revisionId, snapshot } = await readOrder(access.shopId, ids[0] ?? "");
    for (const { id: stepId } of orderSteps(snapshot)) await tickStep(access, { orderId: ids[0] ?? "", revisionId, stepId });
    const cut = await orderPage(access.shopId, { state: "cut", page: 1, pageSize: 25 });
    expect(cut.items).toMatchObject([{ id: ids[0], ticked: orderSteps(snapshot).length }]);
    expect((await orderPage(access.shopId, { state: "issued", page: 1, pageSize: 25 })).total).toBe(2);
  });
});

describe("over HTTP", () => {
  const write = (path: string, method: "POST" | "PUT" | "DELETE", body?: unknown) =>
    new Request(new URL(path, env().APP_URL), {
      method,
      headers: { origin: env().APP_URL },
      ...(body !== undefined && { body: JSON.stringify(body) }),
    });

  test("an assistant may tick but not issue; without a session nothing is told", async () => {
    const issue = await import("@/app/api/faces/[faceId]/order/route");
    const tick = await import("@/app/api/orders/[orderId]/revisions/[revisionId]/steps/[stepId]/tick/route");
    const one = await import("@/app/api/orders/[orderId]/route");
    const made = await makeLayout(maker);
    const post = () =>
      issue.POST(write(`/api/faces/${made.faceId}/order`, "POST", { layoutRevision: 1 }), {
        params: Promise.resolve({ faceId: made.faceId }),
      });

    sessionId = shopOf.assistant.sessionId;
    expect((await post()).status).toBe(403);
    sessionId = maker.sessionId;
    const issued = await post();
    expect(issued.status).toBe(200);
    const { id: orderId } = await issued.json();
    const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
    const params = Promise.resolve({ orderId, revisionId, stepId: orderSteps(snapshot)[0]?.id });

    sessionId = shopOf.assistant.sessionId;
    expect((await tick.PUT(write("/api/orders", "PUT"), { params })).status).toBe(200);
    expect((await tick.DELETE(write("/api/orders", "DELETE"), { params })).status).toBe(200);
    sessionId = null;
    const read = await one.GET(new Request(new URL("/api/orders", env().APP_URL)), { params: Promise.resolve({ orderId }) });
    expect(read.status).toBe(401);
    expect((await tick.PUT(write("/api/orders", "PUT"), { params })).status).toBe(401);
  });
});

test("an issued revision's row never changes but for the moment it was superseded", async () => {
  const made = await makeLayout(maker);
  const { id: orderId } = await issueOrder(maker, made.faceId, 1);
  const rowOf = async () => (await database().select().from(orderRevision).where(eq(orderRevision.orderId, orderId)))[0];
  const before = await rowOf();
  await tickAll(orderId);
  await moveLayoutOn(made, maker, 2);
  const after = await rowOf();
  expect(after?.supersededAt).toBeInstanceOf(Date);
  expect({ ...after, supersededAt: null }).toEqual(before);
});
