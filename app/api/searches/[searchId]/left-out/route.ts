import { listLeftOut } from "@/lib/schemas/wood-search";
import { handle } from "@/lib/server/http/handle";
import { readLeftOut } from "@/lib/server/search/read-search";

export const GET = handle(listLeftOut, ({ access, params, query }) => readLeftOut(access, params.searchId, query.page));
