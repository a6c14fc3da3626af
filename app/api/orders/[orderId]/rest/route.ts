import * as endpoint from "@/lib/schemas/rest";
import { handle } from "@/lib/server/http/handle";
import { issueRest } from "@/lib/server/orders/issue-rest";

export const POST = handle(endpoint.issueRest, async ({ access, params, body }) => issueRest(access, params.orderId, body));
