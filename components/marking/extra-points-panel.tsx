"use client";
import { Trash2 } from "lucide-react";
import type { MarkResidual } from "@/lib/layout";
import { useUnits } from "../shell/units";
import { Button } from "../ui/button";
import { LengthField } from "../ui/length-field";
import { PanelSection } from "../ui/panel-section";
import type { DraftPoint } from "./draft";
import { printFine } from "./mark-words";
import { type MarkId, marksOf } from "./marks";
import type { MarkingState } from "./use-marking";

/** More points than the four corners need: each shows how far it disagrees with the rest. */
export function ExtraPointsPanel({ marking, onShow }: { marking: MarkingState; onShow: (mark: MarkId) => void }) {
  const { draft, outcome, fit } = marking;
  const residualOf = (index: number): MarkResidual | undefined => {
    if (!outcome.complete || !fit?.ok) return undefined;
    const inMarking = outcome.extraIndexes.indexOf(index);
    return fit.residuals.find(({ mark, index: at }) => mark === "extra" && at === inMarking);
  };
  return (
    <PanelSection
      title="Further points"
      lead={`Optional. A pencil mark whose place on the ${draft.reference} you have measured, from its corner 1.`}
    >
      {marksOf(draft, "extra").map((mark) => (
        <OnePoint key={mark.index} mark={mark} residual={residualOf(mark.index)} marking={marking} onShow={onShow} />
      ))}
      <Button size="small" className="self-start" aria-pressed={marking.adding === "extra"} onClick={() => marking.add("extra")}>
        Add a point
      </Button>
    </PanelSection>
  );
}

interface PointProps {
  mark: MarkId;
  residual: MarkResidual | undefined;
  marking: MarkingState;
  onShow: (mark: MarkId) => void;
}

function OnePoint({ mark, residual, marking, onShow }: PointProps) {
  const { style } = useUnits();
  const { index } = mark;
  const point = marking.draft.extraPoints[index];
  if (!point) return null;
  const set = (fields: Partial<DraftPoint>) =>
    marking.change((draft) => ({
      ...draft,
      extraPoints: draft.extraPoints.map((known, at) => (at === index ? { ...known, ...fields } : known)),
    }));
  const agrees = residual ? `off by ${printFine(residual.mm, style)}` : "enter its place";
  return (
    <div className="rounded-md border border-rule p-3">
      <div className="flex items-center justify-between gap-2">
        <button type="button" className="min-h-8 text-left font-semibold text-chalk underline" onClick={() => onShow(mark)}>
          Point {index + 1}
        </button>
        <span className="measure text-sm">{agrees}</span>
        <button
          type="button"
          aria-label={`Remove point ${index + 1}`}
          className="grid size-11 place-items-center rounded-md text-crayon hover:bg-crayon-wash"
          onClick={() => marking.remove(mark)}
        >
          <Trash2 className="size-5" aria-hidden="true" />
        </button>
      </div>
      <div className="grid grid-cols-2 gap-3">
        <LengthField label="Along" hint="From corner 1 towards 2" value={point.x} onChange={(x) => set({ x })} />
        <LengthField label="Across" hint="From that edge" value={point.y} onChange={(y) => set({ y })} />
      </div>
    </div>
  );
}
