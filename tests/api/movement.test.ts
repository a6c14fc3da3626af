/** Movement: the shop's limits, species of its own, a job's climate, choices for a face; who may, and whose they are. */
import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it, vi } from "vitest";
import "../support/cookie-jar";
import { GET as getFaceMovement, PUT as putFaceMovement } from "@/app/api/faces/[faceId]/movement/route";
import { GET as getSettings, PUT as putSettings } from "@/app/api/shop/movement/route";
import { DELETE as deleteOne, PUT as putOne } from "@/app/api/species/[speciesId]/route";
import { GET as getSpecies, POST as postSpecies } from "@/app/api/species/route";
import { history } from "@/db/schema";
import { stackFace, umFromMm } from "@/lib/layout";
import type { Role } from "@/lib/schemas/endpoint";
import * as movement from "@/lib/schemas/movement";
import { type MovementChoices, saveFaceMovement, updateMovementSettings } from "@/lib/schemas/movement";
import { movementSheet, movementSheetSchema } from "@/lib/schemas/movement-sheet";
import * as speciesEndpoints from "@/lib/schemas/species";
import type { ShopAccess } from "@/lib/server/access";
import { addReading } from "@/lib/server/boards/add-reading";
import { database } from "@/lib/server/database";
import { removeFace } from "@/lib/server/jobs/faces";
import { changeJob, readJob } from "@/lib/server/jobs/jobs";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { chooseFaceMovement, readFaceMovement } from "@/lib/server/movement/face-movement";
import { movementSettings, saveMovementSettings } from "@/lib/server/movement/settings";
import { addSpecies, changeSpecies, ownSpecies, removeSpecies } from "@/lib/server/species";
import { actAs } from "../support/act-as";
import { ask } from "../support/ask";
import { makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";

vi.setConfig({ testTimeout: 60_000 });

let shop: Readonly<Record<Role, ShopAccess>>;
let other: Readonly<Record<Role, ShopAccess>>;
beforeAll(async () => {
  shop = await makeShop();
  other = await makeShop();
});

const verbsOf = async (nounId: string) =>
  (await database().select({ verb: history.verb }).from(history).where(eq(history.nounId, nounId)).orderBy(history.at)).map(
    ({ verb }) => verb,
  );

const beech = {
  name: "European beech",
  alsoCalled: ["Rotbuche"],
  movement: { kind: "shrinkage" as const, radial: 5.8, tangential: 11.8 },
  source: "Own test of eight boards, winter 2031",
};
const settings = {
  climate: { kind: "moisture" as const, driest: 7, dampest: 12 },
  leastGap: umFromMm(2),
  moistureLimit: 1.5,
};
const solid: MovementChoices = {
  surround: { kind: "sameWood", grain: "with", moisture: 8.5 },
  around: umFromMm(2),
  woods: {},
};

describe("the shop's movement settings", () => {
  it("start with 30 to 60 % at 21 °C and are saved from the revision they were read at, once", async () => {
    const { owner } = await makeShop();
    const read = await movementSettings(owner.shopId);
    expect(read).toMatchObject({ revision: 0, climate: { driest: { celsius: 21, humidity: 30 } } });
    const saves = await Promise.allSettled(
      Array.from({ length: 5 }, () => saveMovementSettings(owner, { baseRevision: 0, ...settings })),
    );
    expect(saves.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    expect(await movementSettings(owner.shopId)).toEqual({ ...settings, revision: 1 });
    await expect(saveMovementSettings(owner, { baseRevision: 0, ...settings })).rejects.toMatchObject({ code: "conflict" });
    await saveMovementSettings(owner, { baseRevision: 1, ...settings, moistureLimit: 3 });
    expect(await movementSettings(owner.shopId)).toMatchObject({ moistureLimit: 3, revision: 2 });
    expect(await verbsOf(owner.shopId)).toEqual(["movement changed", "movement changed"]);
  });

  it("are read by everybody of the shop and saved by its owner", async () => {
    const body = { baseRevision: 0, ...settings };
    for (const role of ["assistant", "maker"] as const) {
      await actAs(shop[role]);
      expect((await ask(getSettings, movement.getMovementSettings, {})).status).toBe(200);
      expect((await ask(putSettings, updateMovementSettings, { body })).status).toBe(403);
    }
    await actAs(shop.owner);
    expect((await ask(putSettings, updateMovementSettings, { body })).status).toBe(200);
  });

  it("refuse a driest that is damper than the dampest, and air that no equation holds for", async () => {
    await actAs(shop.owner);
    const send = async (climate: unknown) =>
      ask(putSettings, updateMovementSettings, { body: { baseRevision: 1, ...settings, climate: climate as never } });
    const [dry, damp] = [
      { celsius: 21, humidity: 30 },
      { celsius: 21, humidity: 60 },
    ];
    expect((await send({ kind: "air", driest: damp, dampest: dry })).status).toBe(400);
    expect((await send({ kind: "air", driest: dry, dampest: { celsius: 21, humidity: 100 } })).status).toBe(400);
    expect((await send({ kind: "moisture", driest: 9, dampest: 8 })).status).toBe(400);
    expect((await send({ kind: "moisture", driest: 8, dampest: 31 })).status).toBe(400);
  });
});

describe("species of the shop's own", () => {
  it("are added, changed and removed by makers, each with its row of history", async () => {
    const { maker } = await makeShop();
    const { id } = await addSpecies(maker, beech);
    await changeSpecies(maker, id, { ...beech, source: "Own test of twelve boards" });
    expect(await ownSpecies(maker.shopId)).toEqual([{ ...beech, id, source: "Own test of twelve boards" }]);
    await removeSpecies(maker, id);
    expect(await ownSpecies(maker.shopId)).toEqual([]);
    expect(await verbsOf(id)).toEqual(["added", "changed", "removed"]);
  });

  it("of one name: many people at once get one, and the others a refusal", async () => {
    const { maker } = await makeShop();
    const ends = await Promise.allSettled(Array.from({ length: 6 }, () => addSpecies(maker, beech)));
    expect(ends.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    for (const end of ends) if (end.status === "rejected") expect(end.reason).toMatchObject({ code: "refused" });
  });

  it("need a source, and figures that can be those of a wood", async () => {
    await actAs(shop.maker);
    const post = (change: object) =>
      ask(postSpecies, speciesEndpoints.createSpecies, { body: { ...beech, name: "Trial", ...change } });
    expect((await post({ source: "  " })).status).toBe(400);
    expect((await post({ movement: { kind: "shrinkage", radial: 11.8, tangential: 5.8 } })).status).toBe(400);
    expect((await post({ movement: { kind: "coefficients", radial: 0.19, tangential: 0.274 } })).status).toBe(400);
    expect((await post({})).status).toBe(200);
  });

  it("are seen by an assistant, changed by none, and not found by another shop", async () => {
    const { id } = await addSpecies(shop.maker, { ...beech, name: "Seen beech" });
    await actAs(shop.assistant);
    expect((await ask(getSpecies, speciesEndpoints.listSpecies, {})).status).toBe(200);
    expect((await ask(postSpecies, speciesEndpoints.createSpecies, { body: beech })).status).toBe(403);
    expect((await ask(deleteOne, speciesEndpoints.deleteSpecies, { params: { speciesId: id } })).status).toBe(403);
    await actAs(other.maker);
    const params = { speciesId: id };
    expect((await ask(putOne, speciesEndpoints.updateSpecies, { params, body: beech })).status).toBe(404);
    expect((await ask(deleteOne, speciesEndpoints.deleteSpecies, { params })).status).toBe(404);
    expect(await ownSpecies(other.maker.shopId)).toEqual([]);
  });
});

describe("a face", () => {
  it("tells its boards with the newest reading, the shop's climate, or its job's own", async () => {
    const { maker } = await makeShop();
    const { faceId, jobId, boardId } = await makeLayout(maker);
    const before = await readFaceMovement(maker.shopId, faceId);
    expect(before).toMatchObject({
      revision: 0,
      choices: { surround: { kind: "none" }, around: null, woods: {} },
      climateOf: "shop",
      boards: [{ boardId, species: "black walnut", cut: "flat", reading: null }],
    });
    await addReading(maker, boardId, { percent: 9.1, takenOn: "2031-05-02" });
    await addReading(maker, boardId, { percent: 8.4, takenOn: "2031-06-02" });
    await addReading(maker, boardId, { percent: 10, takenOn: "2031-04-02" });
    const { revision } = await readJob(maker, jobId);
    await changeJob(maker, jobId, { baseRevision: revision, climate: { kind: "moisture", driest: 8, dampest: 14 } });
    const after = await readFaceMovement(maker.shopId, faceId);
    expect(after).toMatchObject({
      climateOf: "job",
      climate: { kind: "moisture", driest: 8, dampest: 14 },
      boards: [{ reading: { percent: 8.4, takenOn: "2031-06-02" } }],
    });
    await changeJob(maker, jobId, { baseRevision: revision + 1, title: "Map chest" });
    expect((await readJob(maker, jobId)).climate).not.toBeNull();
    await changeJob(maker, jobId, { baseRevision: revision + 2, climate: null });
    expect((await readFaceMovement(maker.shopId, faceId)).climateOf).toBe("shop");
  });

  it("keeps what is chosen for it, from the revision it was read at, once", async () => {
    const { faceId, boardId } = await makeLayout(shop.maker);
    const choices = { ...solid, woods: { [boardId]: { species: "walnut-black", ringAngle: 35 } } };
    const saves = await Promise.allSettled(
      Array.from({ length: 4 }, () => chooseFaceMovement(shop.maker, faceId, { baseRevision: 0, ...choices })),
    );
    expect(saves.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    for (const end of saves) if (end.status === "rejected") expect(end.reason).toMatchObject({ code: "conflict" });
    expect(await readFaceMovement(shop.maker.shopId, faceId)).toMatchObject({ choices, revision: 1 });
    expect(await verbsOf(faceId)).toEqual(["movement chosen"]);
  });

  it("is chosen for by makers and seen by an assistant; another shop's is not found", async () => {
    const { faceId } = await makeLayout(shop.maker);
    const [params, body] = [{ faceId }, { baseRevision: 0, ...solid }];
    await actAs(shop.assistant);
    expect((await ask(getFaceMovement, movement.getFaceMovement, { params })).status).toBe(200);
    expect((await ask(putFaceMovement, saveFaceMovement, { params, body })).status).toBe(403);
    await actAs(other.maker);
    expect((await ask(getFaceMovement, movement.getFaceMovement, { params })).status).toBe(404);
    expect((await ask(putFaceMovement, saveFaceMovement, { params, body })).status).toBe(404);
    await actAs(shop.maker);
    expect((await ask(putFaceMovement, saveFaceMovement, { params, body })).status).toBe(200);
  });

  it("of fronts stacked in plywood: its sheet has the moisture they are cut at and every gap through the year", async () => {
    const { maker } = await makeShop();
    const face = stackFace([180, 180].map(umFromMm), umFromMm(600), umFromMm(3), "horizontal");
    const { faceId, boardId } = await makeLayout(maker, { face, boardMm: { length: 2350, width: 420 } });
    await addReading(maker, boardId, { percent: 8, takenOn: "2031-06-02" });
    const choices: MovementChoices = { surround: { kind: "sheet" }, around: umFromMm(2), woods: {} };
    await chooseFaceMovement(maker, faceId, { baseRevision: 0, ...choices });
    await saveMovementSettings(maker, {
      baseRevision: 0,
      climate: { kind: "moisture", driest: 6, dampest: 12 },
      leastGap: umFromMm(1),
      moistureLimit: 2,
    });
    const facts = await readFaceMovement(maker.shopId, faceId);
    const sheet = movementSheetSchema.parse(movementSheet((await readLayout(maker, faceId)).document, facts));
    expect(sheet.boards).toMatchObject([
      { boardId, reading: { percent: 8 }, species: { name: "Walnut, black", source: expect.stringContaining("Table 13-5") } },
    ]);
    // 180 mm · 0.00274 a percent: 0.986 mm less at 6 %, 1.973 mm more at 12 %. At the top edge, half of that.
    expect(sheet.gaps.filter(({ runs }) => runs === "upright")).toMatchObject([
      { a: "p1", b: "p2", today: 3_000, figures: { driest: 3_986, dampest: 1_027, toCut: 2_973 } },
      { a: "p1", b: "top", today: 2_000, figures: { driest: 2_493, dampest: 1_014, toCut: 1_987 } },
      { a: "p2", b: "bottom", today: 2_000, figures: { driest: 2_493, dampest: 1_014, toCut: 1_987 } },
    ]);
  });

  it("goes with what was chosen for it", async () => {
    const { faceId } = await makeLayout(shop.maker);
    await chooseFaceMovement(shop.maker, faceId, { baseRevision: 0, ...solid });
    await removeFace(shop.maker, faceId);
    await expect(readFaceMovement(shop.maker.shopId, faceId)).rejects.toMatchObject({ code: "not-found" });
  });
});
