/** What layouts tell of each other's pieces on one board, against a real database. Whose the board is, is in board-in-order.test.ts. */
import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import { job, layout, layoutBoard } from "@/db/schema";
import { type BoardFace, problems, umFromMm } from "@/lib/layout";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import type { ShopAccess } from "@/lib/server/access";
import { database, openPool } from "@/lib/server/database";
import { moveToVersion } from "@/lib/server/layouts/boards-on-table";
import { type LayoutBoard, readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";
import { issueOrder } from "@/lib/server/orders/issue";
import { closePlanPool } from "@/lib/server/orders/plan-pool";
import { bundlePlanWorker } from "../support/bundle-worker";
import { type LayoutWanted, type MadeLayout, makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";
import { newPicture } from "../support/new-picture";

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

  test("of a closed job counts no more", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, overlapping);
    await issueOrder(maker, one.faceId, 1);
    await database().update(job).set({ state: "closed" }).where(eq(job.id, one.jobId));
    expect(await boardOnTable(two)).toMatchObject({ heldBy: [], spokenFor: [] });
  });

  test("on another version of the picture cannot be compared, and is told of all the same", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, overlapping);
    await moveToVersion(maker, one.faceId, one.boardId, await newPicture(maker, one.boardId, "same photo"));
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
  test("over wood that is only laid out elsewhere goes through; the other face is then told that it is issued, piece by piece", async () => {
    const one = await makeLayout(maker, first);
    const two = await besides(one, overlapping);
    await expect(issueOrder(maker, two.faceId, 1)).resolves.toMatchObject({ revision: 1 });
    const { spokenFor } = await boardOnTable(one);
    expect(spokenFor.map(({ faceId, issued }) => [faceId, issued])).toEqual(Array.from({ length: 4 }, () => [two.faceId, true]));
    expect(problems(one.document, [boardFaceOf(await boardOnTable(one))])).toMatchObject([
      { kind: "spoken-for", piece: "p4", spokenForId: `${two.faceId} p1`, over: 77_800, slide: -80_200 },
    ]);
  });

  test("again over one's own wood is no overlap", async () => {
    const one = await makeLayout(maker, first);
    await issueOrder(maker, one.faceId, 1);
    const document = faceLayoutSchema.parse(one.document);
    await saveLayout(maker, one.faceId, { baseRevision: 1, document, crosscutSawId: null, ripSawId: null });
    await expect(issueOrder(maker, one.faceId, 2)).resolves.toMatchObject({ revision: 2 });
  });
});

function boardFaceOf({ boardId, thickness, straightening: { length, width }, spokenFor }: LayoutBoard): BoardFace {
  return { id: boardId, length, width, thickness, outline: null, keepClear: [], spokenFor, glueLines: [] };
}

async function queriesOf<T>(run: () => Promise<T>): Promise<readonly [number, T]> {
  const { pool } = openPool();
  const spies = [vi.spyOn(pool, "query"), vi.spyOn(pool, "execute")];
  const answer = await run();
  const count = spies.reduce((sum, { mock }) => sum + mock.calls.length, 0);
  for (const spy of spies) spy.mockRestore();
  return [count, answer];
}
