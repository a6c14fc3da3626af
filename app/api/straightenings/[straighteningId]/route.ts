import { getStraightening } from "@/lib/schemas/straightening";
import { handle } from "@/lib/server/http/handle";
import { readStraightening } from "@/lib/server/straightenings/straightenings";

export const GET = handle(getStraightening, async ({ access, params }) => readStraightening(access, params.straighteningId));
