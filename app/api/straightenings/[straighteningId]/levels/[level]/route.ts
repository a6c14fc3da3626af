import { getStraighteningLevel } from "@/lib/schemas/straightening";
import { handle } from "@/lib/server/http/handle";
import { straighteningLevel } from "@/lib/server/straightenings/straightenings";

export const GET = handle(getStraighteningLevel, async ({ access, params }) =>
  straighteningLevel(access, params.straighteningId, params.level),
);
