"use client";
/** What a cut-out takes and how it is glued up again: wood needed, shifts, openings and trimmed fronts. */
import { useUnits } from "@/components/shell/units";
import { cutOutPlan, printedLength, type Um, um } from "@/lib/layout";
import { PanelSection } from "./panel-section";
import { useLiveLayout } from "./use-live-layout";

export function GluingSection() {
  const { print, style, units } = useUnits();
  const layout = useLiveLayout();
  const plan = cutOutPlan(layout);
  if (plan === null) return null;
  const figure = (length: Um) => printedLength(length, style).figure;
  const { wood, outside, shifts, fronts, openings } = plan;
  return (
    <PanelSection title="Gluing up" beside={units === "mm" ? "mm" : "inches"}>
      <dl className="grid grid-cols-[1fr_auto] gap-x-4 gap-y-1 text-sm">
        <dt>Wood it takes, along and across</dt>
        <dd className="measure text-right">
          {print(wood.length)} × {print(wood.width)}
        </dd>
        <dt>Rail as glued up</dt>
        <dd className="measure text-right">
          {print(outside.width)} × {print(outside.height)}
        </dd>
        <dt>Lost at each rip</dt>
        <dd className="measure text-right">{print(plan.ripLoss)}</dd>
      </dl>
      <table className="w-full text-sm">
        <caption className="mb-1 text-left text-pencil">
          How far each part is moved against the place it was cut from, to be marked across the cuts before gluing
        </caption>
        <thead className="text-left text-pencil">
          <tr>
            <th className="py-1 font-normal">part</th>
            <th className="py-1 text-right font-normal">along</th>
            <th className="py-1 text-right font-normal">across</th>
          </tr>
        </thead>
        <tbody className="measure">
          {shifts.map(({ piece, role, shift }) => (
            <tr key={piece} className="border-t border-rule">
              <th scope="row" className="py-1 text-left font-sans font-normal">
                {role === "strip" ? "Strip" : "Part"} {piece.slice(1)}
              </th>
              {shift === null ? (
                <td colSpan={2} className="text-right font-sans font-normal text-pencil">
                  not with the set
                </td>
              ) : (
                <>
                  <td className="text-right">{way(shift.along, figure, "→", "←")}</td>
                  <td className="text-right">{way(shift.across, figure, "↓", "↑")}</td>
                </>
              )}
            </tr>
          ))}
        </tbody>
      </table>
      <table className="w-full text-sm">
        <thead className="text-left text-pencil">
          <tr>
            <th className="py-1 font-normal">front</th>
            <th className="py-1 text-right font-normal">opening</th>
            <th className="py-1 text-right font-normal">sawn</th>
            <th className="py-1 text-right font-normal">trimmed</th>
          </tr>
        </thead>
        <tbody className="measure">
          {fronts.map(({ front, sawn, finished }, index) => (
            <tr key={front} className="border-t border-rule">
              <th scope="row" className="py-1 text-left font-sans font-normal">
                {front.slice(1)}
              </th>
              <td className="text-right">{size(openings[index] ?? finished, figure)}</td>
              <td className="text-right">{size(sawn, figure)}</td>
              <td className="text-right">{size(finished, figure)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </PanelSection>
  );
}

function size({ width, height }: { width: Um; height: Um }, figure: (length: Um) => string): string {
  return `${figure(width)} × ${figure(height)}`;
}

function way(length: Um, figure: (length: Um) => string, on: string, back: string): string {
  if (length === 0) return figure(length);
  return `${length > 0 ? on : back} ${figure(um(Math.abs(length)))}`;
}
