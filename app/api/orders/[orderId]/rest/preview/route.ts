import * as endpoint from "@/lib/schemas/rest";
import { handle } from "@/lib/server/http/handle";
import { previewRest } from "@/lib/server/orders/issue-rest";

export const POST = handle(endpoint.previewRest, async ({ access, params, body }) =>
  previewRest(access, params.orderId, body.choices),
);
