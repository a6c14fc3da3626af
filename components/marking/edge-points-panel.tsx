"use client";
import { X } from "lucide-react";
import { useUnits } from "../shell/units";
import { Button } from "../ui/button";
import { PanelSection } from "../ui/panel-section";
import { edgeNames, lensWords, printFine } from "./mark-words";
import { type MarkId, marksOf } from "./marks";
import type { MarkingState } from "./use-marking";

/** Points along the straight edges, and whether they took out the bending of the lens. */
export function EdgePointsPanel({ marking, onShow }: { marking: MarkingState; onShow: (mark: MarkId) => void }) {
  const { style } = useUnits();
  const { draft, fit, adding } = marking;
  return (
    <PanelSection
      title="Straight edges"
      lead="Optional. A phone's lens bends edges a little. Tap along an edge that you know to be straight, well spread out."
    >
      {draft.edgePoints.length > 0 && (
        <ul className="flex flex-wrap gap-1">
          {marksOf(draft, "edge").map((mark) => {
            const { index } = mark;
            const edge = draft.edgePoints[index]?.edge ?? "top";
            const off = fit?.ok
              ? fit.residuals.find((residual) => residual.mark === "edge" && residual.index === index)
              : undefined;
            return (
              <li key={index} className="flex items-center rounded-md border border-rule text-sm">
                <button type="button" className="min-h-9 px-2 hover:bg-chalk-wash" onClick={() => onShow(mark)}>
                  {index + 1} {edgeNames[edge]} {off && <span className="measure">{printFine(off.mm, style)}</span>}
                </button>
                <button
                  type="button"
                  aria-label={`Remove edge point ${index + 1}`}
                  className="grid size-9 place-items-center text-crayon hover:bg-crayon-wash"
                  onClick={() => marking.remove(mark)}
                >
                  <X className="size-4" aria-hidden="true" />
                </button>
              </li>
            );
          })}
        </ul>
      )}
      {fit?.ok && draft.edgePoints.length > 0 && <p className="text-sm">{lensWords(fit.lens, style)}</p>}
      <Button
        size="small"
        className="self-start"
        aria-pressed={adding === "edge"}
        onClick={() => marking.add(adding === "edge" ? null : "edge")}
      >
        {adding === "edge" ? "Done with edge points" : "Add points along the edges"}
      </Button>
    </PanelSection>
  );
}
