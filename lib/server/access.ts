/** The session gate: who is asking, for which shop, as what. Everything behind it asks for the `ShopAccess` it gives out. */
import "server-only";
import { redirect } from "next/navigation";
import { cache } from "react";
import { findLiveSession } from "@/db/queries/session";
import type { ShopId } from "@/db/shop-id";
import type { Role } from "@/lib/schemas/endpoint";
import { database } from "./database";
import { FaultError } from "./faults";
import { readSessionId } from "./session-cookie";

export interface ShopAccess {
  readonly sessionId: string;
  readonly userId: string;
  readonly userName: string;
  readonly email: string;
  readonly shopId: ShopId;
  readonly shopName: string;
  readonly role: Role;
}

/** The signed-in member, or null. Read once a request. */
export const currentAccess = cache(async (): Promise<ShopAccess | null> => {
  const sessionId = await readSessionId();
  if (sessionId === null) return null;
  return (await findLiveSession(database(), sessionId, new Date())) ?? null;
});

/** For handlers: the member, or a fault. */
export async function requireAccess(allowed: readonly Role[]): Promise<ShopAccess> {
  const access = await currentAccess();
  if (access === null) throw new FaultError("not-signed-in", "Sign in first.");
  if (!allowed.includes(access.role)) {
    throw new FaultError("not-allowed", `This needs the role ${allowed.join(" or ")}; yours is ${access.role}.`);
  }
  return access;
}

/** For pages: the member, or off to the sign-in page, which leads back to `path`. */
export async function pageAccess(path: string): Promise<ShopAccess> {
  const access = await currentAccess();
  if (access === null) redirect(`/sign-in?next=${encodeURIComponent(path)}`);
  return access;
}
