import { listOrders } from "@/lib/schemas/order";
import { handle } from "@/lib/server/http/handle";
import { orderPage } from "@/lib/server/orders/read-orders";

export const GET = handle(listOrders, async ({ access, query }) => orderPage(access.shopId, query));
