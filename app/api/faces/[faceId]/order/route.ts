import * as endpoint from "@/lib/schemas/order";
import { handle } from "@/lib/server/http/handle";
import { issueOrder } from "@/lib/server/orders/issue";

export const POST = handle(endpoint.issueOrder, async ({ access, params, body }) =>
  issueOrder(access, params.faceId, body.layoutRevision),
);
