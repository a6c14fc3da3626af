"use client";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Choice } from "@/components/ui/choice";
import { TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { NumberField } from "@/components/ui/number-field";
import { focusUnreadField, useFocusFirstError } from "@/components/ui/use-focus-first-error";
import { messageOf } from "@/lib/client/fault-from-server";
import { createSpecies, speciesKey, updateSpecies } from "@/lib/client/species";
import { checkSpecies, type SpeciesDraft, type SpeciesErrors } from "./species-draft";

const kinds = [
  { value: "shrinkage", label: "Shrinkage, green to ovendry, %" },
  { value: "coefficients", label: "Coefficients, per % of moisture" },
] as const;

const limits = {
  shrinkage: { min: 0.5, max: 20, digits: 2 },
  coefficients: { min: 0.0002, max: 0.01, digits: 5 },
} as const;

interface Props {
  draft: SpeciesDraft;
  onChange: (draft: SpeciesDraft) => void;
  onDone: () => void;
}

export function SpeciesForm({ draft, onChange, onDone }: Props) {
  const client = useQueryClient();
  // A new object for every submit, so that the first wrong field gets the focus then and not while typing.
  const [errors, setErrors] = useState<SpeciesErrors>({});
  const form = useFocusFirstError(errors);
  const save = useMutation({
    mutationFn: (fields: Parameters<typeof createSpecies>[0]) =>
      draft.id === null ? createSpecies(fields) : updateSpecies(draft.id, fields),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: speciesKey });
      onDone();
    },
  });
  const set = (change: Partial<SpeciesDraft>) => onChange({ ...draft, ...change });
  return (
    <form
      ref={form}
      noValidate
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        if (focusUnreadField(event.currentTarget)) return;
        const checked = checkSpecies(draft);
        setErrors(checked.ok ? {} : checked.errors);
        if (checked.ok) save.mutate(checked.fields);
      }}
    >
      <TextField
        label="Name"
        hint="As you write it on boards, such as European beech"
        error={errors.name}
        maxLength={80}
        value={draft.name}
        onChange={(event) => set({ name: event.target.value })}
      />
      <TextField
        label="Also called"
        hint="Apart by commas"
        error={errors.alsoCalled}
        value={draft.alsoCalled}
        onChange={(event) => set({ alsoCalled: event.target.value })}
      />
      <Choice
        legend="Known by"
        value={draft.kind}
        options={kinds}
        onChange={(kind) => set({ kind, radial: null, tangential: null })}
      />
      <div className="grid grid-cols-2 items-start gap-3">
        <NumberField
          label="Radial"
          hint={draft.kind === "shrinkage" ? "Such as 4.8" : "Such as .0019"}
          value={draft.radial}
          {...limits[draft.kind]}
          onChange={(radial) => set({ radial })}
        />
        <NumberField
          label="Tangential"
          hint={draft.kind === "shrinkage" ? "Such as 9.2" : "Such as .0028"}
          error={errors.movement}
          value={draft.tangential}
          {...limits[draft.kind]}
          onChange={(tangential) => set({ tangential })}
        />
      </div>
      <TextField
        label="Source"
        hint="A book and its page, or your own test and its date"
        error={errors.source}
        maxLength={300}
        value={draft.source}
        onChange={(event) => set({ source: event.target.value })}
      />
      {save.isError && <Notice kind="stop">{messageOf(save.error)}</Notice>}
      <Button type="submit" kind="primary" disabled={save.isPending}>
        Save species
      </Button>
    </form>
  );
}
