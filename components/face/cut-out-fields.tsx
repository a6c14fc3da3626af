"use client";
import { SelectField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { NumberField } from "@/components/ui/number-field";
import type { CutOutDraft } from "./cut-out-draft";
import type { FieldsProps } from "./face-draft";

/** A rail and the fronts that are cut out of it. */
export function CutOutFields({ draft, onChange }: FieldsProps<CutOutDraft>) {
  const length = (name: keyof CutOutDraft, label: string, hint?: string) => (
    <LengthField
      label={label}
      hint={hint}
      required
      value={draft[name] as CutOutDraft["length"]}
      onChange={(value) => value !== null && value >= 0 && onChange({ ...draft, [name]: value })}
    />
  );
  return (
    <fieldset className="flex flex-col gap-4">
      <legend className="sr-only">The rail</legend>
      <div className="grid grid-cols-2 gap-3">
        <NumberField
          label="Rows of fronts"
          value={draft.rows}
          min={1}
          max={20}
          digits={0}
          required
          onChange={(rows) => rows !== null && onChange({ ...draft, rows })}
        />
        <NumberField
          label="Fronts in a row"
          value={draft.fronts}
          min={1}
          max={40}
          digits={0}
          required
          onChange={(fronts) => fronts !== null && onChange({ ...draft, fronts })}
        />
        {length("length", "Length of the rail", "Finished, along the grain")}
        {length("rowHeight", "Height of the openings", "Finished, across the grain")}
        {length("strip", "Strips", "Above, between and below the rows")}
        {length("end", "Ends")}
        {length("divider", "Dividers", "Between two fronts")}
        {length("gap", "Gap round each front")}
        {length("fitting", "Fitting", "Planed off each end of a front, beyond the saw")}
      </div>
      <SelectField
        label="Edges between strips and rows"
        value={draft.rails}
        onChange={(event) => onChange({ ...draft, rails: event.target.value === "fromSaw" ? "fromSaw" : "jointed" })}
      >
        <option value="jointed">Jointed before gluing</option>
        <option value="fromSaw">Glued as they come from the saw</option>
      </SelectField>
    </fieldset>
  );
}
