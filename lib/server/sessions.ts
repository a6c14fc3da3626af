/** Signing in and out. */
import "server-only";
import { v7 as newId } from "uuid";
import {
  deleteEndedSessions,
  deleteSession,
  deleteSessionsOf,
  findLiveSession,
  findUserByEmail,
  insertSession,
  listMemberships,
} from "@/db/queries/session";
import type { Session } from "@/lib/schemas/session";
import type { ShopAccess } from "./access";
import { database } from "./database";
import { FaultError } from "./faults";
import { countTry, forgetTries } from "./limits";
import { checkPassword } from "./password";
import { clearSessionCookie, sessionSeconds, writeSessionId } from "./session-cookie";

export function sessionOf(access: ShopAccess): Session {
  return {
    user: { id: access.userId, name: access.userName, email: access.email },
    shop: { id: access.shopId, name: access.shopName },
    role: access.role,
  };
}

export async function signIn(
  given: { email: string; password: string },
  from: { address: string | null; device: string },
): Promise<Session> {
  const email = given.email.toLowerCase();
  await (from.address === null ? countTry("signInAnybody", "") : countTry("signInAddress", from.address));
  await countTry("signInAccount", email);
  const db = database();
  const user = await findUserByEmail(db, email);
  if (!(await checkPassword(user?.passwordHash, given.password)) || !user) {
    throw new FaultError("not-signed-in", "E-mail address and password do not go together.");
  }
  const [membership] = await listMemberships(db, user.id);
  if (!membership) throw new FaultError("not-allowed", "This account belongs to no shop any more.");

  const now = new Date();
  const sessionId = newId();
  await insertSession(db, {
    id: sessionId,
    userId: user.id,
    shopId: membership.shopId,
    device: from.device.slice(0, 200),
    createdAt: now,
    expiresAt: new Date(now.getTime() + sessionSeconds * 1000),
  });
  // Whoever comes sweeps out what has ended; the index on the end makes it cheap.
  await deleteEndedSessions(db, now);
  await forgetTries("signInAccount", email);
  await writeSessionId(sessionId);
  const access = await findLiveSession(db, sessionId, now);
  if (!access) throw new Error("a session just made cannot be found");
  return sessionOf(access);
}

export async function signOut(access: ShopAccess): Promise<void> {
  await deleteSession(database(), access.sessionId);
  await clearSessionCookie();
}

export async function signOutEverywhere(access: ShopAccess): Promise<number> {
  const ended = await deleteSessionsOf(database(), access.userId);
  await clearSessionCookie();
  return ended;
}
