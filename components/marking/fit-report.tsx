"use client";
import { umFromMm } from "@/lib/layout";
import { marksRefusalWords } from "@/lib/words/marks-refusal";
import { useUnits } from "../shell/units";
import { Notice } from "../ui/notice";
import { missingWords, printFine } from "./mark-words";
import type { MarkingState } from "./use-marking";

/** What is still missing, or why the marks give nothing, told as they move. Nothing when all is well. */
export function MarksNotice({ marking }: { marking: MarkingState }) {
  const { style } = useUnits();
  const { outcome, fit } = marking;
  if (!outcome.complete) return <Notice>{missingWords(outcome.missing)}</Notice>;
  return fit && !fit.ok ? <Notice kind="stop">{marksRefusalWords(fit.refusal, style)}</Notice> : null;
}

/** What the marks give. */
export function FitReport({ marking }: { marking: MarkingState }) {
  const { style, print } = useUnits();
  const { fit } = marking;
  if (!fit?.ok) return null;
  const scale = fit.scale;
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1 text-sm">
      <dt>Board</dt>
      <dd className="measure text-right text-base whitespace-nowrap">
        {print(fit.length)} × {print(fit.width)}
      </dd>
      <dt>Picture</dt>
      <dd className="measure text-right text-base whitespace-nowrap">{scale.pxPerMm.toFixed(2)} px/mm</dd>
      <dt>One pixel off moves a corner by</dt>
      <dd className="measure text-right text-base whitespace-nowrap">
        {Number.isFinite(fit.mmPerPixelOfMark) ? print(umFromMm(fit.mmPerPixelOfMark)) : "more than can be told"}
      </dd>
      {fit.residuals.some(({ mark }) => mark === "extra") && (
        <>
          <dt>Marks agree within</dt>
          <dd className="measure text-right text-base whitespace-nowrap">{printFine(fit.rmsMm, style)}</dd>
        </>
      )}
    </dl>
  );
}
