/** Every step is ticked. */
import Link from "next/link";
import type { Order } from "@/lib/schemas/order";
import { buttonClass } from "../ui/button";

export function OrderDone({ order }: { order: Order }) {
  return (
    <div
      role="status"
      className="flex flex-wrap items-center justify-between gap-3 rounded-sm border-l-8 border-moss bg-moss-wash p-4"
    >
      <p className="text-lg">
        <b>Cut order {order.number} is done.</b> Every step is ticked.
      </p>
      <Link href={`/orders/${order.id}`} className={buttonClass("plain")}>
        See the order
      </Link>
    </div>
  );
}
