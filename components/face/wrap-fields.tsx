"use client";
import { Button } from "@/components/ui/button";
import { LengthField } from "@/components/ui/length-field";
import { CornerFields } from "./corner-fields";
import type { FieldsProps } from "./face-draft";
import type { WrapDraft } from "./wrap-draft";

/** The sides of a run and how its corners are made. Each corner can be changed by itself at the layout table. */
export function WrapFields({ draft, onChange }: FieldsProps<WrapDraft>) {
  const { sides } = draft;
  return (
    <fieldset className="flex flex-col gap-4">
      <legend className="sr-only">The run</legend>
      <div className="grid grid-cols-2 gap-3">
        {sides.map((side, index) => (
          <LengthField
            // biome-ignore lint/suspicious/noArrayIndexKey: a side is its place in the run
            key={index}
            label={`Side ${index + 1}`}
            hint={index === 0 ? "As seen, along the run" : undefined}
            required
            value={side}
            onChange={(value) => value !== null && value > 0 && onChange({ ...draft, sides: sides.with(index, value) })}
          />
        ))}
      </div>
      <div className="flex flex-wrap gap-2">
        <Button size="small" onClick={() => onChange({ ...draft, sides: [...sides, sides.at(-1) ?? draft.height] })}>
          Add a side
        </Button>
        {sides.length > 2 && (
          <Button size="small" onClick={() => onChange({ ...draft, sides: sides.slice(0, -1) })}>
            Remove the last side
          </Button>
        )}
      </div>
      <label className="flex min-h-11 items-center gap-2 md:min-h-8">
        <input
          type="checkbox"
          className="size-5 accent-chalk"
          checked={draft.closed}
          onChange={(event) => onChange({ ...draft, closed: event.target.checked })}
        />
        The run closes on itself, as a box does
      </label>
      <div className="grid grid-cols-2 gap-3">
        <LengthField
          label="Height"
          hint="Upright to the run"
          required
          value={draft.height}
          onChange={(height) => height !== null && height > 0 && onChange({ ...draft, height })}
        />
        <LengthField
          label="Thickness"
          hint="Finished"
          required
          value={draft.thickness}
          onChange={(thickness) => thickness !== null && thickness > 0 && onChange({ ...draft, thickness })}
        />
      </div>
      <fieldset className="flex flex-col gap-2">
        <legend className="mb-1 font-semibold">Corners</legend>
        <CornerFields corner={draft.corner} onChange={(corner) => onChange({ ...draft, corner })} />
      </fieldset>
    </fieldset>
  );
}
