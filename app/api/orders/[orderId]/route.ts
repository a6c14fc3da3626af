import { getOrder } from "@/lib/schemas/order";
import { handle } from "@/lib/server/http/handle";
import { readOrder } from "@/lib/server/orders/read-orders";

export const GET = handle(getOrder, async ({ access, params, query }) =>
  readOrder(access.shopId, params.orderId, query.revision),
);
