"use client";
/** The facts of a board as fields: the same when a board is entered and when it is changed. */
import { useId } from "react";
import { useUnits } from "@/components/shell/units";
import { SelectField, TextAreaField, TextField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { nominalThicknesses } from "@/lib/layout";
import { boardSchema, cuts, trueEdges } from "@/lib/schemas/board";
import type { BoardDraft, DraftErrors } from "./board-draft";
import { cutNames, quartersText, trueEdgeNames } from "./board-words";

interface Props {
  draft: BoardDraft;
  errors: DraftErrors;
  species: readonly string[];
  onChange: (draft: BoardDraft) => void;
}

/** Quarters of an inch as lumber is sold. */
const quarters = [3, 4, 5, 6, 8, 10, 12, 16];

export function BoardFields({ draft, errors, species, onChange }: Props) {
  const { currency } = useUnits();
  const listId = useId();
  const change = (part: Partial<BoardDraft>) => onChange({ ...draft, ...part });
  return (
    <>
      <TextField
        label="Species"
        list={listId}
        autoComplete="off"
        error={errors.species}
        value={draft.species}
        onChange={(event) => change({ species: event.target.value })}
      />
      <datalist id={listId}>
        {species.map((name) => (
          <option key={name} value={name} />
        ))}
      </datalist>
      <SelectField
        label="Cut"
        value={draft.cut}
        onChange={(event) => change({ cut: boardSchema.shape.cut.parse(event.target.value) })}
      >
        {cuts.map((cut) => (
          <option key={cut} value={cut}>
            {cutNames[cut]}
          </option>
        ))}
      </SelectField>
      <SelectField
        label="Nominal thickness"
        value={draft.nominalQuarters ?? ""}
        onChange={(event) => change(withNominal(draft, event.target.value === "" ? null : Number(event.target.value)))}
      >
        <option value="">not sold by quarters</option>
        {quarters.map((count) => (
          <option key={count} value={count}>
            {quartersText(count)}
          </option>
        ))}
      </SelectField>
      <LengthField
        label="Thickness, measured"
        value={draft.thickness}
        error={errors.thickness}
        onChange={(thickness) => change({ thickness })}
      />
      <SelectField
        label="Long edges that are true"
        hint="Straight and square to the face, as its picture lies. A cut is measured from one."
        value={draft.trueEdges}
        onChange={(event) => change({ trueEdges: boardSchema.shape.trueEdges.parse(event.target.value) })}
      >
        {trueEdges.map((edges) => (
          <option key={edges} value={edges}>
            {trueEdgeNames[edges]}
          </option>
        ))}
      </SelectField>
      <SelectField
        label="Flat"
        hint="A board that is not flat is cut into rough parts first."
        value={draft.toBeFlattened ? "no" : "yes"}
        onChange={(event) => change({ toBeFlattened: event.target.value === "no" })}
      >
        <option value="yes">flat as it is</option>
        <option value="no">to be flattened</option>
      </SelectField>
      <TextField
        label="Place"
        hint="Where it lies"
        value={draft.place}
        onChange={(event) => change({ place: event.target.value })}
      />
      <TextField
        label="Source"
        hint="Who it came from"
        value={draft.source}
        onChange={(event) => change({ source: event.target.value })}
      />
      <TextField
        label={`Cost, ${currency}`}
        inputMode="decimal"
        className="measure"
        error={errors.cost}
        value={draft.cost}
        onChange={(event) => change({ cost: event.target.value })}
      />
      <div className="sm:col-span-2">
        <TextAreaField label="Note" value={draft.note} onChange={(event) => change({ note: event.target.value })} />
      </div>
    </>
  );
}

/** A thickness that nobody has measured yet starts at the rough size of its nominal one. */
function withNominal(draft: BoardDraft, nominalQuarters: number | null): Partial<BoardDraft> {
  const rough = nominalThicknesses.find(({ name }) => name === quartersText(nominalQuarters))?.rough ?? null;
  return { nominalQuarters, thickness: draft.thickness ?? rough };
}
