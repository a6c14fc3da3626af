import { getMovementSettings, updateMovementSettings } from "@/lib/schemas/movement";
import { handle } from "@/lib/server/http/handle";
import { movementSettings, saveMovementSettings } from "@/lib/server/movement/settings";

export const GET = handle(getMovementSettings, async ({ access }) => movementSettings(access.shopId));
export const PUT = handle(updateMovementSettings, async ({ access, body }) => saveMovementSettings(access, body));
