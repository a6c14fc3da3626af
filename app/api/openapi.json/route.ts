import { getOpenApi } from "@/lib/schemas/service";
import { handle } from "@/lib/server/http/handle";
import { openApiDocument } from "@/lib/server/http/openapi";

export const GET = handle(getOpenApi, async () => openApiDocument());
