"use client";
import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { toast } from "sonner";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { SelectField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { Notice } from "@/components/ui/notice";
import { focusUnreadField, useFocusFirstError } from "@/components/ui/use-focus-first-error";
import { updateBoard } from "@/lib/client/board";
import { FaultFromServer, messageOf } from "@/lib/client/fault-from-server";
import type { Um } from "@/lib/layout";
import { type Board, boardSchema, boardStates } from "@/lib/schemas/board";
import { checkDraft, type DraftErrors, draftOf } from "./board-draft";
import { BoardFields } from "./board-fields";
import { stateNames } from "./board-words";

interface Props {
  board: Board;
  species: readonly string[];
  onDone: () => void;
}

export function ChangeBoardForm({ board, species, onDone }: Props) {
  const router = useRouter();
  const { currency } = useUnits();
  const [draft, setDraft] = useState(() => draftOf(board, currency));
  const [state, setState] = useState(board.state);
  const [size, setSize] = useState({ length: orNull(board.length), width: orNull(board.width) });
  const [errors, setErrors] = useState<DraftErrors>({});
  const form = useFocusFirstError(errors);
  const byHand = board.straighteningId === null;
  const save = useMutation({
    mutationFn: (fields: Parameters<typeof updateBoard>[1]) => updateBoard(board.id, fields),
    onSuccess: ({ tag }) => {
      toast.success(`${tag} saved`);
      router.refresh();
      onDone();
    },
  });
  const submit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (focusUnreadField(event.currentTarget)) return;
    const checked = checkDraft(draft, currency);
    setErrors(checked.ok ? {} : checked.errors);
    if (!checked.ok) return;
    const length = byHand ? (size.length ?? undefined) : undefined;
    const width = byHand ? (size.width ?? undefined) : undefined;
    save.mutate({ baseRevision: board.revision, ...checked.fields, state, length, width });
  };
  return (
    <form ref={form} noValidate onSubmit={submit} className="grid gap-4 sm:grid-cols-2">
      <BoardFields draft={draft} errors={errors} species={species} onChange={setDraft} />
      {byHand && (
        <>
          <LengthField label="Length, along the grain" value={size.length} onChange={(length) => setSize({ ...size, length })} />
          <LengthField label="Width" value={size.width} onChange={(width) => setSize({ ...size, width })} />
        </>
      )}
      <SelectField label="State" value={state} onChange={(event) => setState(boardSchema.shape.state.parse(event.target.value))}>
        {boardStates.map((name) => (
          <option key={name} value={name}>
            {stateNames[name]}
          </option>
        ))}
      </SelectField>
      <div className="flex flex-col gap-3 sm:col-span-2">
        {save.isError && (
          <Notice kind="stop">
            {messageOf(save.error)}
            {isConflict(save.error) && (
              <button type="button" className="ml-2 font-semibold text-chalk underline" onClick={() => router.refresh()}>
                Load again
              </button>
            )}
          </Notice>
        )}
        <div className="flex gap-2">
          <Button type="submit" kind="primary" disabled={save.isPending}>
            Save
          </Button>
          <Button onClick={onDone}>Cancel</Button>
        </div>
      </div>
    </form>
  );
}

const orNull = (length: Um): Um | null => (length > 0 ? length : null);
const isConflict = (error: unknown): boolean => error instanceof FaultFromServer && error.fault.code === "conflict";
