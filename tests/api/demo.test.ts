/** The demo is made through the real use cases, shows something on every screen, and is never left half made. In a database of its own. */
import "../support/cookie-jar";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { eq } from "drizzle-orm";
import { getTableConfig } from "drizzle-orm/mysql-core";
import { migrate } from "drizzle-orm/mysql2/migrator";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { openDatabase } from "@/db/client";
import * as schema from "@/db/schema";
import { type BoardFace, problems } from "@/lib/layout";
import { boardQuerySchema } from "@/lib/schemas/board";
import type { Layout } from "@/lib/schemas/layout";
import { currentAccess, type ShopAccess } from "@/lib/server/access";
import { readBoardPage } from "@/lib/server/boards/list-boards";
import { database, openPool } from "@/lib/server/database";
import { readJob, readJobs } from "@/lib/server/jobs/jobs";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { closePlanPool } from "@/lib/server/orders/plan-pool";
import { orderPage, readOrder } from "@/lib/server/orders/read-orders";
import { readLoosePhotos } from "@/lib/server/photos/photos";
import { closePixelPool } from "@/lib/server/pictures/pixel-pool";
import { signIn } from "@/lib/server/sessions";
import { demoBoards, loosePhoto } from "@/scripts/demo/boards";
import { demoJobs } from "@/scripts/demo/jobs";
import { makeDemo } from "@/scripts/demo/make-demo";
import { demoPassword, demoPeople } from "@/scripts/demo/people";
import { photograph } from "@/scripts/demo/photograph";
import type { TakePhoto } from "@/scripts/demo/photographers";
import { removeUnfinished, tablesOfShops } from "@/scripts/demo/unfinished";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";
import { bundlePlanWorker } from "../support/bundle-worker";

const shared = process.env.DATABASE_URL ?? "";
const name = "grainwright_demo_test";
const uploads = fs.mkdtempSync(path.join(os.tmpdir(), "grainwright-demo-"));

async function onSharedServer(...statements: string[]): Promise<void> {
  const { pool } = openDatabase(shared, 1);
  for (const statement of statements) await pool.query(statement);
  await pool.end();
}

beforeAll(async () => {
  // A run that was killed may have left one full of rows that refer to each other.
  await onSharedServer("set foreign_key_checks = 0", `drop database if exists ${name}`, `create database ${name}`);
  const url = new URL(shared);
  url.pathname = name;
  process.env.DATABASE_URL = url.href;
  process.env.UPLOADS_DIR = uploads;
  process.env.LOG_LEVEL = "error";
  await migrate(database(), { migrationsFolder: "migrations" });
  await bundlePixelWorker();
  await bundlePlanWorker();
}, 60_000);
afterAll(async () => {
  await closePixelPool();
  await closePlanPool();
  await openPool().pool.end();
  await onSharedServer(`drop database ${name}`);
  fs.rmSync(uploads, { recursive: true });
});

/** Quick looks: 1080 × 300 pixels and smaller. */
const make = (takePhoto: TakePhoto = photograph) =>
  makeDemo({ db: database(), now: new Date(), takePhoto, photoScale: 0.3, say: () => undefined });

async function signedIn(role: (typeof demoPeople)[number]["role"]): Promise<ShopAccess> {
  const email = demoPeople.find((person) => person.role === role)?.email ?? "";
  await signIn({ email, password: demoPassword }, { address: "192.0.2.7", device: "test" });
  const access = await currentAccess();
  if (!access) throw new Error(`${role} is not signed in`);
  return access;
}

const rowsOf = async (table: ReturnType<typeof tablesOfShops>[number]) => (await database().select().from(table)).length;

describe("broken off while it is made", () => {
  beforeAll(async () => {
    const begun: TakePhoto = (wish) =>
      wish.photo === demoBoards[0]?.photo ? photograph(wish) : Promise.reject(new Error("the camera fell"));
    await expect(make(begun)).rejects.toThrow("the camera fell");
  }, 60_000);

  test("it has rows and files, and nobody can sign in to it", async () => {
    expect(await rowsOf(schema.board)).toBeGreaterThan(0);
    expect(await rowsOf(schema.photo)).toBeGreaterThan(0);
    await expect(signedIn("owner")).rejects.toMatchObject({ code: "not-allowed" });
  });

  test("the next start removes it whole", async () => {
    expect(await removeUnfinished(database())).toBe(1);
    for (const table of [...tablesOfShops(), schema.shop, schema.user]) {
      expect([getTableConfig(table).name, await rowsOf(table)]).toEqual([getTableConfig(table).name, 0]);
    }
    expect(fs.readdirSync(path.join(uploads, "shops"))).toEqual([]);
  });

  test("every table of a shop's own stands before those it refers to", () => {
    const names = tablesOfShops().map((table) => getTableConfig(table).name);
    const known = Object.values(schema).map((table) => getTableConfig(table));
    const owned = known.filter(({ columns }) => columns.some((column) => column.name === "shop_id"));
    expect([...names].sort()).toEqual(owned.map((table) => table.name).sort());
    for (const { name: from, foreignKeys } of owned) {
      for (const key of foreignKeys) {
        const to = getTableConfig(key.reference().foreignTable).name;
        if (names.includes(to) && to !== from) expect(names.indexOf(from)).toBeLessThan(names.indexOf(to));
      }
    }
  });
});

describe("made to the end", () => {
  let maker: ShopAccess;
  beforeAll(async () => {
    await make();
    maker = await signedIn("maker");
  }, 120_000);

  async function layouts(): Promise<Map<string, Layout>> {
    const found = new Map<string, Layout>();
    for (const state of ["open", "closed"] as const) {
      for (const { id } of (await readJobs(maker, { state, search: "", page: 1, pageSize: 100 })).items) {
        for (const face of (await readJob(maker, id)).faceList) found.set(face.title, await readLayout(maker, face.id));
      }
    }
    return found;
  }

  test("everybody can sign in, and the next start leaves it alone", async () => {
    for (const { role, name: person } of demoPeople) expect(await signedIn(role)).toMatchObject({ role, userName: person });
    expect(await removeUnfinished(database())).toBe(0);
  });

  test("every photographed board has its picture, true to its size within a millimetre; one board has none", async () => {
    const { items } = await readBoardPage(maker, boardQuerySchema.parse({ state: "all", pageSize: 100 }));
    expect(items).toHaveLength(demoBoards.length);
    for (const [index, board] of demoBoards.entries()) {
      const row = items[index];
      expect(row?.picture === null).toBe(board.photo === null);
      expect(Math.abs((row?.length ?? 0) / 1000 - board.sizeMm.length)).toBeLessThan(1);
      expect(Math.abs((row?.width ?? 0) / 1000 - board.sizeMm.width)).toBeLessThan(1);
    }
    expect(items.filter(({ picture }) => picture === null)).toHaveLength(1);
    expect((await readLoosePhotos(maker, 50)).map(({ fileName }) => fileName)).toEqual([loosePhoto.fileName]);
  });

  test("one board is at least 1.4 % wetter than every other", async () => {
    const { items } = await readBoardPage(maker, boardQuerySchema.parse({ state: "all", pageSize: 100 }));
    const [wettest = 0, next = 0] = items.map(({ moisturePercent }) => moisturePercent ?? 0).sort((a, b) => b - a);
    expect(wettest - next).toBeGreaterThanOrEqual(1.4 - 1e-9);
  });

  test("knots, sapwood, a sheet and an outline are drawn", async () => {
    const drawn = await database().select({ kind: schema.keepClear.kind }).from(schema.keepClear);
    expect(new Set(drawn.map(({ kind }) => kind))).toEqual(new Set(["knot", "sapwood", "other"]));
    const outlined = await database().select({ outline: schema.straightening.outline }).from(schema.straightening);
    expect(outlined.filter(({ outline }) => outline !== null)).toHaveLength(1);
  });

  test("every face lies on its board, clear of everything but for the one left in trouble", async () => {
    const found = await layouts();
    for (const face of demoJobs.flatMap(({ faces }) => faces)) {
      const layout = found.get(face.title);
      if (!layout) throw new Error(`${face.title} is missing`);
      const kinds = problems(layout.document, layout.boards.map(boardFaceOf)).map(({ kind }) => kind);
      expect([face.title, kinds]).toEqual([face.title, face.leftInTrouble ? ["keep-clear"] : []]);
      expect(layout.document.groups).toHaveLength(face.loose ? 2 : 1);
    }
    expect([...found.keys()].sort()).toEqual(demoJobs.flatMap(({ faces }) => faces.map(({ title }) => title)).sort());
  });

  test("one order is cut, one is begun, one was revised after the bench had begun it", async () => {
    const { items } = await orderPage(maker.shopId, { state: "all", page: 1, pageSize: 100 });
    const byFace = (title: string) => items.find(({ faceTitles }) => faceTitles.includes(title));
    const [cut, begun, revised] = ["Key drawers", "Top row", "Drawer row"].map(byFace);
    expect(cut).toMatchObject({ state: "cut", ticked: cut?.steps });
    expect(begun).toMatchObject({ state: "issued", revision: 1, superseded: false });
    expect(begun?.ticked).toBeGreaterThan(0);
    expect(begun?.ticked).toBeLessThan(begun?.steps ?? 0);
    expect(revised).toMatchObject({ state: "issued", revision: 2, superseded: false, ticked: 0 });
    const before = await readOrder(maker.shopId, revised?.id ?? "", 1);
    expect(before).toMatchObject({ superseded: true, ticked: 1 });
    expect(items).toHaveLength(3);
  });

  test("who did what stands in the history: nothing was put into the tables behind its back", async () => {
    const rows = await database()
      .select({ noun: schema.history.noun, verb: schema.history.verb, userId: schema.history.userId })
      .from(schema.history)
      .where(eq(schema.history.shopId, maker.shopId));
    const times = (noun: string, verb: string) => rows.filter((row) => row.noun === noun && row.verb === verb).length;
    expect(times("board", "entered")).toBe(demoBoards.length);
    expect(times("board", "straightened")).toBe(demoBoards.filter(({ photo }) => photo !== null).length);
    expect(times("job", "opened")).toBe(demoJobs.length);
    expect(times("order", "issued")).toBe(4);
    // The system for what tasks do and for what a change makes out of date.
    const assistant = await signedIn("assistant");
    expect(new Set(rows.map(({ userId }) => userId))).toEqual(new Set([maker.userId, assistant.userId, null]));
  });
});

function boardFaceOf({ boardId, thickness, straightening, spokenFor }: Layout["boards"][number]): BoardFace {
  const { length, width, zones } = straightening;
  return {
    id: boardId,
    length,
    width,
    thickness,
    outline: zones.outline,
    keepClear: zones.keepClear,
    spokenFor,
    glueLines: zones.glueLines.map(({ across }) => across),
  };
}
