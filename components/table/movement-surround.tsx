"use client";
/** What stands round the fronts: its construction, its own moisture, and the gap to it. */
import { SelectField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { NumberField } from "@/components/ui/number-field";
import { FIBRE_SATURATION, type Surround } from "@/lib/layout";
import { type SurroundChoice, surroundChoiceOf, surroundChoices, surroundHints } from "@/lib/words/movement";
import { useTableContext } from "./table-context";
import { type Movement, useChoose } from "./use-movement";

export function MovementSurround({ movement: { facts, outcome } }: { movement: Movement }) {
  const { editor } = useTableContext();
  const choose = useChoose();
  const { surround, around } = facts.choices;
  const chosen = surroundChoiceOf(surround);
  // A rail that the fronts are cut from is part of the layout and moves as its own wood does.
  if (outcome.gaps.length > 0 && outcome.gaps.every(({ rail }) => rail !== null)) {
    return <p className="text-sm">The rail round the fronts is cut from the same wood and moves with them.</p>;
  }
  return (
    <fieldset className="flex flex-col gap-2" disabled={!editor.mayChange}>
      <SelectField
        label="What stands round the fronts"
        hint={surroundHints[chosen]}
        value={chosen}
        onChange={(event) => {
          const choice = surroundChoices.find(({ value }) => value === event.target.value);
          if (choice) choose.mutate(() => ({ surround: surroundOf(choice.value, surround) }));
        }}
      >
        {surroundChoices.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </SelectField>
      <div className="grid grid-cols-2 items-start gap-2">
        <LengthField
          label="Gap round the fronts"
          hint="Empty: none"
          value={around}
          onChange={(length) => (length === null || length >= 0) && choose.mutate(() => ({ around: length }))}
        />
        {surround.kind === "sameWood" && (
          <NumberField
            label="Its moisture, %"
            hint="Empty: as the board"
            value={surround.moisture}
            min={0}
            max={FIBRE_SATURATION}
            onChange={(moisture) => choose.mutate(() => ({ surround: { ...surround, moisture } }))}
          />
        )}
      </div>
    </fieldset>
  );
}

/** Another construction of the same solid wood keeps its reading. */
function surroundOf(choice: SurroundChoice, before: Surround): Surround {
  if (choice === "none" || choice === "sheet") return { kind: choice };
  return { kind: "sameWood", grain: choice, moisture: before.kind === "sameWood" ? before.moisture : null };
}
