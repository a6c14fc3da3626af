"use client";
import { umFromMm } from "@/lib/layout";
import { marksRefusalWords } from "@/lib/words/marks-refusal";
import { useUnits } from "../shell/units";
import { Notice } from "../ui/notice";
import { resolutionText } from "../ui/resolution-text";
import { missingWords, printFine } from "./mark-words";
import type { MarkingState } from "./use-marking";

/** What is still missing, or why the marks give nothing, told as they move. Nothing when all is well. */
export function MarksNotice({ marking }: { marking: MarkingState }) {
  const { style } = useUnits();
  const { outcome, fit } = marking;
  if (!outcome.complete) return <Notice>{missingWords(outcome.missing)}</Notice>;
  return fit && !fit.ok ? <Notice kind="stop">{marksRefusalWords(fit.refusal, style)}</Notice> : null;
}

/** A corner set one pixel off is as good as a hand gets. Where that moves the board's far corner by more than this, its size is a guess. */
const doubtfulMmPerPixel = 2;

/** What the marks give. */
export function FitReport({ marking }: { marking: MarkingState }) {
  const { style, print } = useUnits();
  const { fit } = marking;
  if (!fit?.ok) return null;
  const scale = fit.scale;
  const doubtful = !(fit.mmPerPixelOfMark <= doubtfulMmPerPixel);
  return (
    <>
      <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1 text-sm">
        <dt>Board</dt>
        <dd className="measure text-right text-base whitespace-nowrap">
          {print(fit.length)} × {print(fit.width)}
        </dd>
        <dt>Picture</dt>
        <dd className="measure text-right text-base whitespace-nowrap">{resolutionText(scale.pxPerMm, style)}</dd>
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
      {doubtful && (
        <Notice kind="care">
          The size is a guess: a mark one pixel off moves a corner by{" "}
          <span className="measure">
            {Number.isFinite(fit.mmPerPixelOfMark) ? print(umFromMm(fit.mmPerPixelOfMark)) : "more than can be told"}
          </span>
          .{" "}
          {marking.draft.reference === "sheet"
            ? "Measure the board and let the scale come from it, or photograph it again with the sheet near the middle."
            : "Photograph the board again from nearer, or less from the side."}
        </Notice>
      )}
    </>
  );
}
