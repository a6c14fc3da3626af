/** Writes are taken from our own pages only. */
import "server-only";
import { FaultError } from "../faults";

const reading = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Refuses a write whose Origin is not ours. Browsers send Origin with every write; a request without one is let in only when the
 * browser itself says it came from our own page.
 */
export function checkSameOrigin(request: Request, appUrl: string): void {
  if (reading.has(request.method)) return;
  const origin = request.headers.get("origin");
  const ours = new URL(appUrl).origin;
  const same = origin === null ? request.headers.get("sec-fetch-site") === "same-origin" : origin === ours;
  if (!same) throw new FaultError("cross-site", `Writes are taken from ${ours} only.`);
}
