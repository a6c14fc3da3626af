/** A shop of its own for a test, with an owner, a maker and an assistant, so that test files can run side by side. */
import { eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import { membership, session, shop, user } from "@/db/schema";
import { umFromMm } from "@/lib/layout";
import type { Role } from "@/lib/schemas/endpoint";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";

type ShopFields = Partial<Pick<typeof shop.$inferInsert, "name" | "units" | "inchFraction" | "paper" | "timeZone">>;

/** Members by role, as the session gate hands them out; each has an open session. */
export async function makeShop(fields: ShopFields = {}): Promise<Readonly<Record<Role, ShopAccess>>> {
  const db = database();
  const id = newId();
  const now = new Date();
  await db.insert(shop).values({
    // The brand of a shop's id comes from its row; this is the one that makes the row.
    id: id as typeof shop.$inferInsert.id,
    name: "Fenwater Joinery",
    units: "mm",
    inchFraction: 32,
    timeZone: "Europe/Berlin",
    paper: "a4",
    currency: "EUR",
    shortestCrosscut: umFromMm(300),
    narrowestRip: umFromMm(80),
    shortestMachined: umFromMm(300),
    offcutLength: umFromMm(300),
    offcutWidth: umFromMm(50),
    nextBoardNumber: 41,
    nextJobNumber: 7,
    nextOrderNumber: 18,
    revision: 1,
    createdAt: now,
    ...fields,
  });
  const [row] = await db
    .select({ shopId: shop.id, shopName: shop.name })
    .from(shop)
    .where(eq(shop.id, id as typeof shop.$inferInsert.id));
  if (!row) throw new Error("the shop just made is gone");
  return {
    owner: await makeMember(row, "owner", now),
    maker: await makeMember(row, "maker", now),
    assistant: await makeMember(row, "assistant", now),
  };
}

const names: Readonly<Record<Role, string>> = { owner: "Orla Brandt", maker: "Mats Lind", assistant: "Asha Noor" };

async function makeMember(row: Pick<ShopAccess, "shopId" | "shopName">, role: Role, now: Date): Promise<ShopAccess> {
  const db = database();
  const [userId, sessionId] = [newId(), newId()];
  const email = `${role}-${userId}@fenwater.example`;
  await db.insert(user).values({ id: userId, email, name: names[role], passwordHash: "none", createdAt: now });
  await db.insert(membership).values({ shopId: row.shopId, userId, role, createdAt: now });
  const expiresAt = new Date(now.getTime() + 3_600_000);
  await db.insert(session).values({ id: sessionId, userId, shopId: row.shopId, device: "test", createdAt: now, expiresAt });
  return { sessionId, userId, userName: names[role], email, ...row, role };
}
