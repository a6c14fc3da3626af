/** What photographs say, and searches for wood, through the use cases: scope, what is kept, and what a search leaves behind. */
import sharp from "sharp";
import { v7 as newId } from "uuid";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { defaultWeights, rowFace, SET_ID, umFromMm } from "@/lib/layout";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { closeFigurePool } from "@/lib/server/figure/figure-pool";
import { grainOf } from "@/lib/server/figure/grain";
import { seamReadings } from "@/lib/server/figure/seam-readings";
import { suggestionsOf } from "@/lib/server/figure/suggestions";
import { readLeftOut, readSearch } from "@/lib/server/search/read-search";
import { closeSearchPool } from "@/lib/server/search/search-pool";
import { searchTask } from "@/lib/server/search/search-task";
import { startSearch } from "@/lib/server/search/start-search";
import { storage } from "@/lib/server/storage";
import { bundleWorker } from "../support/bundle-worker";
import { grainPixels } from "../support/grain-pixels";
import { type MadeLayout, makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";

const boardMm = { length: 600, width: 160 };
const never = new AbortController().signal;
const twoFronts = rowFace([umFromMm(200), umFromMm(200)], umFromMm(100), umFromMm(3), "horizontal");

let maker: ShopAccess;
let stranger: ShopAccess;
let made: MadeLayout;

beforeAll(async () => {
  await bundleWorker("lib/server/figure/figure-worker.ts", ["lib/server/figure", "lib/layout"]);
  await bundleWorker("lib/server/search/search-worker.ts", ["lib/server/search", "lib/layout"]);
  maker = (await makeShop()).maker;
  stranger = (await makeShop()).maker;
  made = await makeLayout(maker, {
    face: twoFronts,
    boardMm,
    at: { x: umFromMm(80), y: umFromMm(30) },
    levels: [await picture()],
  });
});
afterAll(async () => {
  await closeFigurePool();
  await closeSearchPool();
});

async function picture() {
  const [widthPx, heightPx] = [boardMm.length * 4, boardMm.width * 4];
  const pixels = sharp(grainPixels(widthPx, heightPx), { raw: { width: widthPx, height: heightPx, channels: 3 } });
  const key = `tests/figure/${newId()}.png`;
  await storage().put(key, new Uint8Array(await pixels.png().toBuffer()));
  return { level: 0, key, widthPx, heightPx };
}

/** As the work loop would. */
async function workOff(searchId: string): Promise<void> {
  const { taskId } = await readSearch(maker, searchId);
  const context = { shopId: maker.shopId, taskId, createdBy: maker.userId, signal: never, onProgress: () => {} };
  const keep = await searchTask.work({ searchId }, context);
  await keep(database(), new Date());
}

const asked = { groupId: SET_ID, weights: { ...defaultWeights }, species: null, leastThickness: null, mostThickness: null };

describe("what photographs say", () => {
  test("a seam of fronts cut at their gap from one board reads as running on, with no difference in tone", async () => {
    const { revision, items } = await seamReadings(maker, made.faceId, never);
    expect(revision).toBe(1);
    expect(items.map(({ a, b }) => `${a} ${b}`)).toEqual(["p1 p2"]);
    expect(items[0]?.figure).toMatchObject({ kind: "read" });
    const figure = items[0]?.figure;
    if (figure?.kind !== "read") throw new Error("the seam was not read");
    expect(Math.abs(figure.step)).toBeLessThan(1000);
    expect(figure.peak).toBeGreaterThan(0.6);
    expect(items[0]?.tone).toBeLessThan(3);
  });

  test("the grain is read once and kept beside the picture", async () => {
    const first = await grainOf(maker, made.straighteningId, never);
    expect(first).toMatchObject({ columns: 60, rows: 16 });
    expect(await storage().exists(`shops/${maker.shopId}/straightenings/${made.straighteningId}/grain-2.json`)).toBe(true);
    expect(await grainOf(maker, made.straighteningId, never)).toEqual(first);
    // The drawn rings rise by 7 · 3 / 90 at the most: 13 degrees.
    expect(Math.max(...first.directionDeg.map(Math.abs))).toBeLessThan(25);
  });

  test("plain rings are no knots", async () => {
    expect((await suggestionsOf(maker, made.straighteningId, never)).items).toEqual([]);
  });

  test("another shop's face and picture are not found", async () => {
    await expect(seamReadings(stranger, made.faceId, never)).rejects.toMatchObject({ code: "not-found" });
    await expect(grainOf(stranger, made.straighteningId, never)).rejects.toMatchObject({ code: "not-found" });
    await expect(suggestionsOf(stranger, made.straighteningId, never)).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("a search for wood", () => {
  test("offers places on the board, best first, compared with the present one", async () => {
    const { searchId } = await startSearch(maker, made.faceId, { ...asked, boardId: made.boardId });
    await workOff(searchId);
    const search = await readSearch(maker, searchId);
    expect(search).toMatchObject({ scope: "board", boards: 1, searched: 1, leftOut: 0 });
    const finding = search.found[0]?.finding;
    const totals = finding?.places.map(({ total }) => total) ?? [];
    expect(totals.length).toBeGreaterThan(1);
    expect(totals).toEqual([...totals].sort((p, q) => q - p));
    expect(finding?.present?.allowed).toBe(true);
    expect(totals[0]).toBeGreaterThanOrEqual(finding?.present?.total ?? 1);
  });

  test("of the rack says why a board was left out, and takes the place of the search before", async () => {
    await makeLayout(maker, { face: twoFronts, boardMm: { length: 300, width: 160 }, at: null, levels: [] });
    const { searchId } = await startSearch(maker, made.faceId, { ...asked, boardId: null });
    await workOff(searchId);
    const { items, total } = await readLeftOut(maker, searchId, 1);
    expect(total).toBe(1);
    expect(items[0]?.reasons).toContainEqual({ reason: "too-short", by: umFromMm(103) });
    const later = await startSearch(maker, made.faceId, { ...asked, boardId: null });
    expect((await readSearch(maker, searchId)).state).toBe("cancelled");
    expect((await readSearch(maker, later.searchId)).state).toBe("queued");
  });

  test("begun again searches only the boards that wait", async () => {
    const { searchId } = await startSearch(maker, made.faceId, { ...asked, boardId: made.boardId });
    await workOff(searchId);
    const before = await readSearch(maker, searchId);
    await workOff(searchId);
    expect(await readSearch(maker, searchId)).toEqual(before);
  });

  test("another shop's face and search are not found", async () => {
    await expect(startSearch(stranger, made.faceId, { ...asked, boardId: null })).rejects.toMatchObject({ code: "not-found" });
    const { searchId } = await startSearch(maker, made.faceId, { ...asked, boardId: null });
    await expect(readSearch(stranger, searchId)).rejects.toMatchObject({ code: "not-found" });
    await expect(readLeftOut(stranger, searchId, 1)).rejects.toMatchObject({ code: "not-found" });
  });

  test("is refused for pieces that are no group any more", async () => {
    const wanted = { ...asked, groupId: "loose-9", boardId: null };
    await expect(startSearch(maker, made.faceId, wanted)).rejects.toMatchObject({ code: "refused" });
  });
});
