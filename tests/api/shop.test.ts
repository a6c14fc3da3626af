/** The shop's settings and saws. */
import { beforeAll, describe, expect, it } from "vitest";
import { um } from "@/lib/layout";
import { addSaw, changeSaw, saveShopSettings, shopSettings } from "@/lib/server/shops";
import { makeShop, type TestShop } from "../support/shop";

let shop: TestShop;
let other: TestShop;
beforeAll(async () => {
  shop = await makeShop("Saw shop");
  other = await makeShop("Other shop");
});

const saw = (name: string) => ({ name, kind: "table" as const, kerf: um(2400), cleanUp: um(200) });

describe("saws", () => {
  it("of one name: many people at once get one saw, and each of the others a refusal", async () => {
    const ends = await Promise.allSettled(Array.from({ length: 14 }, () => addSaw(shop.maker, saw("Panel saw"))));
    expect(ends.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    for (const end of ends) if (end.status === "rejected") expect(end.reason).toMatchObject({ code: "refused" });
    expect((await shopSettings(shop.maker.shopId)).saws.filter(({ name }) => name === "Panel saw")).toHaveLength(1);
  });

  it("may have in one shop the name they have in another", async () => {
    await addSaw(shop.maker, saw("Frame saw"));
    await expect(addSaw(other.maker, saw("Frame saw"))).resolves.toMatchObject({ name: "Frame saw" });
  });

  it("are not renamed to one that is there, and stay as they were", async () => {
    const { id } = await addSaw(shop.maker, saw("Track saw"));
    await addSaw(shop.maker, saw("Band saw"));
    await expect(changeSaw(shop.maker, id, saw("Band saw"))).rejects.toMatchObject({ code: "refused" });
    expect((await shopSettings(shop.maker.shopId)).saws.find((one) => one.id === id)?.name).toBe("Track saw");
  });

  it("of another shop are not found", async () => {
    await expect(changeSaw(other.maker, shop.sawId, saw("Mine now"))).rejects.toMatchObject({ code: "not-found" });
    expect((await shopSettings(shop.maker.shopId)).saws.find(({ id }) => id === shop.sawId)?.name).toBe("Saw of the tests");
  });
});

describe("settings", () => {
  const settingsOf = async () => {
    const { id, revision, saws, ...fields } = await shopSettings(shop.owner.shopId);
    return { ...fields, baseRevision: revision };
  };

  it("are saved from the revision they were read at, once", async () => {
    const read = await settingsOf();
    await saveShopSettings(shop.owner, { ...read, units: "inch", inchFraction: 32 });
    await expect(saveShopSettings(shop.owner, { ...read, units: "mm" })).rejects.toMatchObject({ code: "conflict" });
    expect(await shopSettings(shop.owner.shopId)).toMatchObject({ units: "inch", inchFraction: 32 });
  });

  it("refuse a time zone that is none", async () => {
    await expect(saveShopSettings(shop.owner, { ...(await settingsOf()), timeZone: "Mars/Base" })).rejects.toMatchObject({
      code: "refused",
      fields: { timeZone: [expect.any(String)] },
    });
  });
});
