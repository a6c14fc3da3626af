/** The shop's settings and saws. */
import "server-only";
import type { z } from "zod";
import { isDuplicateKey } from "@/db/duplicate-key";
import { recordHistory } from "@/db/queries/history";
import { findSaw, insertSaw, listSaws, readShop, updateSaw, updateShop } from "@/db/queries/shop";
import type { ShopId } from "@/db/shop-id";
import type { LengthStyle } from "@/lib/layout";
import type { Saw, Shop, saveSawSchema, updateShopSchema } from "@/lib/schemas/shop";
import type { ShopAccess } from "./access";
import { database } from "./database";
import { conflict, notFound, refused } from "./faults";

export async function shopSettings(shopId: ShopId): Promise<Shop> {
  const row = await readShop(database(), shopId);
  if (!row) throw notFound("shop");
  const { nextBoardNumber, nextJobNumber, nextOrderNumber, createdAt, ...settings } = row;
  const saws = await listSaws(database(), shopId);
  return { ...settings, inchFraction: settings.inchFraction === 32 ? 32 : 64, saws };
}

/** How the shop writes lengths, for sentences made on the server. */
export async function lengthStyleOf(shopId: ShopId): Promise<LengthStyle> {
  const row = await readShop(database(), shopId);
  if (!row) throw notFound("shop");
  return row.units === "mm" ? { unit: "mm" } : { unit: "inch", denominator: row.inchFraction === 32 ? 32 : 64 };
}

export async function saveShopSettings(access: ShopAccess, body: z.output<typeof updateShopSchema>): Promise<Shop> {
  const { baseRevision, ...fields } = body;
  if (!isTimeZone(fields.timeZone))
    throw refused(`“${fields.timeZone}” is not a time zone, such as Europe/Berlin.`, { timeZone: ["Not a time zone"] });
  await database().transaction(async (tx) => {
    const saved = await updateShop(tx, access.shopId, baseRevision, fields);
    if (!saved) throw conflict("Somebody else saved the settings meanwhile. Load them again and repeat your change.");
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "shop", nounId: access.shopId, verb: "changed", detail: fields },
      new Date(),
    );
  });
  return shopSettings(access.shopId);
}

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat("en", { timeZone: name });
    return true;
  } catch {
    return false;
  }
}

export async function addSaw(access: ShopAccess, fields: z.output<typeof saveSawSchema>): Promise<Saw> {
  const id = await unlessNameTaken(fields.name, () =>
    database().transaction(async (tx) => {
      const sawId = await insertSaw(tx, access.shopId, fields);
      const entry = { userId: access.userId, noun: "saw", nounId: sawId, verb: "added", detail: fields } as const;
      await recordHistory(tx, access.shopId, entry, new Date());
      return sawId;
    }),
  );
  return savedSaw(access.shopId, id);
}

export async function changeSaw(access: ShopAccess, sawId: string, fields: z.output<typeof saveSawSchema>): Promise<Saw> {
  await unlessNameTaken(fields.name, () =>
    database().transaction(async (tx) => {
      const before = await findSaw(tx, access.shopId, sawId);
      if (!before) throw notFound("saw");
      await updateSaw(tx, access.shopId, sawId, fields);
      const { id, ...was } = before;
      const detail = { before: was, after: fields };
      const entry = { userId: access.userId, noun: "saw", nounId: sawId, verb: "changed", detail } as const;
      await recordHistory(tx, access.shopId, entry, new Date());
    }),
  );
  return savedSaw(access.shopId, sawId);
}

async function savedSaw(shopId: ShopId, sawId: string): Promise<Saw> {
  const saw = await findSaw(database(), shopId, sawId);
  if (!saw) throw notFound("saw");
  return saw;
}

/** The unique key decides, so that two people who choose the same name at once get one saw and one refusal. */
async function unlessNameTaken<T>(name: string, write: () => Promise<T>): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (isDuplicateKey(error)) throw refused(`There is a saw called ${name} already.`, { name: ["Taken already"] });
    throw error;
  }
}
