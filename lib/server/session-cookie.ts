/** The sealed cookie that names a session. It holds nothing but the session's id. */
import "server-only";
import { getIronSession, type SessionOptions } from "iron-session";
import { cookies } from "next/headers";
import { env } from "./env";

interface CookieContent {
  sessionId?: string;
}

/** Thirty days; the session row ends at the same time. */
export const sessionSeconds = 30 * 24 * 60 * 60;

function options(): SessionOptions {
  return {
    cookieName: "grainwright",
    password: env().SESSION_SECRET,
    ttl: sessionSeconds,
    cookieOptions: { httpOnly: true, sameSite: "lax", secure: env().APP_URL.startsWith("https:"), path: "/" },
  };
}

const open = async () => getIronSession<CookieContent>(await cookies(), options());

export async function readSessionId(): Promise<string | null> {
  return (await open()).sessionId ?? null;
}

export async function writeSessionId(sessionId: string): Promise<void> {
  const cookie = await open();
  cookie.sessionId = sessionId;
  await cookie.save();
}

export async function clearSessionCookie(): Promise<void> {
  (await open()).destroy();
}
