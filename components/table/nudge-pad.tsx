"use client";
/** Sliding by buttons: for a thumb, and for whoever does not drag. */
import { ArrowDown, ArrowLeft, ArrowRight, ArrowUp } from "lucide-react";
import { useState } from "react";
import { useUnits } from "@/components/shell/units";
import { nudgeStep } from "@/lib/editor/nudge-step";
import { type Direction, useTableActions } from "./table-actions";

const directions: readonly { readonly direction: Direction; readonly Icon: typeof ArrowLeft }[] = [
  { direction: "left", Icon: ArrowLeft },
  { direction: "right", Icon: ArrowRight },
  { direction: "up", Icon: ArrowUp },
  { direction: "down", Icon: ArrowDown },
];

export function NudgePad() {
  const { print, style } = useUnits();
  const { nudge } = useTableActions();
  const [coarse, setCoarse] = useState(false);
  return (
    <fieldset className="flex items-center gap-1">
      <legend className="sr-only">Slide what is chosen</legend>
      {directions.map(({ direction, Icon }) => (
        <button
          key={direction}
          type="button"
          aria-label={`Slide ${direction} by ${print(nudgeStep(style, coarse))}`}
          onClick={() => nudge(direction, coarse)}
          className="grid size-11 place-items-center rounded-md border border-line bg-sheet hover:bg-chalk-wash lg:size-8"
        >
          <Icon className="size-4" aria-hidden="true" />
        </button>
      ))}
      <button
        type="button"
        aria-label={`Step ${print(nudgeStep(style, coarse))}, change`}
        onClick={() => setCoarse(!coarse)}
        className="measure min-h-11 min-w-16 rounded-md px-2 text-sm text-chalk hover:bg-chalk-wash lg:min-h-8"
      >
        by {print(nudgeStep(style, coarse))}
      </button>
    </fieldset>
  );
}
