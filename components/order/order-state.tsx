/** Where an order stands: ticked steps on a short tape, or that it no longer holds. */
import type { OrderRow } from "@/lib/schemas/order";

export function OrderState({ order }: { order: Pick<OrderRow, "state" | "superseded" | "steps" | "ticked"> }) {
  const { steps, ticked } = order;
  return (
    <span className="block">
      <span className="flex items-baseline justify-between gap-3 text-sm">
        <span className={order.state === "cut" ? "font-semibold text-moss" : ""}>
          {order.state === "cut" ? "Cut" : ticked === 0 ? "Not begun" : "At the bench"}
        </span>
        {order.superseded && <span className="font-semibold text-crayon">Superseded</span>}
        <span className="measure">
          {ticked} of {steps}
        </span>
      </span>
      <span className="mt-1 block h-2 overflow-hidden rounded-sm bg-rule" aria-hidden="true">
        <span
          className={`block h-full ${order.state === "cut" ? "bg-moss" : "bg-tape"}`}
          style={{ width: `${(ticked / steps) * 100}%` }}
        />
      </span>
    </span>
  );
}
