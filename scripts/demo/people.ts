/** The demo shop and its people: invented. */

import type { Connection } from "@/db/client";
import { insertMembership, insertShop, insertUser } from "@/db/queries/member";
import { insertSaw } from "@/db/queries/shop";
import type { ShopId } from "@/db/shop-id";
import { um, umFromMm } from "@/lib/layout";
import { hashPassword } from "@/lib/server/password";

/** Told to whoever starts the demo; every one of them has the same password. */
export const demoPassword = "try-the-demo";

export const demoPeople = [
  { role: "owner", name: "Ilse Varga", email: "owner@tarnholt.example" },
  { role: "maker", name: "Bram Okafor", email: "maker@tarnholt.example" },
  { role: "assistant", name: "Juno Pell", email: "assistant@tarnholt.example" },
] as const;

export interface DemoShop {
  readonly shopId: ShopId;
  readonly userIds: Record<(typeof demoPeople)[number]["role"], string>;
  readonly sawIds: { readonly table: string; readonly thin: string };
}

export async function seedPeople(db: Connection, now: Date): Promise<DemoShop> {
  const shopId = await insertShop(db, {
    name: "Tarnholt Joinery",
    units: "mm",
    inchFraction: 64,
    timeZone: "Europe/Oslo",
    paper: "a4",
    currency: "EUR",
    // 300 mm: shortest length common manuals allow at planer and jointer; hands stay as far from the blade.
    shortestCrosscut: umFromMm(300),
    narrowestRip: umFromMm(120),
    shortestMachined: umFromMm(300),
    offcutLength: umFromMm(300),
    offcutWidth: umFromMm(60),
    createdAt: now,
  });
  const passwordHash = await hashPassword(demoPassword);
  const ids: Partial<DemoShop["userIds"]> = {};
  for (const { role, name, email } of demoPeople) {
    ids[role] = await insertUser(db, { email, name, passwordHash, createdAt: now });
    await insertMembership(db, shopId, { userId: ids[role], role, createdAt: now });
  }
  const { owner, maker, assistant } = ids;
  if (!owner || !maker || !assistant) throw new Error("a demo role has nobody");
  const thin = await insertSaw(db, shopId, { name: "Panel saw, thin blade", kind: "table", kerf: um(2400), cleanUp: um(200) });
  const table = await insertSaw(db, shopId, { name: "Table saw, full kerf", kind: "table", kerf: um(3200), cleanUp: um(300) });
  await insertSaw(db, shopId, { name: "Track saw", kind: "track", kerf: um(1800), cleanUp: um(200) });
  await insertSaw(db, shopId, { name: "Band saw", kind: "band", kerf: um(1200), cleanUp: um(1000) });
  await insertSaw(db, shopId, { name: "Fine pull saw", kind: "hand", kerf: um(500), cleanUp: um(300) });
  return { shopId, userIds: { owner, maker, assistant }, sawIds: { table, thin } };
}
