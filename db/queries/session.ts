/** Sessions, and the people and shops they stand for. The session gate is the one place a browser's ShopId comes from. */
import "server-only";
import { and, eq, gt, lt } from "drizzle-orm";
import type { Connection } from "../client";
import { membership, session, shop, user } from "../schema";
import type { ShopId } from "../shop-id";

/** Session with its person, shop and role, or undefined when it ended or the person left the shop. */
export async function findLiveSession(db: Connection, sessionId: string, now: Date) {
  const [row] = await db
    .select({
      sessionId: session.id,
      userId: user.id,
      userName: user.name,
      email: user.email,
      shopId: shop.id,
      shopName: shop.name,
      role: membership.role,
    })
    .from(session)
    .innerJoin(user, eq(user.id, session.userId))
    .innerJoin(membership, and(eq(membership.userId, session.userId), eq(membership.shopId, session.shopId)))
    .innerJoin(shop, eq(shop.id, session.shopId))
    .where(and(eq(session.id, sessionId), gt(session.expiresAt, now)));
  return row;
}

export async function findUserByEmail(db: Connection, email: string) {
  const [row] = await db.select().from(user).where(eq(user.email, email.toLowerCase()));
  return row;
}

/** The shops a person belongs to, the one joined first first. */
export async function listMemberships(db: Connection, userId: string) {
  return db
    .select({ shopId: membership.shopId, role: membership.role })
    .from(membership)
    .where(eq(membership.userId, userId))
    .orderBy(membership.createdAt, membership.shopId);
}

export async function insertSession(
  db: Connection,
  row: { id: string; userId: string; shopId: ShopId; device: string; createdAt: Date; expiresAt: Date },
) {
  await db.insert(session).values(row);
}

export async function deleteSession(db: Connection, sessionId: string) {
  await db.delete(session).where(eq(session.id, sessionId));
}

/** Ends every session of a person; answers how many there were. */
export async function deleteSessionsOf(db: Connection, userId: string): Promise<number> {
  const [result] = await db.delete(session).where(eq(session.userId, userId));
  return result.affectedRows;
}

export async function deleteEndedSessions(db: Connection, now: Date) {
  await db.delete(session).where(lt(session.expiresAt, now));
}
