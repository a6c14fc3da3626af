import Link from "next/link";
import { buttonClass } from "@/components/ui/button";
import { ProgressTape } from "@/components/ui/progress-tape";
import type { OrderRow } from "@/lib/schemas/order";
import { revisionLetter } from "@/lib/words/revision-letter";
import { supersededWhy } from "@/lib/words/superseded";

/** Issued orders with how far the bench is. */
export function OrdersAtBench({ orders }: { orders: readonly OrderRow[] }) {
  return (
    <ul className="grid gap-3 sm:grid-cols-2">
      {orders.map((order) => (
        <li key={order.id} className="flex flex-col gap-2 rounded-md border border-rule bg-sheet p-4">
          <div className="flex items-baseline justify-between gap-2">
            <Link
              href={`/orders/${order.id}`}
              className="font-measure text-lg font-semibold text-chalk underline-offset-4 hover:underline"
            >
              Cut order {order.number} {revisionLetter(order.revision)}
            </Link>
            <span className="measure text-pencil">{order.boards.join(", ")}</span>
          </div>
          <p className="text-sm">
            {order.jobTitle}: {order.faceTitles.join(", ")}
          </p>
          {order.superseded && <p className="text-sm text-crayon">Superseded: {supersededWhy}. Issue it again.</p>}
          <ProgressTape done={order.ticked} of={order.steps} label={`Cut order ${order.number}`} />
          <div className="flex items-center justify-between gap-2">
            <span className="measure text-sm">
              {order.ticked} of {order.steps} steps
            </span>
            <Link href={`/bench/${order.id}`} className={buttonClass("plain", "small")}>
              To the bench
            </Link>
          </div>
        </li>
      ))}
    </ul>
  );
}
