import * as endpoint from "@/lib/schemas/layout";
import { handle } from "@/lib/server/http/handle";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";

export const GET = handle(endpoint.getLayout, async ({ access, params }) => readLayout(access, params.faceId));
export const PUT = handle(endpoint.saveLayout, async ({ access, params, body }) => saveLayout(access, params.faceId, body));
