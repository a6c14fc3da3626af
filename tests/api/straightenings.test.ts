/** Versions of a board's picture: marks judged at once, pixels made as a task that can be stopped, killed and taken up again, zones. */
import "../support/cookie-jar";
import { setTimeout as sleep } from "node:timers/promises";
import { and, eq } from "drizzle-orm";
import sharp from "sharp";
import { v7 as newId } from "uuid";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import * as versionsRoute from "@/app/api/boards/[boardId]/straightenings/route";
import * as levelRoute from "@/app/api/straightenings/[straighteningId]/levels/[level]/route";
import * as versionRoute from "@/app/api/straightenings/[straighteningId]/route";
import * as zonesRoute from "@/app/api/straightenings/[straighteningId]/zones/route";
import * as cancelRoute from "@/app/api/tasks/[taskId]/cancel/route";
import * as taskRoute from "@/app/api/tasks/[taskId]/route";
import { listHistory } from "@/db/queries/history";
import { findTask } from "@/db/queries/task";
import { history, keepClear, straightening, task } from "@/db/schema";
import { type Marking, um, umFromMm } from "@/lib/layout";
import type { Role } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/straightening";
import { cancelTask as cancelEndpoint, getTask } from "@/lib/schemas/task";
import type { Zones } from "@/lib/schemas/zones";
import type { ShopAccess } from "@/lib/server/access";
import { readBoard } from "@/lib/server/boards/read-board";
import { database } from "@/lib/server/database";
import { closePixelPool } from "@/lib/server/pictures/pixel-pool";
import { storage } from "@/lib/server/storage";
import { saveZones } from "@/lib/server/straightenings/save-zones";
import { startStraightening } from "@/lib/server/straightenings/start-straightening";
import { straightenTask } from "@/lib/server/straightenings/straighten-task";
import { readStraightening } from "@/lib/server/straightenings/straightenings";
import { kinds } from "@/lib/server/tasks/kinds";
import { runTask } from "@/lib/server/tasks/run-task";
import { cancelTask } from "@/lib/server/tasks/tasks";
import { workLoop } from "@/lib/server/tasks/work-loop";
import { actAs } from "../support/act-as";
import { ask } from "../support/ask";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";
import { makeShop } from "../support/make-shop";
import { enter, filesOf, point, soundMarking, takeIn, wire } from "../support/rack";

type Shop = Awaited<ReturnType<typeof makeShop>>;
let shop: Shop;
let other: Shop;
beforeAll(async () => {
  await bundlePixelWorker();
  shop = await makeShop();
  other = await makeShop();
}, 60_000);
afterAll(closePixelPool);

const picturesOf = (access: ShopAccess) => filesOf(access).filter((file) => file.startsWith("straightenings/"));
const verbsOf = async ({ shopId }: ShopAccess, boardId: string) =>
  (await listHistory(database(), shopId, { noun: "board", nounId: boardId, limit: 50 })).map(({ verb }) => verb).reverse();

async function marked(access: ShopAccess, marking: Marking = soundMarking, boardId?: string) {
  const photo = await takeIn(access);
  const id = boardId ?? (await enter(access)).id;
  const started = await startStraightening(access, id, { photoId: photo.id, marking: wire(marking) });
  return { boardId: id, photoId: photo.id, id: started.id, taskId: started.taskId ?? "", started };
}

/** Claims this very task, as the queue would, and works it off here. */
async function workOff(access: ShopAccess, taskId: string, ending = new AbortController().signal): Promise<void> {
  const claim = { state: "running", claimId: newId(), attempts: 1, leaseUntil: new Date(Date.now() + 30_000) } as const;
  await database()
    .update(task)
    .set(claim)
    .where(and(eq(task.id, taskId), eq(task.state, "queued")));
  const row = await findTask(database(), access.shopId, taskId);
  if (!row) throw new Error("no such task");
  await runTask(database(), kinds.straighten, row, ending);
}

async function done(access: ShopAccess, marking: Marking = soundMarking, boardId?: string) {
  const made = await marked(access, marking, boardId);
  await workOff(access, made.taskId);
  return { ...made, version: await readStraightening(access, made.id) };
}

describe("marks", () => {
  test("that are sound make a version that waits, with its task and its history, at once", async () => {
    const { maker } = shop;
    const { boardId, started, taskId } = await marked(maker);
    expect(started).toMatchObject({ version: 1, state: "waiting", length: 1_200_000, width: 200_000, levels: [] });
    expect(await findTask(database(), maker.shopId, taskId)).toMatchObject({
      state: "queued",
      payload: { straighteningId: started.id },
    });
    expect(await verbsOf(maker, boardId)).toEqual(["entered", "marked"]);
  });

  const { corners } = soundMarking;
  const [a, b, c, d] = corners;
  test.each<[string, Marking["corners"], RegExp]>([
    ["crossed over", [b, a, c, d], /cross/],
    ["the wrong way round", [d, c, b, a], /mirror/],
    ["on one spot", [a, a, a, a], /shortest side has 0 px/],
    ["far outside", [a, { x: 2900, y: 100 }, c, d], /1600 px outside the photograph/],
    ["pushed in", [a, b, { x: 400, y: 180 }, d], /points inwards/],
  ])("%s are refused in words, and nothing waits", async (_, wrong, words) => {
    const { maker } = shop;
    const photo = await takeIn(maker);
    const { id } = await enter(maker);
    await actAs(maker);
    const answer = await ask(versionsRoute.POST, endpoint.startStraightening, {
      params: { boardId: id },
      body: { photoId: photo.id, marking: wire({ ...soundMarking, corners: wrong }) },
    });
    expect(answer).toMatchObject({ status: 422, body: { code: "refused", title: expect.stringMatching(words) } });
    expect(await database().select().from(straightening).where(eq(straightening.boardId, id))).toEqual([]);
    expect(await verbsOf(maker, id)).toEqual(["entered"]);
  });

  test("sent by two makers at once get two versions", async () => {
    const { maker } = shop;
    const { id } = await enter(maker);
    const both = await Promise.all([marked(maker, soundMarking, id), marked(maker, soundMarking, id)]);
    expect(both.map(({ started }) => started.version).sort()).toEqual([1, 2]);
  });
});

describe("the task", () => {
  test("makes an upright picture true to scale in levels, and the board takes its size from it", async () => {
    const { maker } = await makeShop();
    const { boardId } = await enter(maker, { length: null, width: null }).then(({ id }) => ({ boardId: id }));
    const { version } = await done(maker, soundMarking, boardId);
    expect(version).toMatchObject({ state: "done", length: 1_200_000, width: 200_000, residual: 0, taskId: null });
    const [full] = version.levels;
    expect(full?.widthPx).toBe(Math.round(1200 * version.pxPerMm));
    expect(full?.heightPx).toBe(Math.round(200 * version.pxPerMm));
    expect(picturesOf(maker)).toEqual(version.levels.map((_, level) => `straightenings/${version.id}/level-${level}.jpg`).sort());

    const board = await readBoard(maker, boardId);
    expect(board).toMatchObject({ length: 1_200_000, width: 200_000, straighteningId: version.id });
    expect(board.picture?.url).toMatch(`/api/straightenings/${version.id}/levels/`);
    expect(await verbsOf(maker, boardId)).toEqual(["entered", "marked", "straightened"]);

    await actAs(maker);
    const served = await levelRoute.GET(new Request(new URL(full?.url ?? "", "http://here.example")), {
      params: Promise.resolve({ straighteningId: version.id, level: "0" }),
    });
    expect(await sharp(new Uint8Array(await served.arrayBuffer())).metadata()).toMatchObject({
      format: "jpeg",
      width: full?.widthPx,
      height: full?.heightPx,
    });
    expect(served.headers.get("cache-control")).toContain("immutable");
  });

  test("stopped before anybody began ends at once and leaves nothing", async () => {
    const { maker } = await makeShop();
    const { boardId, id, taskId } = await marked(maker);
    await actAs(maker);
    const answer = await ask(cancelRoute.POST, cancelEndpoint, { params: { taskId } });
    expect(answer).toMatchObject({ status: 200, body: { state: "cancelled" } });
    expect(await readStraightening(maker, id)).toMatchObject({ state: "cancelled", failure: null });
    expect(picturesOf(maker)).toEqual([]);
    expect(await verbsOf(maker, boardId)).toEqual(["entered", "marked", "straightening cancelled"]);
    expect((await readBoard(maker, boardId)).straighteningId).toBeNull();
  });

  test("stopped while it runs keeps no file and shows no picture", async () => {
    const { maker } = await makeShop();
    const { id, taskId, boardId } = await marked(maker);
    // The wish comes while the first level is being written, which is held until the worker has asked after it (every 2 s).
    const put = vi.spyOn(storage(), "put").mockImplementationOnce(async (key, content) => {
      put.mockRestore();
      await cancelTask(maker, taskId);
      await sleep(4000);
      await storage().put(key, content);
    });
    await workOff(maker, taskId);
    expect(await findTask(database(), maker.shopId, taskId)).toMatchObject({ state: "cancelled" });
    expect(await readStraightening(maker, id)).toMatchObject({ state: "cancelled", levels: [] });
    expect(picturesOf(maker)).toEqual([]);
    expect((await readBoard(maker, boardId)).straighteningId).toBeNull();
  });

  test("killed halfway is taken up again when its lease is over, and leaves one set of files", async () => {
    const { maker } = await makeShop();
    const { id, taskId, boardId } = await marked(maker);
    // What a killed worker leaves: a claim nobody renews, and some of the files, one of them of a run with other levels.
    const past = new Date(Date.now() - 1000);
    await database()
      .update(task)
      .set({ state: "running", claimId: newId(), attempts: 1, leaseUntil: past, progress: 0.6 })
      .where(eq(task.id, taskId));
    await storage().put(`shops/${maker.shopId}/straightenings/${id}/level-0.jpg`, new Uint8Array([1, 2, 3]));
    await storage().put(`shops/${maker.shopId}/straightenings/${id}/level-9.jpg`, new Uint8Array([1, 2, 3]));

    const ending = new AbortController();
    const loop = workLoop(database(), kinds, ending.signal);
    await vi.waitFor(async () => expect((await findTask(database(), maker.shopId, taskId))?.state).toBe("done"), {
      timeout: 15_000,
    });
    ending.abort();
    await loop;

    const version = await readStraightening(maker, id);
    expect(version.state).toBe("done");
    expect(await findTask(database(), maker.shopId, taskId)).toMatchObject({ attempts: 2, progress: 1 });
    expect(picturesOf(maker)).toEqual(version.levels.map((_, level) => `straightenings/${id}/level-${level}.jpg`).sort());
    const level = await storage().get(`shops/${maker.shopId}/straightenings/${id}/level-0.jpg`);
    expect((await sharp(level ?? new Uint8Array()).metadata()).width).toBe(version.levels[0]?.widthPx);
    expect(await verbsOf(maker, boardId)).toEqual(["entered", "marked", "straightened"]);
  });

  test("whose process is asked to end goes back to the queue and is done by the next", async () => {
    const { maker } = await makeShop();
    const { taskId } = await marked(maker);
    const ending = new AbortController();
    const put = vi.spyOn(storage(), "put").mockImplementationOnce(async () => {
      put.mockRestore();
      ending.abort();
    });
    await workOff(maker, taskId, ending.signal);
    expect(await findTask(database(), maker.shopId, taskId)).toMatchObject({ state: "queued", attempts: 0, leaseUntil: null });
    await workOff(maker, taskId);
    expect((await findTask(database(), maker.shopId, taskId))?.state).toBe("done");
  });

  test("that fails says so in words without a path or a stack, and leaves no file", async () => {
    const { maker } = await makeShop();
    const { id, taskId, boardId } = await marked(maker);
    for (const file of filesOf(maker)) if (file.endsWith("original")) await storage().remove(`shops/${maker.shopId}/${file}`);
    await workOff(maker, taskId);
    const version = await readStraightening(maker, id);
    expect(version).toMatchObject({ state: "failed", failure: expect.stringMatching(/went wrong on our side/) });
    expect(version.failure).not.toMatch(/shops\/|original/);
    expect(picturesOf(maker)).toEqual([]);
    expect(await verbsOf(maker, boardId)).toEqual(["entered", "marked", "straightening failed"]);
  });

  test("that cannot write its history keeps nothing: picture, board and history stand or fall together", async () => {
    const { maker } = await makeShop();
    const { id, taskId, boardId } = await marked(maker);
    const spy = vi.spyOn(await import("@/db/queries/history"), "recordHistory").mockRejectedValueOnce(new Error("disk full"));
    await workOff(maker, taskId);
    spy.mockRestore();
    expect(await readStraightening(maker, id)).toMatchObject({ state: "failed", levels: [] });
    expect((await readBoard(maker, boardId)).straighteningId).toBeNull();
    expect(picturesOf(maker)).toEqual([]);
  });

  test("of an earlier marking that ends later does not take the picture back", async () => {
    const { maker } = await makeShop();
    const early = await marked(maker);
    const late = await done(maker, soundMarking, early.boardId);
    await workOff(maker, early.taskId);
    expect((await readBoard(maker, early.boardId)).straighteningId).toBe(late.id);
    expect((await readStraightening(maker, early.id)).state).toBe("done");
  });

  test("does not begin for a version that waits no longer", async () => {
    const { maker } = await makeShop();
    const { id } = await done(maker);
    const context = {
      shopId: maker.shopId,
      taskId: newId(),
      createdBy: null,
      signal: new AbortController().signal,
      onProgress: () => {},
    };
    await expect(straightenTask.work({ straighteningId: id }, context)).rejects.toThrow("went wrong on our side");
    expect(picturesOf(maker)).not.toEqual([]);
  });
});

describe("zones", () => {
  let maker: ShopAccess;
  let id: string;
  let boardId: string;
  beforeAll(async () => {
    maker = (await makeShop()).maker;
    ({ id, boardId } = await done(maker));
  }, 30_000);

  const knot = (centre = point(400, 190)): Zones["keepClear"][number] => ({
    id: newId(),
    kind: "knot",
    area: { shape: "ellipse", centre, radiusX: umFromMm(20), radiusY: umFromMm(14), turnDeg: 12 },
    note: "dead, falls out",
  });
  const outline = [point(0, 10), point(1200, 0), point(1190, 200), point(20, 190)];
  const revision = async () => (await readStraightening(maker, id)).zones.revision;

  test("are saved as one, and read back as they were drawn", async () => {
    const glueLines = [70, 120].map((mm) => ({ id: newId(), across: umFromMm(mm), aboveBoardId: null, belowBoardId: null }));
    const zones = { outline, keepClear: [knot()], glueLines, revision: await revision() };
    const saved = await saveZones(maker, id, zones);
    expect(saved.revision).toBe(zones.revision + 1);
    expect((await readStraightening(maker, id)).zones).toEqual({ ...zones, revision: zones.revision + 1 });
    expect((await verbsOf(maker, boardId)).at(-1)).toBe("areas drawn");
  });

  test("with glue lines make the board a blank; without any, a board again; lines that are not sent stay", async () => {
    const line = { id: newId(), across: umFromMm(90), aboveBoardId: boardId, belowBoardId: null };
    await saveZones(maker, id, { outline: null, keepClear: [], glueLines: [line], revision: await revision() });
    expect((await readBoard(maker, boardId)).kind).toBe("blank");
    await saveZones(maker, id, { outline: null, keepClear: [], revision: await revision() });
    // Which board lies where is known from gluing it up only, not from what is sent.
    expect((await readStraightening(maker, id)).zones.glueLines).toEqual([{ ...line, aboveBoardId: null }]);
    await saveZones(maker, id, { outline: null, keepClear: [], glueLines: [], revision: await revision() });
    expect(await readBoard(maker, boardId)).toMatchObject({ kind: "board", blank: null });
    const off = { ...line, id: newId(), across: umFromMm(200) };
    await expect(
      saveZones(maker, id, { outline: null, keepClear: [], glueLines: [off], revision: await revision() }),
    ).rejects.toMatchObject({ code: "refused", message: expect.stringContaining("Glue line 1 lies off the board") });
  });

  test("from an old revision are a conflict that names the present one, and change nothing", async () => {
    const before = (await readStraightening(maker, id)).zones;
    await actAs(maker);
    const answer = await ask(zonesRoute.PUT, endpoint.saveZones, {
      params: { straighteningId: id },
      body: { outline: null, keepClear: [], revision: before.revision - 1 },
    });
    expect(answer).toMatchObject({ status: 409, body: { detail: { revision: before.revision } } });
    expect((await readStraightening(maker, id)).zones).toEqual(before);
  });

  test("saved twice from one revision at the same time are taken once", async () => {
    const base = await revision();
    const results = await Promise.allSettled(
      [1, 2, 3].map(() => saveZones(maker, id, { outline, keepClear: [knot()], revision: base })),
    );
    expect(results.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    expect(await database().select().from(keepClear).where(eq(keepClear.straighteningId, id))).toHaveLength(1);
  });

  test.each<[string, Partial<Zones>, RegExp]>([
    [
      "an outline that crosses itself",
      { outline: [point(0, 0), point(1000, 200), point(1000, 0), point(0, 200)] },
      /crosses itself at 500\.0 mm along and 100\.0 mm across/,
    ],
    [
      "an outline that leaves the board",
      { outline: [point(0, 0), point(1204.5, 0), point(600, 200)] },
      /leaves the board by 4\.5 mm at 1204\.5 mm along and 0\.0 mm across/,
    ],
    [
      "an outline with a doubled corner",
      { outline: [point(0, 0), point(0, 0), point(600, 200)] },
      /two corners on the same place/,
    ],
    ["an outline that runs back over itself", { outline: [point(0, 0), point(600, 0), point(300, 0)] }, /crosses itself/],
    [
      "an area wholly off the board",
      {
        keepClear: [
          {
            id: "0198c0de-0000-7000-8000-000000000001",
            kind: "stain",
            note: "",
            area: { shape: "ellipse", centre: point(1300, 100), radiusX: um(20_000), radiusY: um(20_000), turnDeg: 0 },
          },
        ],
      },
      /Area 1 lies wholly off the board/,
    ],
    [
      "an area that crosses itself",
      {
        keepClear: [
          {
            id: "0198c0de-0000-7000-8000-000000000002",
            kind: "check",
            note: "",
            area: { shape: "polygon", points: [point(10, 10), point(30, 30), point(30, 10), point(10, 30)] },
          },
        ],
      },
      /Area 1 crosses itself/,
    ],
  ])("refuse %s, saying where", async (_, wrong, words) => {
    const before = (await readStraightening(maker, id)).zones;
    const saving = saveZones(maker, id, { outline: null, keepClear: [], ...wrong, revision: before.revision });
    await expect(saving).rejects.toMatchObject({ code: "refused", message: expect.stringMatching(words) });
    expect((await readStraightening(maker, id)).zones).toEqual(before);
  });

  test("refuse two areas of one id, and an id of another version's area", async () => {
    const twice = knot();
    const base = await revision();
    await expect(saveZones(maker, id, { outline: null, keepClear: [twice, twice], revision: base })).rejects.toMatchObject({
      code: "refused",
    });
    expect(await revision()).toBe(base);
  });

  test("wait for the picture", async () => {
    const waiting = await marked(maker);
    await expect(saveZones(maker, waiting.id, { outline: null, keepClear: [], revision: 0 })).rejects.toMatchObject({
      code: "refused",
    });
  });

  test("go along to the next version: what fits as it is, an outline cut to the new size, what lies off it dropped, all told", async () => {
    const knots = [knot(point(400, 190)), knot(point(1180, 100))];
    await saveZones(maker, id, { outline, keepClear: knots, revision: await revision() });
    const shorter: Marking = { ...soundMarking, reference: { kind: "board", length: umFromMm(1100), width: umFromMm(200) } };
    const next = await done(maker, shorter, boardId);
    expect(next.version.version).toBe(2);
    expect(next.version.zones.keepClear).toMatchObject([{ kind: "knot", note: "dead, falls out", area: knots[0]?.area }]);
    expect(next.version.zones.keepClear[0]?.id).not.toBe(knots[0]?.id);
    const xs = next.version.zones.outline?.map(({ x }) => x) ?? [];
    expect(Math.max(...xs)).toBe(1_100_000);
    expect(next.version.zones.outline).toContainEqual(point(0, 10));
    const [told] = await listHistory(database(), maker.shopId, { noun: "board", nounId: boardId, limit: 1 });
    expect(told).toMatchObject({ verb: "straightened", detail: { areasFrom: 1, outline: "cut", areasKept: 1, areasDropped: 1 } });
    // The version before keeps what was drawn on it: layouts made on it lie there still.
    expect((await readStraightening(maker, id)).zones.keepClear).toHaveLength(2);
  });
});

describe("who may", () => {
  const calls = {
    start: ({ boardId, photoId }: Made) =>
      ask(versionsRoute.POST, endpoint.startStraightening, {
        params: { boardId },
        body: { photoId, marking: wire(soundMarking) },
      }),
    list: ({ boardId }: Made) => ask(versionsRoute.GET, endpoint.listStraightenings, { params: { boardId } }),
    read: ({ id }: Made) => ask(versionRoute.GET, endpoint.getStraightening, { params: { straighteningId: id } }),
    level: ({ id }: Made) => ask(levelRoute.GET, endpoint.getStraighteningLevel, { params: { straighteningId: id, level: 0 } }),
    zones: ({ id, zonesRevision }: Made) =>
      ask(zonesRoute.PUT, endpoint.saveZones, {
        params: { straighteningId: id },
        body: { outline: null, keepClear: [], revision: zonesRevision },
      }),
    task: ({ taskId }: Made) => ask(taskRoute.GET, getTask, { params: { taskId } }),
    cancel: ({ taskId }: Made) => ask(cancelRoute.POST, cancelEndpoint, { params: { taskId } }),
  };
  type Made = Awaited<ReturnType<typeof done>> & { zonesRevision: number };
  let made: Made;
  beforeAll(async () => {
    made = { ...(await done(shop.owner)), zonesRevision: 0 };
  }, 30_000);

  test.each<[Role, Record<keyof typeof calls, number>]>([
    ["owner", { start: 200, list: 200, read: 200, level: 200, zones: 200, task: 200, cancel: 200 }],
    ["maker", { start: 200, list: 200, read: 200, level: 200, zones: 200, task: 200, cancel: 200 }],
    ["assistant", { start: 403, list: 200, read: 200, level: 200, zones: 403, task: 200, cancel: 403 }],
  ])("%s", async (role, expected) => {
    await actAs(shop[role]);
    made.zonesRevision = (await readStraightening(shop.owner, made.id)).zones.revision;
    const statuses: Record<string, number> = {};
    for (const [name, make] of Object.entries(calls)) statuses[name] = (await make(made)).status;
    expect(statuses).toEqual(expected);
  });

  test("another shop's board, photograph, version, level, zones and task are not found", async () => {
    await actAs(other.owner);
    for (const make of Object.values(calls)) expect((await make(made)).status).toBe(404);
    // A board of one's own does not open another shop's photograph.
    const mine = await enter(other.owner);
    const answer = await calls.start({ ...made, boardId: mine.id });
    expect(answer.status).toBe(404);
    expect(await database().select().from(history).where(eq(history.nounId, mine.id))).toHaveLength(1);
  });
});
