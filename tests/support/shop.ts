/** A shop of a test's own, with its people: tests that run side by side never meet. */
import { v7 as newId } from "uuid";
import { insertMembership, insertShop, insertUser } from "@/db/queries/member";
import { insertSaw } from "@/db/queries/shop";
import { um, umFromMm } from "@/lib/layout";
import type { Role } from "@/lib/schemas/endpoint";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { hashPassword } from "@/lib/server/password";

export interface TestShop {
  readonly owner: ShopAccess;
  readonly maker: ShopAccess;
  readonly assistant: ShopAccess;
  readonly sawId: string;
}

export const testPassword = "a password of the tests";
let passwordHash: Promise<string> | undefined;

/** Access as the session gate would give it, without a session. */
export async function makeShop(name = "Test shop"): Promise<TestShop> {
  passwordHash ??= hashPassword(testPassword);
  const db = database();
  const at = new Date();
  const shopId = await insertShop(db, {
    name,
    units: "mm",
    inchFraction: 64,
    timeZone: "Europe/Oslo",
    paper: "a4",
    currency: "EUR",
    shortestCrosscut: umFromMm(300),
    narrowestRip: umFromMm(120),
    shortestMachined: umFromMm(300),
    offcutLength: umFromMm(300),
    offcutWidth: umFromMm(60),
    createdAt: at,
  });
  const member = async (role: Role): Promise<ShopAccess> => {
    const email = `${role}-${newId()}@shop.example`;
    const userName = `Test ${role}`;
    const userId = await insertUser(db, { email, name: userName, passwordHash: (await passwordHash) ?? "", createdAt: at });
    await insertMembership(db, shopId, { userId, role, createdAt: at });
    return { sessionId: "", userId, userName, email, shopId, shopName: name, role };
  };
  const sawId = await insertSaw(db, shopId, { name: "Saw of the tests", kind: "table", kerf: um(2400), cleanUp: um(200) });
  return { owner: await member("owner"), maker: await member("maker"), assistant: await member("assistant"), sawId };
}
