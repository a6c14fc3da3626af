import { getSearch } from "@/lib/schemas/wood-search";
import { handle } from "@/lib/server/http/handle";
import { readSearch } from "@/lib/server/search/read-search";

export const GET = handle(getSearch, ({ access, params }) => readSearch(access, params.searchId));
