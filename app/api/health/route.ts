import { getHealth } from "@/lib/schemas/service";
import { checkHealth } from "@/lib/server/health";
import { handle } from "@/lib/server/http/handle";

export const GET = handle(getHealth, async () => {
  await checkHealth();
  return { ok: true as const };
});
