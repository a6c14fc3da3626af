import * as endpoint from "@/lib/schemas/as-cut";
import { handle } from "@/lib/server/http/handle";
import { removeAsCut } from "@/lib/server/orders/as-cut";

export const DELETE = handle(endpoint.removeAsCut, async ({ access, params, query }) =>
  removeAsCut(access, params, query.seenVersion),
);
