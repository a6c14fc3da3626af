"use client";
import { useUnits } from "@/components/shell/units";
import { factsOf } from "@/lib/editor/selectors/facts";
import { type SeamRelation, seamRelation } from "@/lib/editor/selectors/seam-relation";
import { jumpOf } from "@/lib/editor/view/jump-chips";
import { cutBetween, type Drift, type Face, printedLength, type Seam, type UmRange } from "@/lib/layout";
import { PanelSection } from "./panel-section";
import { useTableContext } from "./table-context";
import { useLiveLayout } from "./use-live-layout";

export function SeamsSection() {
  const { editor } = useTableContext();
  const { style, units } = useUnits();
  const layout = useLiveLayout();
  const { seams, drifts, pieceById } = factsOf(layout);
  const figure = (range: UmRange) => printedLength(jumpOf(range), style).figure;
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
                <th className="py-1 text-right font-normal">gap</th>
                <th className="py-1 text-right font-normal">along</th>
                <th className="py-1 text-right font-normal">across</th>
                <th className="py-1 text-right font-normal">drift</th>
              </tr>
            </thead>
            <tbody className="measure">
              {seams.map((seam) => (
                <tr key={`${seam.a} ${seam.b}`} className="border-t border-rule hover:bg-chalk-wash">
                  <td className="py-0.5">
                    <button
                      type="button"
                      onClick={() => editor.select([seam.a, seam.b])}
                      className="min-h-8 text-left font-sans font-normal text-chalk underline-offset-2 hover:underline"
                    >
                      {seam.a.slice(1)} and {seam.b.slice(1)}
                    </button>
                  </td>
                  <td className="text-right">{printedLength(seam.gap, style).figure}</td>
                  <JumpCells seam={seam} relation={seamRelation(seam, pieceById)} figure={figure} />
                  <td className="text-right">{driftFigure(seam, layout.face, drifts.get(seam.b) ?? null)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      <p className="text-xs text-pencil">
        Along and across the grain: how far the figure jumps at the seam. Drift: how far the second front’s figure has wandered
        from the anchor in the direction of the seam.
      </p>
    </PanelSection>
  );

  function driftFigure({ normal }: Seam, face: Face, drift: Drift["drift"]): string {
    if (drift === null) return "–";
    const cut = cutBetween(normal === "right" ? "columns" : "rows", face.grain);
    return printedLength(cut === "crosscut" ? drift.along : drift.across, style).figure;
  }
}

const sayings: Readonly<Record<Exclude<SeamRelation, "runs-on">, string>> = {
  "no-wood": "no wood yet",
  "other-wood": "other wood",
  turned: "turned",
};

function JumpCells({ seam, relation, figure }: { seam: Seam; relation: SeamRelation; figure: (range: UmRange) => string }) {
  if (relation !== "runs-on" || seam.jump === null) {
    return (
      <td colSpan={2} className="text-right font-normal text-pencil">
        {sayings[relation === "runs-on" ? "other-wood" : relation]}
      </td>
    );
  }
  return (
    <>
      <td className="text-right">{figure(seam.jump.along)}</td>
      <td className="text-right">{figure(seam.jump.across)}</td>
    </>
  );
}
