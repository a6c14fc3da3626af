import { startSearch as endpoint } from "@/lib/schemas/wood-search";
import { handle } from "@/lib/server/http/handle";
import { startSearch } from "@/lib/server/search/start-search";

export const POST = handle(endpoint, ({ access, params, body }) => startSearch(access, params.faceId, body));
