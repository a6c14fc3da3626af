/** Who is calling, as far as the connection tells. */
import "server-only";

/** The address for limits on tries: the last one the nearest proxy added, which is the connection's own where there is none. */
export function callerAddress(request: Request): string {
  return request.headers.get("x-forwarded-for")?.split(",").at(-1)?.trim() ?? "unknown";
}

export function callerDevice(request: Request): string {
  return request.headers.get("user-agent") ?? "unknown device";
}
