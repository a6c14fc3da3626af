import * as endpoint from "@/lib/schemas/shop";
import { handle } from "@/lib/server/http/handle";
import { saveShopSettings, shopSettings } from "@/lib/server/shops";

export const GET = handle(endpoint.getShop, async ({ access }) => shopSettings(access.shopId));
export const PUT = handle(endpoint.updateShop, async ({ access, body }) => saveShopSettings(access, body));
