/** Boards of the rack: tags, facts, readings, holds, finding them among ten thousand. */
import "../support/cookie-jar";
import { eq, sql } from "drizzle-orm";
import { v7 as newId } from "uuid";
import { beforeAll, describe, expect, test, vi } from "vitest";
import { z } from "zod";
import * as readingsRoute from "@/app/api/boards/[boardId]/readings/route";
import * as boardRoute from "@/app/api/boards/[boardId]/route";
import * as boardsRoute from "@/app/api/boards/route";
import { boardPageOf } from "@/db/queries/board";
import { listHistory } from "@/db/queries/history";
import { board, history, job } from "@/db/schema";
import { um, umFromMm } from "@/lib/layout";
import * as endpoint from "@/lib/schemas/board";
import type { Role } from "@/lib/schemas/endpoint";
import type { ShopAccess } from "@/lib/server/access";
import { addReading } from "@/lib/server/boards/add-reading";
import { changeBoard } from "@/lib/server/boards/change-board";
import { readBoardPage } from "@/lib/server/boards/list-boards";
import { readBoard } from "@/lib/server/boards/read-board";
import { database, openPool } from "@/lib/server/database";
import { actAs } from "../support/act-as";
import { ask } from "../support/ask";
import { makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";
import { enter, newBoard } from "../support/rack";

type Shop = Awaited<ReturnType<typeof makeShop>>;
let shop: Shop;
let other: Shop;
beforeAll(async () => {
  shop = await makeShop();
  other = await makeShop();
});

const page = (access: ShopAccess, query: Partial<endpoint.BoardQuery> = {}) =>
  readBoardPage(access, endpoint.boardQuerySchema.parse(query));
const tagsOf = ({ items }: Awaited<ReturnType<typeof page>>) => items.map(({ tag }) => tag);

describe("entering a board", () => {
  test("gives the next tag of the shop, three digits at least", async () => {
    const { owner } = await makeShop();
    expect((await enter(owner)).tag).toBe("B-041");
    expect((await enter(owner)).tag).toBe("B-042");
  });

  test("never gives a tag twice, also when twelve are entered at once", async () => {
    const { maker } = await makeShop();
    const boards = await Promise.all(Array.from({ length: 12 }, () => enter(maker)));
    expect(new Set(boards.map(({ tag }) => tag)).size).toBe(12);
  });

  test("keeps the first reading and reckons board feet by the nominal thickness", async () => {
    await actAs(shop.maker);
    const answer = await ask(boardsRoute.POST, endpoint.createBoard, {
      body: {
        ...newBoard,
        nominalQuarters: 8,
        thickness: 47_000,
        length: 3_048_000,
        width: 152_400,
        reading: { percent: 8.14, takenOn: "2026-03-02" },
      },
    });
    const entered = endpoint.boardSchema.parse(answer.body);
    // 6 in × 10 ft ÷ 12 × 2 in as sold; 47 mm as measured.
    expect(entered.boardFeet).toBe(10);
    expect(entered.volumeBoardFeet).toBeCloseTo((5 * 47) / 25.4, 9);
    expect(entered.moisturePercent).toBe(8.1);
    expect(entered.readings).toMatchObject([{ percent: 8.1, takenOn: "2026-03-02", takenBy: shop.maker.userName }]);
  });

  test("takes a board that nobody has measured yet", async () => {
    const entered = await enter(shop.maker, { length: null, width: null });
    expect(entered).toMatchObject({ length: 0, width: 0, boardFeet: 0, volumeBoardFeet: 0 });
  });

  test("counts board feet by the rule's published example: 2 in × 6 1⁄4 in × 8 ft is 4 1⁄6 square feet, counted 4, so 8", async () => {
    const [inch, foot] = [25_400, 304_800];
    const size = { nominalQuarters: 8, thickness: um(2 * inch), width: um(6.25 * inch), length: um(8 * foot) };
    const access = (await makeShop()).maker;
    await enter(access, size);
    const [row] = (await page(access)).items;
    expect(row?.boardFeet).toBe(8);
    expect(row?.volumeBoardFeet).toBeCloseTo(8 + 1 / 3, 9);
  });

  test("turns exact halves up and down by turns of the tags, and keeps a board's count", async () => {
    const size = { nominalQuarters: 4, width: um(5.5 * 25_400), length: um(12 * 304_800) };
    const access = (await makeShop()).maker;
    const [one, two] = [await enter(access, size), await enter(access, size)];
    expect([one.boardFeet, two.boardFeet].sort()).toEqual([5, 6]);
    expect((await readBoard(access, one.id)).boardFeet).toBe(one.boardFeet);
  });

  test.each([
    ["an empty species", { species: "  " }],
    ["a negative length", { length: -1 }],
    ["a thickness of 0", { thickness: 0 }],
  ])("refuses %s and enters nothing", async (_, wrong) => {
    await actAs(shop.owner);
    const before = (await page(shop.owner)).total;
    const answer = await ask(boardsRoute.POST, endpoint.createBoard, { body: { ...newBoard, ...wrong, reading: null } });
    expect(answer.status).toBe(400);
    expect((await page(shop.owner)).total).toBe(before);
  });
});

describe("changing a board", () => {
  test("writes what differs into the history, with the change", async () => {
    const { id, revision } = await enter(shop.maker);
    const changed = await changeBoard(shop.maker, id, { baseRevision: revision, place: "rack 3", species: newBoard.species });
    expect(changed).toMatchObject({ place: "rack 3", revision: revision + 1 });
    const [row] = await listHistory(database(), shop.maker.shopId, { noun: "board", nounId: id, limit: 1 });
    expect(row).toMatchObject({ verb: "changed", detail: { before: { place: "rack 2 left" }, after: { place: "rack 3" } } });
  });

  test("from an old revision is a conflict that names the present one and changes nothing", async () => {
    const { id, revision } = await enter(shop.maker);
    await changeBoard(shop.owner, id, { baseRevision: revision, place: "rack 3" });
    await actAs(shop.maker);
    const answer = await ask(boardRoute.PATCH, endpoint.updateBoard, {
      params: { boardId: id },
      body: { baseRevision: revision, place: "rack 9" },
    });
    expect(answer).toMatchObject({ status: 409, body: { code: "conflict", detail: { revision: revision + 1 } } });
    expect((await readBoard(shop.maker, id)).place).toBe("rack 3");
    expect(await listHistory(database(), shop.maker.shopId, { noun: "board", nounId: id, limit: 9 })).toHaveLength(2);
  });

  test("takes a size by hand only while no picture tells it", async () => {
    const { id } = await enter(shop.maker, { length: null, width: null });
    const sized = await changeBoard(shop.maker, id, { baseRevision: 1, length: umFromMm(900), width: umFromMm(150) });
    expect(sized.length).toBe(900_000);
    const { boardId } = await makeLayout(shop.maker);
    await expect(changeBoard(shop.maker, boardId, { baseRevision: 1, length: umFromMm(800) })).rejects.toMatchObject({
      code: "refused",
    });
  });
});

describe("moisture readings", () => {
  test("the latest by date is the board's, whatever the order they are written in; the revision stays", async () => {
    const { id } = await enter(shop.maker);
    await addReading(shop.assistant, id, { percent: 9.6, takenOn: "2026-02-20" });
    const read = await addReading(shop.assistant, id, { percent: 11.2, takenOn: "2026-01-10" });
    expect(read.moisturePercent).toBe(9.6);
    expect(read.readings.map(({ percent }) => percent)).toEqual([9.6, 11.2]);
    expect(read.revision).toBe(1);
  });
});

describe("what holds a board", () => {
  test("an open job's face on whose table it lies; a closed job lets it go", async () => {
    const { maker } = await makeShop();
    const free = await enter(maker);
    const { boardId, faceId, jobId } = await makeLayout(maker, { jobTitle: "Map chest" });
    const held = await readBoard(maker, boardId);
    expect(held.held).toEqual([{ faceId, faceTitle: "Top row", jobId, jobTitle: "Map chest" }]);
    expect(tagsOf(await page(maker, { free: "yes" }))).toEqual([free.tag]);
    expect(tagsOf(await page(maker, { free: "no" }))).toEqual([held.tag]);
    await database().update(job).set({ state: "closed" }).where(eq(job.id, jobId));
    expect(tagsOf(await page(maker, { free: "no" }))).toEqual([]);
  });
});

describe("finding boards", () => {
  let rack: Shop;
  beforeAll(async () => {
    rack = await makeShop();
    const { maker } = rack;
    await enter(maker, { species: "White oak", cut: "quarter", length: umFromMm(2700), place: "rack 1 top" });
    await enter(maker, { species: "Black cherry", width: umFromMm(180), source: "41 Lane Sawmill" });
    await enter(maker, { species: "Ash", thickness: umFromMm(33), place: "100% dry loft" });
  });
  const find = async (query: Partial<endpoint.BoardQuery>) => tagsOf(await page(rack.maker, query));

  test.each([
    ["a tag", "B-042", ["B-042"]],
    ["a tag in small letters", "b43", ["B-043"]],
    ["a number, also where it stands in a source", "41", ["B-041", "B-042"]],
    ["part of a species, in any case", "OAK", ["B-041"]],
    ["a place", "rack 1", ["B-041"]],
    ["a sign that SQL would take for anything", "%", ["B-043"]],
    ["nothing that is there", "teak", []],
  ])("by %s", async (_, search, tags) => {
    expect(await find({ search })).toEqual(tags);
  });

  test("by cut, species and least sizes, together", async () => {
    expect(await find({ cut: "quarter" })).toEqual(["B-041"]);
    expect(await find({ species: "Ash" })).toEqual(["B-043"]);
    expect(await find({ minLengthUm: 1_200_000 })).toEqual(["B-041", "B-042", "B-043"]);
    expect(await find({ minLengthUm: 1_200_001 })).toEqual(["B-041"]);
    expect(await find({ minWidthUm: 190_000, minThicknessUm: 30_000 })).toEqual(["B-043"]);
  });

  test("by state: what was cut is out of the rack and can still be found", async () => {
    const [first] = (await page(rack.maker, { search: "B-042" })).items;
    await changeBoard(rack.maker, first?.id ?? "", { baseRevision: 1, state: "cut" });
    expect(await find({})).toEqual(["B-041", "B-043"]);
    expect(await find({ state: "cut" })).toEqual(["B-042"]);
    expect(await find({ state: "all" })).toHaveLength(3);
  });

  test("tells the longest board of the whole answer, not of the page, and every species", async () => {
    const found = await page(rack.maker, { sort: "length", direction: "up", pageSize: 1, state: "all" });
    expect(found).toMatchObject({ total: 3, longest: 2_700_000, species: ["Ash", "Black cherry", "White oak"] });
    expect(found.items).toHaveLength(1);
  });

  test("an empty rack is an answer, not an error", async () => {
    expect(await page((await makeShop()).owner)).toMatchObject({ items: [], total: 0, longest: 0, species: [] });
  });
});

describe("a rack of ten thousand boards", () => {
  let maker: ShopAccess;
  beforeAll(async () => {
    maker = (await makeShop()).maker;
    const at = new Date("2026-01-05T08:00:00Z").getTime();
    const rows = Array.from({ length: 10_000 }, (_, index) => ({
      ...newBoard,
      id: newId(),
      shopId: maker.shopId,
      tagNumber: index + 1,
      state: "rack" as const,
      species: ["Ash", "Beech", "Black walnut", "Cherry", "White oak"][index % 5] ?? "",
      length: umFromMm(600 + ((index * 37) % 2400)),
      width: umFromMm(90 + ((index * 13) % 260)),
      thickness: umFromMm(20 + (index % 30)),
      moistureTenths: index % 11 === 0 ? null : 60 + (index % 70),
      place: `rack ${index % 40}`,
      revision: 1,
      createdAt: new Date(at + index * 1000),
      updatedAt: new Date(at),
    }));
    for (let from = 0; from < rows.length; from += 1000) {
      await database()
        .insert(board)
        .values(rows.slice(from, from + 1000));
    }
    await database().execute(sql`analyze table board`);
  }, 60_000);

  test.each(endpoint.boardSorts.flatMap((sort) => [["up", sort] as const, ["down", sort] as const]))(
    "reads %s by %s in the order of the sort's own index, without sorting",
    async (direction, sort) => {
      const query = endpoint.boardQuerySchema.parse({ sort, direction });
      const [plan] = await database().execute(sql`explain ${boardPageOf(database(), maker.shopId, query).getSQL()}`);
      const [first] = z.array(z.object({ table: z.string(), key: z.string().nullable(), Extra: z.string() })).parse(plan);
      expect(first).toMatchObject({ table: "board", key: sort === "newest" ? "board_created" : `board_${sort}` });
      expect(first?.Extra).not.toMatch(/filesort|temporary/i);
    },
  );

  test("a page of 25 takes four queries, and no more with 100", async () => {
    const { pool } = openPool();
    for (const pageSize of [25, 100]) {
      const query = vi.spyOn(pool, "query");
      const execute = vi.spyOn(pool, "execute");
      const found = await page(maker, { pageSize });
      const count = query.mock.calls.length + execute.mock.calls.length;
      query.mockRestore();
      execute.mockRestore();
      expect(found.items).toHaveLength(pageSize);
      expect(count).toBe(4);
    }
  });

  test("the first page, the last page and a search each answer within two seconds, also on a busy machine", async () => {
    for (const query of [{}, { page: 400, sort: "length" }, { search: "oak", sort: "place" }] as const) {
      const started = performance.now();
      const { items } = await page(maker, query);
      const ms = performance.now() - started;
      expect(items).toHaveLength(25);
      expect(ms).toBeLessThan(2000);
    }
  });

  test("pages follow one another without a gap or a double, also where the sort's value is the same", async () => {
    const ids = new Set<string>();
    for (let number = 1; number <= 5; number++) {
      for (const { id } of (await page(maker, { sort: "species", page: number, pageSize: 100 })).items) ids.add(id);
    }
    expect(ids.size).toBe(500);
  });
});

describe("who may", () => {
  const calls = {
    list: () => ask(boardsRoute.GET, endpoint.listBoards, {}),
    read: (boardId: string) => ask(boardRoute.GET, endpoint.getBoard, { params: { boardId } }),
    enter: () => ask(boardsRoute.POST, endpoint.createBoard, { body: { ...newBoard, reading: null } }),
    change: (boardId: string) =>
      ask(boardRoute.PATCH, endpoint.updateBoard, { params: { boardId }, body: { baseRevision: 1, place: "loft" } }),
    reading: (boardId: string) =>
      ask(readingsRoute.POST, endpoint.addMoistureReading, { params: { boardId }, body: { percent: 8, takenOn: "2026-03-01" } }),
  };

  test.each<[Role, Record<keyof typeof calls, number>]>([
    ["owner", { list: 200, read: 200, enter: 200, change: 200, reading: 200 }],
    ["maker", { list: 200, read: 200, enter: 200, change: 200, reading: 200 }],
    ["assistant", { list: 200, read: 200, enter: 403, change: 403, reading: 200 }],
  ])("%s", async (role, expected) => {
    const { id } = await enter(shop.owner);
    await actAs(shop[role]);
    const statuses = Object.fromEntries(
      await Promise.all(Object.entries(calls).map(async ([name, make]) => [name, (await make(id)).status] as const)),
    );
    expect(statuses).toEqual(expected);
  });

  test("another shop's board is not found, and nothing about it changes", async () => {
    const { id } = await enter(shop.owner);
    await actAs(other.owner);
    for (const make of [calls.read, calls.change, calls.reading]) {
      expect(await make(id)).toMatchObject({ status: 404, body: { code: "not-found" } });
    }
    expect((await page(other.owner, { search: "walnut", state: "all" })).items.some((found) => found.id === id)).toBe(false);
    expect(await readBoard(shop.owner, id)).toMatchObject({ place: newBoard.place, readings: [] });
  });

  test("a change and its history row stand or fall together", async () => {
    const { id } = await enter(shop.owner);
    const insert = vi.spyOn(await import("@/db/queries/history"), "recordHistory").mockRejectedValueOnce(new Error("disk full"));
    await expect(changeBoard(shop.owner, id, { baseRevision: 1, place: "loft" })).rejects.toThrow("disk full");
    insert.mockRestore();
    expect(await readBoard(shop.owner, id)).toMatchObject({ place: newBoard.place, revision: 1 });
    expect(await database().select().from(history).where(eq(history.nounId, id))).toHaveLength(1);
  });
});
