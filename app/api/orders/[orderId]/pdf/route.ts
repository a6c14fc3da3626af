import { getOrderPdf } from "@/lib/schemas/order";
import { handle } from "@/lib/server/http/handle";
import { orderFile } from "@/lib/server/orders/print";

export const GET = handle(getOrderPdf, async ({ access, params, query }) => orderFile(access.shopId, params.orderId, query));
