"use client";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { Notice } from "@/components/ui/notice";
import type { Um } from "@/lib/layout";
import { type Axis, type AxisDraft, axisSizes, draftByHand } from "./axis-draft";

interface Props {
  axis: Axis;
  draft: AxisDraft;
  onChange: (draft: AxisDraft) => void;
}

const words = {
  columns: {
    many: "widths",
    one: "Width",
    before: "Gap at the left",
    after: "Gap at the right",
    opening: "Opening, width",
    count: "Fronts side by side",
  },
  rows: {
    many: "heights",
    one: "Height",
    before: "Gap at the top",
    after: "Gap at the bottom",
    opening: "Opening, height",
    count: "Fronts one above the other",
  },
} as const;

/** Sizes along one axis of a face: worked out from an opening, or entered one by one. */
export function AxisForm({ axis, draft, onChange }: Props) {
  const { print } = useUnits();
  const word = words[axis];
  const result = axisSizes(draft);
  return (
    <fieldset className="flex flex-col gap-3 rounded-md border border-rule bg-sheet p-4">
      <legend className="px-1 font-measure text-lg font-semibold">{axis === "columns" ? "Widths" : "Heights"}</legend>
      <div className="flex gap-2">
        <Button
          size="small"
          aria-pressed={draft.from === "opening"}
          kind={draft.from === "opening" ? "primary" : "plain"}
          onClick={() => onChange({ ...draft, from: "opening" })}
        >
          From an opening
        </Button>
        <Button
          size="small"
          aria-pressed={draft.from === "hand"}
          kind={draft.from === "hand" ? "primary" : "plain"}
          onClick={() => onChange(draftByHand(draft))}
        >
          One by one
        </Button>
      </div>
      <div className="grid grid-cols-2 items-end gap-3">
        <TextField
          label={word.count}
          type="number"
          min={1}
          max={40}
          value={draft.count}
          onChange={(event) =>
            onChange({ ...draft, count: Math.min(40, Math.max(1, Math.round(event.target.valueAsNumber) || 1)) })
          }
        />
        <LengthField label="Gap between" value={draft.gap} onChange={(gap) => onChange({ ...draft, gap: gap ?? draft.gap })} />
      </div>
      {draft.from === "opening" ? (
        <OpeningFields word={word} draft={draft} onChange={onChange} />
      ) : (
        <HandFields word={word} draft={draft} onChange={onChange} />
      )}
      {result.ok ? (
        <p className="text-sm text-pencil">
          {word.one}: <span className="measure text-graphite">{result.sizes.map((size) => print(size)).join(", ")}</span>
          {result.remainder > 0 && (
            <>
              . <span className="measure text-graphite">{print(result.remainder)}</span> left over widens the last gap.
            </>
          )}
        </p>
      ) : (
        <Notice kind="stop">{result.message}</Notice>
      )}
    </fieldset>
  );
}

type Word = (typeof words)[Axis];
type FieldsProps = { word: Word; draft: AxisDraft; onChange: (draft: AxisDraft) => void };

function OpeningFields({ word, draft, onChange }: FieldsProps) {
  return (
    <div className="grid grid-cols-2 gap-3">
      <div className="col-span-2">
        <LengthField
          label={word.opening}
          value={draft.opening}
          onChange={(opening) => onChange({ ...draft, opening: opening ?? draft.opening })}
        />
      </div>
      <LengthField
        label={word.before}
        value={draft.outerBefore}
        onChange={(outerBefore) => onChange({ ...draft, outerBefore: outerBefore ?? draft.outerBefore })}
      />
      <LengthField
        label={word.after}
        value={draft.outerAfter}
        onChange={(outerAfter) => onChange({ ...draft, outerAfter: outerAfter ?? draft.outerAfter })}
      />
      <SelectField
        label="Graduation"
        value={draft.graduation}
        onChange={(event) => {
          const graduation = event.target.value;
          if (graduation === "equal" || graduation === "step" || graduation === "ratio") onChange({ ...draft, graduation });
        }}
      >
        <option value="equal">All equal</option>
        <option value="step">Each larger by a step</option>
        <option value="ratio">Each larger by a ratio</option>
      </SelectField>
      {draft.graduation === "step" && (
        <LengthField label="Step" value={draft.step} onChange={(step) => onChange({ ...draft, step: step ?? draft.step })} />
      )}
      {draft.graduation === "ratio" && (
        <TextField
          label="Ratio"
          type="number"
          step="0.01"
          min={0.5}
          max={2}
          value={draft.ratio}
          onChange={(event) => onChange({ ...draft, ratio: event.target.valueAsNumber || draft.ratio })}
        />
      )}
    </div>
  );
}

function HandFields({ word, draft, onChange }: FieldsProps) {
  const places = Array.from({ length: draft.count }, (_, index) => ({ index, name: `${word.one} ${index + 1}` }));
  return (
    <div className="grid grid-cols-2 gap-3 sm:grid-cols-3">
      {places.map(({ index, name }) => (
        <LengthField
          key={name}
          label={name}
          value={draft.sizes[index] ?? draft.sizes.at(-1) ?? draft.opening}
          onChange={(size) => size !== null && onChange({ ...draft, sizes: sizesWith(draft, index, size) })}
        />
      ))}
    </div>
  );
}

function sizesWith(draft: AxisDraft, index: number, size: Um): Um[] {
  return Array.from({ length: draft.count }, (_, place) => draft.sizes[place] ?? draft.sizes.at(-1) ?? size).with(index, size);
}
