"use client";
/** A run round corners: folded, and what every corner takes of both faces. */
import { useUnits } from "@/components/shell/units";
import { printedLength, type Um, type WrapCornerPlan, type WrapPlan, wrapPlan } from "@/lib/layout";
import { FoldedView } from "./folded-view";
import { PanelSection } from "./panel-section";
import { useLiveLayout } from "./use-live-layout";

export function RunSection() {
  const { print, units } = useUnits();
  const layout = useLiveLayout();
  const plan = wrapPlan(layout);
  if (plan === null) return null;
  return (
    <PanelSection title="Corners" beside={units === "mm" ? "mm" : "inches"}>
      <FoldedView layout={layout} />
      <dl className="grid grid-cols-[1fr_auto] gap-x-4 gap-y-1 text-sm">
        <dt>Wood it takes, along and across</dt>
        <dd className="measure text-right">
          {print(plan.wood.length)} × {print(plan.wood.width)}
        </dd>
        <dt>Unfolded, end to end</dt>
        <dd className="measure text-right">{print(plan.run)}</dd>
      </dl>
      <CornerTable plan={plan} />
      <SideTable plan={plan} />
      {plan.closure && <Closure closure={plan.closure} />}
    </PanelSection>
  );
}

function useFigure() {
  const { style } = useUnits();
  return (length: Um) => printedLength(length, style).figure;
}

function CornerTable({ plan }: { plan: WrapPlan }) {
  const figure = useFigure();
  return (
    <table className="w-full text-sm">
      <thead className="text-left text-pencil">
        <tr>
          <th className="py-1 font-normal">corner</th>
          <th className="py-1 text-right font-normal">bevel</th>
          <th className="py-1 text-right font-normal">lost, show</th>
          <th className="py-1 text-right font-normal">lost, inner</th>
          <th className="py-1 text-right font-normal">jump</th>
        </tr>
      </thead>
      <tbody className="measure">
        {plan.corners.map((corner) => (
          <tr key={`${corner.before} ${corner.after}`} className="border-t border-rule">
            <th scope="row" className="py-1 text-left font-sans font-normal">
              {corner.before.slice(1)} and {corner.after.slice(1)}
            </th>
            <td className="text-right">{corner.bevelDeg === 0 ? "square" : `${Number(corner.bevelDeg.toFixed(2))}°`}</td>
            <PartedCells corner={corner} figure={figure} />
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function PartedCells({ corner: { parted }, figure }: { corner: WrapCornerPlan; figure: (length: Um) => string }) {
  if (parted === null) {
    return (
      <td colSpan={3} className="text-right font-sans font-normal text-pencil">
        closes the run: no figure runs on
      </td>
    );
  }
  return (
    <>
      <td className="text-right">{figure(parted.loss.show)}</td>
      <td className="text-right">{figure(parted.loss.inner)}</td>
      <td className="text-right">{figure(parted.jump)}</td>
    </>
  );
}

function SideTable({ plan }: { plan: WrapPlan }) {
  const figure = useFigure();
  return (
    <table className="w-full text-sm">
      <thead className="text-left text-pencil">
        <tr>
          <th className="py-1 font-normal">side</th>
          <th className="py-1 text-right font-normal">show face</th>
          <th className="py-1 text-right font-normal">inner face</th>
        </tr>
      </thead>
      <tbody className="measure">
        {plan.sides.map(({ piece, show, inner }) => (
          <tr key={piece} className="border-t border-rule">
            <th scope="row" className="py-1 text-left font-sans font-normal">
              {piece.slice(1)}
            </th>
            <td className="text-right">{figure(show)}</td>
            <td className="text-right">{figure(inner)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** Half a millimetre or a twentieth of a degree is within what a glue line hides (common practice, no source). */
const CLOSES_WITHIN = { off: 500, turnDeg: 0.05 };

function Closure({ closure: { off, turnOffDeg } }: { closure: NonNullable<WrapPlan["closure"]> }) {
  const { print } = useUnits();
  const closes = off <= CLOSES_WITHIN.off && Math.abs(turnOffDeg) <= CLOSES_WITHIN.turnDeg;
  return (
    <p className={`text-sm ${closes ? "text-moss" : "text-crayon"}`}>
      {closes
        ? "The run closes."
        : `The run does not close: it misses its start by ${print(off)} and a whole turn by ${Number(turnOffDeg.toFixed(2))}°. Change the sides or the corners.`}
    </p>
  );
}
