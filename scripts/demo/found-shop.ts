/** Founds the demo shop with its people and saws. */
import type { Connection } from "@/db/client";
import { insertMembership, insertShop, insertUser } from "@/db/queries/member";
import { insertSaw } from "@/db/queries/shop";
import { type CutLoss, um, umFromMm } from "@/lib/layout";
import type { Role } from "@/lib/schemas/endpoint";
import type { ShopAccess } from "@/lib/server/access";
import { hashPassword } from "@/lib/server/password";
import { demoPassword, demoPeople, demoShopName } from "./people";

/** A saw with what its cut costs: the clean-up is taken off both edges that the blade leaves. */
export interface DemoSaw {
  readonly id: string;
  readonly loss: CutLoss;
}

export interface DemoShop {
  /** What the session gate would give each of them. */
  readonly people: Readonly<Record<Role, ShopAccess>>;
  readonly saws: { readonly crosscut: DemoSaw; readonly rip: DemoSaw };
}

/** Founds the shop with its people. They belong to it, and so can sign in, only once `letPeopleIn` has been called. */
export async function foundShop(db: Connection, now: Date): Promise<DemoShop> {
  const shopId = await insertShop(db, {
    name: demoShopName,
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
  const person = async (role: Role): Promise<ShopAccess> => {
    const found = demoPeople.find((one) => one.role === role);
    if (!found) throw new Error(`the demo has nobody who is ${role}`);
    const { email, name } = found;
    const userId = await insertUser(db, { email, name, passwordHash, createdAt: now });
    return { sessionId: "", userId, userName: name, email, shopId, shopName: demoShopName, role };
  };
  const people = { owner: await person("owner"), maker: await person("maker"), assistant: await person("assistant") };

  const saw = async (name: string, kind: "table" | "track" | "band" | "hand", kerfUm: number, cleanUpUm: number) => {
    const [kerf, cleanUp] = [um(kerfUm), um(cleanUpUm)];
    const id = await insertSaw(db, shopId, { name, kind, kerf, cleanUp });
    return { id, loss: { kerf, cleanUpBefore: cleanUp, cleanUpAfter: cleanUp } };
  };
  // 2.4 mm and 0.3 mm on either side are the 3 mm of the demo's gaps: the figure runs on, and no sliver is left between two fronts.
  const crosscut = await saw("Panel saw, thin blade", "table", 2400, 300);
  const rip = await saw("Table saw, full kerf", "table", 3200, 300);
  await saw("Track saw", "track", 1800, 200);
  await saw("Band saw", "band", 1200, 1000);
  await saw("Fine pull saw", "hand", 500, 300);
  return { people, saws: { crosscut, rip } };
}

export async function letPeopleIn(db: Connection, { people }: DemoShop, now: Date): Promise<void> {
  for (const { shopId, userId, role } of Object.values(people)) {
    await insertMembership(db, shopId, { userId, role, createdAt: now });
  }
}
