import * as endpoint from "@/lib/schemas/as-cut";
import { handle } from "@/lib/server/http/handle";
import { enterAsCut } from "@/lib/server/orders/as-cut";

export const PUT = handle(endpoint.enterAsCut, async ({ access, params, body }) => enterAsCut(access, params, body));
