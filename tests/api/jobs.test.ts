/** Jobs, faces and layouts: numbers, history, conflicts, scope. */
import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { history } from "@/db/schema";
import { type FaceLayout, umFromMm } from "@/lib/layout";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { addFace, changeFaceTitle, removeFace } from "@/lib/server/jobs/faces";
import { changeJob, openJob, readJob, readJobs } from "@/lib/server/jobs/jobs";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";
import { makeShop, type TestShop } from "../support/shop";

let shop: TestShop;
let other: TestShop;
beforeAll(async () => {
  shop = await makeShop("Job shop");
  other = await makeShop("Other shop");
});

const fields = { title: "Map chest", client: "Harbour library", note: "", dueOn: null };
const loss = { kerf: umFromMm(2.4), cleanUpBefore: umFromMm(0.2), cleanUpAfter: umFromMm(0.2) };

const rowOfFour = (sawId: string) => ({
  title: "Top row",
  face: {
    pattern: "grid" as const,
    columns: [240, 240, 240, 240].map(umFromMm),
    rows: [umFromMm(184)],
    columnGaps: [3, 3, 3].map(umFromMm),
    rowGaps: [],
    grain: "horizontal" as const,
  },
  crosscut: loss,
  rip: loss,
  crosscutSawId: sawId,
  ripSawId: sawId,
  spacing: "followGap" as const,
});

function gapsOf({ face }: FaceLayout): readonly number[] {
  return face.pattern === "grid" ? face.columnGaps : [];
}

async function newFace(access: ShopAccess = shop.maker, sawId = shop.sawId) {
  const job = await openJob(access, fields);
  return { job, face: await addFace(access, job.id, rowOfFour(sawId)) };
}
const verbsOf = async (nounId: string) =>
  (
    await database()
      .select({ verb: history.verb })
      .from(history)
      .where(eq(history.nounId, nounId))
      .orderBy(history.at, history.id)
  ).map(({ verb }) => verb);
const notFound = { code: "not-found" };

describe("jobs", () => {
  it("get numbers without gaps or doubles when many are opened at once", async () => {
    const busy = await makeShop();
    const jobs = await Promise.all(Array.from({ length: 8 }, () => openJob(busy.maker, fields)));
    expect(jobs.map(({ number }) => number).sort((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });

  it("are found by number, title and client, and page", async () => {
    const own = await makeShop();
    for (const title of ["Sideboard", "Bedside 100%", "Apothecary"]) await openJob(own.maker, { ...fields, title });
    const find = async (search: string) =>
      (await readJobs(own.maker, { state: "open", search, page: 1, pageSize: 25 })).items.map(({ title }) => title);
    expect(await find("side")).toEqual(["Bedside 100%", "Sideboard"]);
    expect(await find("100%")).toEqual(["Bedside 100%"]);
    expect(await find("3")).toEqual(["Apothecary"]);
    expect(await find("Harbour")).toHaveLength(3);
    const second = await readJobs(own.maker, { state: "open", search: "", page: 2, pageSize: 2 });
    expect(second).toMatchObject({ total: 3, items: [{ title: "Sideboard" }] });
  });

  it("are listed with the number of their faces", async () => {
    const own = await makeShop();
    const { job } = await newFace(own.maker, own.sawId);
    await addFace(own.maker, job.id, rowOfFour(own.sawId));
    await openJob(own.maker, { ...fields, title: "Empty" });
    const { items } = await readJobs(own.maker, { state: "open", search: "", page: 1, pageSize: 25 });
    expect(items.map(({ title, faces }) => [title, faces])).toEqual([
      ["Empty", 0],
      ["Map chest", 2],
    ]);
  });

  it("refuse a change from an old revision and leave the job as it was", async () => {
    const job = await openJob(shop.maker, fields);
    await changeJob(shop.maker, job.id, { baseRevision: job.revision, title: "Map chest, low" });
    await expect(changeJob(shop.owner, job.id, { baseRevision: job.revision, title: "Another" })).rejects.toMatchObject({
      code: "conflict",
    });
    expect((await readJob(shop.maker, job.id)).title).toBe("Map chest, low");
    expect(await verbsOf(job.id)).toEqual(["opened", "changed"]);
  });

  it("of another shop are not found, to read or to write", async () => {
    const { job, face } = await newFace();
    await expect(readJob(other.maker, job.id)).rejects.toMatchObject(notFound);
    await expect(changeJob(other.maker, job.id, { baseRevision: 1, title: "Mine" })).rejects.toMatchObject(notFound);
    await expect(addFace(other.maker, job.id, rowOfFour(other.sawId))).rejects.toMatchObject(notFound);
    await expect(changeFaceTitle(other.maker, face.id, "Mine")).rejects.toMatchObject(notFound);
    await expect(removeFace(other.maker, face.id)).rejects.toMatchObject(notFound);
    await expect(readLayout(other.maker, face.id)).rejects.toMatchObject(notFound);
    expect(
      (await readJobs(other.maker, { state: "open", search: "", page: 1, pageSize: 25 })).items.map(({ id }) => id),
    ).not.toContain(job.id);
  });
});

describe("faces", () => {
  it("are born with a layout whose pieces are not on wood yet", async () => {
    const { face } = await newFace();
    const layout = await readLayout(shop.maker, face.id);
    expect(layout).toMatchObject({ revision: 1, boards: [], order: null });
    expect(layout.document.groups).toEqual([
      { id: "set", pieceIds: ["p1", "p2", "p3", "p4"], placement: null, takesPlaceOf: {} },
    ]);
  });

  it("do not take another shop's saw", async () => {
    const job = await openJob(shop.maker, fields);
    await expect(addFace(shop.maker, job.id, rowOfFour(other.sawId))).rejects.toMatchObject(notFound);
    expect((await readJob(shop.maker, job.id)).faceList).toEqual([]);
  });

  it("go with their layout and leave the history", async () => {
    const { job, face } = await newFace();
    await removeFace(shop.maker, face.id);
    expect((await readJob(shop.maker, job.id)).faceList).toEqual([]);
    expect(await verbsOf(face.id)).toEqual(["added", "removed"]);
  });
});

describe("saving a layout", () => {
  const save = async (access: ShopAccess, faceId: string, baseRevision: number, gapMm: number) => {
    const { document, crosscutSawId, ripSawId } = await readLayout(shop.maker, faceId);
    const columnGaps = gapsOf(document).map(() => umFromMm(gapMm));
    return saveLayout(access, faceId, {
      baseRevision,
      document: faceLayoutSchema.parse({ ...document, face: { ...document.face, columnGaps } }),
      crosscutSawId,
      ripSawId,
    });
  };

  it("moves the revision on by one and writes history in the same step", async () => {
    const { face } = await newFace();
    expect(await save(shop.maker, face.id, 1, 2.5)).toMatchObject({ revision: 2 });
    const layout = await readLayout(shop.maker, face.id);
    expect(gapsOf(layout.document)).toEqual([2500, 2500, 2500]);
    expect(await verbsOf(layout.id)).toEqual(["saved"]);
  });

  it("lets one of two windows win and gives the other the winner's document", async () => {
    const { face } = await newFace();
    const ends = await Promise.allSettled([save(shop.maker, face.id, 1, 2), save(shop.owner, face.id, 1, 4)]);
    const lost = ends.filter((end) => end.status === "rejected");
    expect(lost).toHaveLength(1);
    const layout = await readLayout(shop.maker, face.id);
    expect(layout.revision).toBe(2);
    expect(lost[0]?.reason).toMatchObject({
      code: "conflict",
      detail: { revision: 2, document: faceLayoutSchema.parse(layout.document) },
    });
  });

  it("refuses a document that does not hold together", async () => {
    const { face } = await newFace();
    const { document, crosscutSawId, ripSawId } = await readLayout(shop.maker, face.id);
    const twice = { ...document, groups: [...document.groups, ...document.groups] };
    await expect(
      saveLayout(shop.maker, face.id, { baseRevision: 1, document: twice, crosscutSawId, ripSawId }),
    ).rejects.toMatchObject({ code: "bad-request" });
    expect((await readLayout(shop.maker, face.id)).revision).toBe(1);
  });

  it("refuses pieces on a board that is not on the table", async () => {
    const { face } = await newFace();
    const { document, crosscutSawId, ripSawId } = await readLayout(shop.maker, face.id);
    const placement = { stockId: crypto.randomUUID(), at: { x: umFromMm(0), y: umFromMm(0) }, turns: 0 as const };
    const placed = { ...document, groups: document.groups.map((group) => ({ ...group, placement })) };
    await expect(
      saveLayout(shop.maker, face.id, { baseRevision: 1, document: placed, crosscutSawId, ripSawId }),
    ).rejects.toMatchObject({ code: "refused" });
  });

  it("of another shop's face is not found", async () => {
    const { face } = await newFace();
    await expect(save(other.maker, face.id, 1, 2)).rejects.toMatchObject(notFound);
  });
});
