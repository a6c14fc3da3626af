/** Who is calling, as far as the connection tells. */
import "server-only";

/**
 * The caller's address: the entry that the outermost of our own proxies added to X-Forwarded-For. null where no proxy of ours stands
 * in front, since then anybody may write whatever they like into that header and the server has nothing else to go by.
 */
export function callerAddress(headers: Headers, trustedProxies: number): string | null {
  if (trustedProxies === 0) return null;
  const entries = headers.get("x-forwarded-for")?.split(",") ?? [];
  return entries.at(-trustedProxies)?.trim() || null;
}

export function callerDevice(headers: Headers): string {
  return headers.get("user-agent") ?? "unknown device";
}
