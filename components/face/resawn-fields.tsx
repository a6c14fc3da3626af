"use client";
import { Choice } from "@/components/ui/choice";
import { LengthField } from "@/components/ui/length-field";
import { NumberField } from "@/components/ui/number-field";
import type { Um } from "@/lib/layout";
import type { FieldsProps } from "./face-draft";
import type { ResawnDraft } from "./resawn-draft";

/** Two leaves from one thick board, opened like a book. */
export function ResawnFields({ draft, onChange }: FieldsProps<ResawnDraft>) {
  const { leaf, resaw } = draft;
  const length = (label: string, value: Um, take: (value: Um) => ResawnDraft, hint?: string) => (
    <LengthField
      label={label}
      hint={hint}
      required
      value={value}
      onChange={(next) => next !== null && next >= 0 && onChange(take(next))}
    />
  );
  return (
    <fieldset className="flex flex-col gap-4">
      <legend className="sr-only">The leaves</legend>
      <div className="grid grid-cols-2 gap-3">
        {length("Width of a leaf", leaf.width, (width) => ({ ...draft, leaf: { ...leaf, width } }), "Finished")}
        {length("Height of a leaf", leaf.height, (height) => ({ ...draft, leaf: { ...leaf, height } }))}
        {length("Thickness of a leaf", leaf.thickness, (thickness) => ({ ...draft, leaf: { ...leaf, thickness } }))}
        {length("Kerf of the resaw", resaw.kerf, (kerf) => ({ ...draft, resaw: { ...resaw, kerf } }))}
        {length("Planed off each sawn face", resaw.planing, (planing) => ({ ...draft, resaw: { ...resaw, planing } }))}
        <NumberField
          label="Lean of the figure, degrees"
          hint="From the face’s normal, across the grain. Leave empty while you do not know"
          value={draft.leanDeg}
          min={-80}
          max={80}
          digits={1}
          onChange={(leanDeg) => onChange({ ...draft, leanDeg })}
        />
      </div>
      <Choice
        legend="The second leaf hangs"
        value={draft.opens}
        options={[
          { value: "side", label: "Beside the first" },
          { value: "over", label: "Below the first" },
        ]}
        onChange={(opens) => onChange({ ...draft, opens })}
      />
    </fieldset>
  );
}
