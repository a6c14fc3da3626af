"use client";
import { Choice } from "../ui/choice";
import { LengthField } from "../ui/length-field";
import { Notice } from "../ui/notice";
import { PanelSection } from "../ui/panel-section";
import type { Draft } from "./draft";
import type { MarkingState } from "./use-marking";

/** What in the photograph has a known size. */
export function ReferencePanel({ marking }: { marking: MarkingState }) {
  const { draft, change, fit } = marking;
  return (
    <PanelSection title="What has a known size?">
      <Choice
        legend="The scale comes from"
        value={draft.reference}
        options={[
          { value: "board", label: "the board itself" },
          { value: "sheet", label: "a sheet lying on it" },
        ]}
        onChange={(reference) => change((from) => ({ ...from, reference }))}
      />
      {draft.reference === "board" ? (
        <div className="grid grid-cols-2 gap-3">
          <LengthField
            label="True length"
            hint="Along the grain"
            value={draft.length}
            onChange={(length) => change((from) => ({ ...from, length }))}
          />
          <LengthField
            label="True width"
            hint="Across the grain"
            value={draft.width}
            onChange={(width) => change((from) => ({ ...from, width }))}
          />
        </div>
      ) : (
        <SheetFields draft={draft} change={change} />
      )}
      {fit?.ok && fit.sheetLooksTurned && (
        <Notice kind="care">
          The sheet looks as if it lay the other way round.{" "}
          <button type="button" className="font-semibold text-chalk underline" onClick={() => change(turned)}>
            Turn it
          </button>{" "}
          or check a distance you know.
        </Notice>
      )}
    </PanelSection>
  );
}

const turned = (draft: Draft): Draft => ({
  ...draft,
  sheet:
    draft.sheet.paper === "own"
      ? { ...draft.sheet, ownLength: draft.sheet.ownWidth, ownWidth: draft.sheet.ownLength }
      : { ...draft.sheet, upright: !draft.sheet.upright },
});

function SheetFields({ draft, change }: Pick<MarkingState, "draft" | "change">) {
  const { sheet } = draft;
  const set = (fields: Partial<Draft["sheet"]>) => change((from) => ({ ...from, sheet: { ...from.sheet, ...fields } }));
  return (
    <>
      <Choice
        legend="Sheet"
        value={sheet.paper}
        options={[
          { value: "a4", label: "A4" },
          { value: "letter", label: "US Letter" },
          { value: "own", label: "own size" },
        ]}
        onChange={(paper) => set({ paper })}
      />
      {sheet.paper === "own" ? (
        <div className="grid grid-cols-2 gap-3">
          <LengthField label="From corner 1 to 2" value={sheet.ownLength} onChange={(ownLength) => set({ ownLength })} />
          <LengthField label="From corner 2 to 3" value={sheet.ownWidth} onChange={(ownWidth) => set({ ownWidth })} />
        </div>
      ) : (
        <Choice
          legend="Its side from corner 1 to 2 is"
          value={sheet.upright ? "short" : "long"}
          options={[
            { value: "long", label: "the long one" },
            { value: "short", label: "the short one" },
          ]}
          onChange={(side) => set({ upright: side === "short" })}
        />
      )}
      <p className="text-sm text-pencil">
        Lay the sheet flat on the wood, near the middle. Mark its corners, then those of the board, which is measured by it.
      </p>
    </>
  );
}
