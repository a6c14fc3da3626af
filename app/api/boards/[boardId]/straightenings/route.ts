import * as endpoint from "@/lib/schemas/straightening";
import { handle } from "@/lib/server/http/handle";
import { startStraightening } from "@/lib/server/straightenings/start-straightening";
import { readStraightenings } from "@/lib/server/straightenings/straightenings";

export const GET = handle(endpoint.listStraightenings, async ({ access, params }) => ({
  items: await readStraightenings(access, params.boardId),
}));
export const POST = handle(endpoint.startStraightening, async ({ access, params, body }) =>
  startStraightening(access, params.boardId, body),
);
