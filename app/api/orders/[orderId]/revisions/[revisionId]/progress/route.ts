import { getOrderProgress } from "@/lib/schemas/order";
import { handle } from "@/lib/server/http/handle";
import { orderProgress } from "@/lib/server/orders/read-orders";

export const GET = handle(getOrderProgress, async ({ access, params }) =>
  orderProgress(access.shopId, params.orderId, params.revisionId),
);
