"use client";
import { measureMm, umFromMm } from "@/lib/layout";
import { useUnits } from "../shell/units";
import { Button } from "../ui/button";
import { LengthField } from "../ui/length-field";
import { PanelSection } from "../ui/panel-section";
import { printFine } from "./mark-words";
import { differenceFrom } from "./marking-of";
import type { MarkingState } from "./use-marking";

/** A distance known from the real board, held against the picture. */
export function KnownDistancePanel({ marking }: { marking: MarkingState }) {
  const { print } = useUnits();
  const { draft, fit, change } = marking;
  const { known } = draft;
  const measuredMm = known && fit?.ok ? measureMm(fit.geometry, known.from, known.to) : null;
  return (
    <PanelSection
      title="Check a distance"
      lead="Measure something on the real board, mark its two ends here, and see what the picture makes of it."
    >
      {known && (
        <>
          <LengthField
            label="True distance"
            value={known.trueLength}
            onChange={(trueLength) => change((from) => (from.known ? { ...from, known: { ...from.known, trueLength } } : from))}
          />
          {measuredMm === null ? (
            <p className="text-sm">The corners come first: without them the photograph has no scale.</p>
          ) : (
            <Measured measuredMm={measuredMm} text={print(umFromMm(measuredMm))} trueLength={known.trueLength} />
          )}
        </>
      )}
      <div className="flex flex-wrap gap-2">
        <Button size="small" aria-pressed={marking.adding === "known-from"} onClick={() => marking.add("known-from")}>
          {known ? "Mark another distance" : "Mark a distance"}
        </Button>
        {known && (
          <Button size="small" kind="quiet" onClick={() => marking.remove({ of: "known", index: 0 })}>
            Remove it
          </Button>
        )}
      </div>
    </PanelSection>
  );
}

interface MeasuredProps {
  measuredMm: number;
  text: string;
  trueLength: Parameters<typeof differenceFrom>[0] | null;
}

function Measured({ measuredMm, text, trueLength }: MeasuredProps) {
  const { style } = useUnits();
  const difference = trueLength === null ? null : differenceFrom(trueLength, measuredMm);
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4 text-sm" aria-live="polite">
      <dt>In the picture</dt>
      <dd className="measure text-right text-base">{text}</dd>
      {difference && (
        <>
          <dt>Difference</dt>
          <dd className="measure text-right text-base">
            {sign(difference.mm)}
            {printFine(Math.abs(difference.mm), style)} ({sign(difference.percent)}
            {Math.abs(difference.percent).toFixed(2)} %)
          </dd>
        </>
      )}
    </dl>
  );
}

const sign = (value: number) => (value < 0 ? "−" : "+");
