import { getOrderLabels } from "@/lib/schemas/order";
import { handle } from "@/lib/server/http/handle";
import { labelFile } from "@/lib/server/orders/print";

export const GET = handle(getOrderLabels, async ({ access, params, query }) => labelFile(access.shopId, params.orderId, query));
