"use client";
/** The thumb's part of the screen: done and on to the next, back, and the list of all steps. */
import { messageOf } from "@/lib/client/fault-from-server";
import type { OrderStep } from "@/lib/schemas/order-steps";
import { isShaving } from "@/lib/words/cut-title";
import { Button, buttonClass } from "../ui/button";
import type { BenchState } from "./use-bench";

export function BenchButtons({ bench, onList }: { bench: BenchState; onList: () => void }) {
  const { steps, ticks, at, step, pending, error } = bench;
  if (!step) return null;
  const ticked = ticks.has(step.id);
  const othersOpen = steps.some(({ id }, place) => place !== at && !ticks.has(id));
  const big = `${buttonClass("primary")} min-h-16! w-full text-xl!`;
  return (
    <div className="sticky bottom-0 border-t border-rule bg-sheet">
      <div className="mx-auto flex max-w-3xl flex-col gap-2.5 p-4 pb-[max(1rem,env(safe-area-inset-bottom))]">
        {error && (
          <p role="alert" className="text-crayon">
            {messageOf(error)}
          </p>
        )}
        {ticked ? (
          <button type="button" className={big} disabled={at >= steps.length - 1} onClick={() => bench.show(at + 1)}>
            Next step
          </button>
        ) : (
          <button type="button" className={big} disabled={pending} onClick={bench.finishStep}>
            {pending ? "Saving…" : `${doneWord(step)}, ${othersOpen ? "next step" : "all done"}`}
          </button>
        )}
        <div className="grid grid-cols-3 gap-2.5">
          <Button className="min-h-13!" disabled={at === 0} onClick={() => bench.show(at - 1)}>
            Back
          </Button>
          <Button className="min-h-13!" onClick={onList}>
            All steps
          </Button>
          {ticked ? (
            <Button className="min-h-13!" disabled={pending} onClick={() => bench.untick(step.id)}>
              Untick
            </Button>
          ) : (
            <Button className="min-h-13!" disabled={at >= steps.length - 1} onClick={() => bench.show(at + 1)}>
              Look ahead
            </Button>
          )}
        </div>
      </div>
    </div>
  );
}

function doneWord(step: OrderStep): string {
  switch (step.kind) {
    case "fetch":
    case "fetch-member":
      return "Fetched";
    case "arrange":
      return "Laid out";
    case "trim-edge":
      return "Trimmed";
    case "joint":
      return "Jointed";
    case "glue-up":
      return "Glued up";
    case "mark":
      return "Marked";
    case "gauge-lines":
      return "Drawn";
    case "resaw":
      return "Resawn";
    case "bevel":
      return "Bevelled";
    case "set-back":
      return "Glued";
    case "fit":
      return "Fitted";
    case "test-cut":
      return "Tested";
    case "cut":
      if (isShaving(step.cut, step.board)) return "Planed";
      return step.cut.kind === "true" ? "Straight" : "Cut";
    case "clean-up":
      return "Cleaned up";
    case "rack":
      return "Racked";
  }
}
