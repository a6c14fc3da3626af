import { getGrain } from "@/lib/schemas/figure";
import { grainOf } from "@/lib/server/figure/grain";
import { handle } from "@/lib/server/http/handle";

export const GET = handle(getGrain, ({ access, params, request }) => grainOf(access, params.straighteningId, request.signal));
