import { updateSaw } from "@/lib/schemas/shop";
import { handle } from "@/lib/server/http/handle";
import { changeSaw } from "@/lib/server/shops";

export const PUT = handle(updateSaw, async ({ access, body, params }) => changeSaw(access, params.sawId, body));
