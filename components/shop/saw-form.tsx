"use client";
/** A saw: what it takes from the wood, and what it may take in hand. */
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { createSaw, shopKey, updateSaw } from "@/lib/client/shop";
import { um } from "@/lib/layout";
import { usualLimits } from "@/lib/schemas/saw-limits";
import { type Saw, saveSawSchema } from "@/lib/schemas/shop";
import { sawKindNames } from "@/lib/words/saw";

export type SawDraft = Omit<Saw, "id"> & { id: string | null };

interface Props {
  draft: SawDraft;
  onChange: (draft: SawDraft) => void;
  onDone: () => void;
}

export function SawForm({ draft, onChange, onDone }: Props) {
  const client = useQueryClient();
  const save = useMutation({
    mutationFn: ({ id, ...fields }: SawDraft) => (id === null ? createSaw(fields) : updateSaw(id, fields)),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: shopKey });
      onDone();
    },
  });
  return (
    <form
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        save.mutate(draft);
      }}
    >
      <TextField
        label="Name"
        required
        maxLength={80}
        value={draft.name}
        onChange={(event) => onChange({ ...draft, name: event.target.value })}
      />
      <SelectField
        label="Kind"
        value={draft.kind}
        onChange={(event) => onChange(ofKind(draft, saveSawSchema.shape.kind.parse(event.target.value)))}
      >
        {Object.entries(sawKindNames).map(([kind, name]) => (
          <option key={kind} value={kind}>
            {name}
          </option>
        ))}
      </SelectField>
      <LengthField
        label="Kerf"
        required
        hint="What the blade takes out"
        value={draft.kerf}
        onChange={(kerf) => kerf !== null && onChange({ ...draft, kerf })}
      />
      <LengthField
        label="Clean-up of each edge"
        required
        hint="What jointing, planing or shooting takes afterwards; 0 for edges left from the saw"
        value={draft.cleanUp}
        onChange={(cleanUp) => cleanUp !== null && onChange({ ...draft, cleanUp })}
      />
      <LimitFields limits={draft.limits} onChange={(limits) => onChange({ ...draft, limits })} />
      {save.isError && <Notice kind="stop">{messageOf(save.error)}</Notice>}
      <Button type="submit" kind="primary" disabled={save.isPending}>
        Save saw
      </Button>
    </form>
  );
}

/** A new saw of another kind takes what is usual for that kind. */
function ofKind(draft: SawDraft, kind: Saw["kind"]): SawDraft {
  return { ...draft, kind, limits: draft.id === null ? usualLimits[kind] : draft.limits };
}

type Limits = Saw["limits"];

/** A cut that is beyond these goes to another saw of the shop. */
function LimitFields({ limits, onChange }: { limits: Limits; onChange: (limits: Limits) => void }) {
  const change = (part: Partial<Limits>) => onChange({ ...limits, ...part });
  return (
    <fieldset className="flex flex-col gap-3 border-t border-rule pt-3">
      <legend className="float-left mb-2 w-full text-sm text-pencil">
        A cut beyond these goes to another saw of the shop. The machine’s manual comes first.
      </legend>
      <div className="flex flex-wrap gap-x-6 gap-y-1">
        <Check label="Rips" checked={limits.rips} onChange={(rips) => change({ rips })} />
        <Check label="Crosscuts" checked={limits.crosscuts} onChange={(crosscuts) => change({ crosscuts })} />
      </div>
      <div className="grid gap-3 sm:grid-cols-2">
        <LengthField
          label="Widest rip at the fence"
          hint="Empty: any width"
          value={limits.widestRip}
          onChange={(length) => change({ widestRip: length !== null && length > 0 ? length : null })}
        />
        <LengthField
          label="Longest crosscut"
          hint="Empty: any width of board"
          value={limits.longestCrosscut}
          onChange={(length) => change({ longestCrosscut: length !== null && length > 0 ? length : null })}
        />
        <LengthField
          label="Shortest part it takes"
          hint="Along the grain, before the cut"
          required
          value={limits.shortest}
          onChange={(length) => length !== null && change({ shortest: atLeastNothing(length) })}
        />
        <LengthField
          label="Narrowest part it takes"
          hint="Across the grain, before the cut"
          required
          value={limits.narrowest}
          onChange={(length) => length !== null && change({ narrowest: atLeastNothing(length) })}
        />
      </div>
    </fieldset>
  );
}

const atLeastNothing = (length: Limits["shortest"]) => (length < 0 ? um(0) : length);

function Check({ label, checked, onChange }: { label: string; checked: boolean; onChange: (checked: boolean) => void }) {
  return (
    <label className="flex min-h-10 cursor-pointer items-center gap-2">
      <input
        type="checkbox"
        className="size-4 accent-chalk"
        checked={checked}
        onChange={(event) => onChange(event.target.checked)}
      />
      {label}
    </label>
  );
}
