"use client";
import { useState } from "react";
import { useUnits } from "@/components/shell/units";
import { factsOf } from "@/lib/editor/selectors/facts";
import { seamRelation } from "@/lib/editor/selectors/seam-relation";
import type { Seam } from "@/lib/layout";
import { seamFigures } from "@/lib/words/seam-reading";
import { PanelSection } from "./panel-section";
import { SeamDialog } from "./seam-dialog";
import { SeamRow } from "./seam-row";
import { useTableContext } from "./table-context";
import { useLiveLayout } from "./use-live-layout";
import { useSeamReadings } from "./use-seam-readings";

/** Every seam of the face: what the cuts do to the figure there, and what the photographs say. */
export function SeamsSection() {
  const { editor } = useTableContext();
  const { units } = useUnits();
  const layout = useLiveLayout();
  const { seams, pieceById } = factsOf(layout);
  const readings = useSeamReadings();
  const [open, setOpen] = useState<number | null>(null);
  const shown = open === null ? null : (seams[open] ?? null);
  const show = (index: number, { a, b }: Seam) => {
    setOpen(index);
    editor.select([a, b]);
  };
  const step = (by: 1 | -1) => {
    if (open === null) return;
    const next = (open + by + seams.length) % seams.length;
    const seam = seams[next];
    if (seam) show(next, seam);
  };
  return (
    <PanelSection title="Seams" beside={units === "mm" ? "mm" : "inches"}>
      {seams.length === 0 ? (
        <p className="text-sm text-pencil">A single front has no seams.</p>
      ) : (
        <div className="max-h-72 overflow-y-auto">
          <table className="w-full text-sm">
            <thead className="sticky top-0 bg-sheet text-left text-pencil">
              <tr>
                <th className="py-1 font-normal">between</th>
                {["gap", "along", "across", "step", "match", "tone"].map((name) => (
                  <th key={name} className="py-1 pl-1.5 text-right font-normal">
                    {name}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody className="measure">
              {seams.map((seam, index) => (
                <SeamRow
                  key={`${seam.a} ${seam.b}`}
                  seam={seam}
                  relation={seamRelation(seam, pieceById)}
                  reading={readings.of(seam)}
                  fresh={readings.fresh}
                  onOpen={() => show(index, seam)}
                />
              ))}
            </tbody>
          </table>
        </div>
      )}
      <p aria-live="polite" className="text-xs text-pencil">
        {readings.failed
          ? "The photographs could not be read. Step, match and tone are missing."
          : !readings.fresh && seams.length > 0 && "Reading the photographs…"}
      </p>
      <details className="text-xs text-pencil">
        <summary className="min-h-6 cursor-pointer text-chalk">What these figures mean</summary>
        <dl className="mt-1 flex flex-col gap-1">
          {seamFigures.map(({ name, means }) => (
            <div key={name}>
              <dt className="inline font-semibold">{name}: </dt>
              <dd className="inline">{means}</dd>
            </div>
          ))}
        </dl>
      </details>
      <SeamDialog
        layout={layout}
        seam={shown}
        relation={shown ? seamRelation(shown, pieceById) : "no-wood"}
        reading={shown ? readings.of(shown) : null}
        onClose={() => setOpen(null)}
        onStep={step}
      />
    </PanelSection>
  );
}
