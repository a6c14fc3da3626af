/** Puts a member's session into the jar, so that route handlers see them as signed in. Import `cookie-jar` first. */
import type { ShopAccess } from "@/lib/server/access";
import { writeSessionId } from "@/lib/server/session-cookie";
import { emptyJar } from "./cookie-jar";

export async function actAs(access: ShopAccess): Promise<void> {
  emptyJar();
  await writeSessionId(access.sessionId);
}
