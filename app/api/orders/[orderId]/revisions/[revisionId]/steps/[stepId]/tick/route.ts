import * as endpoint from "@/lib/schemas/order";
import { handle } from "@/lib/server/http/handle";
import { tickStep, untickStep } from "@/lib/server/orders/ticks";

export const PUT = handle(endpoint.tickStep, async ({ access, params }) => tickStep(access, params));
export const DELETE = handle(endpoint.untickStep, async ({ access, params }) => untickStep(access, params));
