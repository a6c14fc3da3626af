import { planBlank as endpoint } from "@/lib/schemas/blank";
import { planBlank } from "@/lib/server/blanks/plan-blank";
import { handle } from "@/lib/server/http/handle";

export const POST = handle(endpoint, async ({ access, body }) => planBlank(access, body));
