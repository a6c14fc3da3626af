import { createSaw } from "@/lib/schemas/shop";
import { handle } from "@/lib/server/http/handle";
import { addSaw } from "@/lib/server/shops";

export const POST = handle(createSaw, async ({ access, body }) => addSaw(access, body));
