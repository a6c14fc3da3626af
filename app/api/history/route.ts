import { listHistory } from "@/lib/schemas/history";
import { readHistory } from "@/lib/server/history";
import { handle } from "@/lib/server/http/handle";

export const GET = handle(listHistory, async ({ access, query }) => ({ items: await readHistory(access.shopId, query) }));
