"use client";
/** All steps of the order, to go to one or to take a tick back. */
import type { Order } from "@/lib/schemas/order";
import { stepWords, styleOf } from "@/lib/words/order-step";
import { WhoAndWhen } from "../order/who-and-when";
import { Button } from "../ui/button";
import { Modal } from "../ui/modal";
import type { BenchState } from "./use-bench";

interface Props {
  bench: BenchState;
  order: Order;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export function StepList({ bench, order, open, onOpenChange }: Props) {
  const { steps, ticks, at, pending } = bench;
  const style = styleOf(order.snapshot);
  return (
    <Modal open={open} onOpenChange={onOpenChange} title="All steps">
      <ol className="flex flex-col">
        {steps.map((step, place) => {
          const { verb, rest } = stepWords(step, style);
          const tick = ticks.get(step.id);
          return (
            <li key={step.id} className={`flex items-center gap-2 border-b border-rule ${place === at ? "bg-tape-wash" : ""}`}>
              <button
                type="button"
                aria-current={place === at ? "step" : undefined}
                className="flex min-h-13 grow items-center gap-3 px-2 py-1.5 text-left"
                onClick={() => {
                  bench.show(place);
                  onOpenChange(false);
                }}
              >
                <span className="measure w-8 shrink-0 text-right text-lg">{step.number}</span>
                <span className="min-w-0">
                  <span className="block">
                    <b>{verb}</b> {rest}
                  </span>
                  {tick && (
                    <span className="block text-sm text-moss">
                      Done: <WhoAndWhen tick={tick} />
                    </span>
                  )}
                </span>
              </button>
              {tick && (
                <Button
                  size="small"
                  disabled={pending}
                  aria-label={`Untick step ${step.number}`}
                  onClick={() => bench.untick(step.id)}
                >
                  Untick
                </Button>
              )}
            </li>
          );
        })}
      </ol>
    </Modal>
  );
}
