"use client";
import { ArrowDown, ArrowUp, Trash2 } from "lucide-react";
import { useUnits } from "@/components/shell/units";
import { Choice } from "@/components/ui/choice";
import { LengthField } from "@/components/ui/length-field";
import { type BlankStrip, um } from "@/lib/layout";
import type { DraftMember } from "./blank-draft";

interface Props {
  member: DraftMember;
  /** null while it is not known how the blank comes out. */
  strip: BlankStrip | null;
  first: boolean;
  last: boolean;
  onChange: (change: Partial<Omit<DraftMember, "board">>) => void;
  onShift: (by: -1 | 1) => void;
  onRemove: () => void;
}

/** One board of the blank: where it lies among the others, how it is turned, what comes off its edges. */
export function MemberCard({ member, strip, first, last, onChange, onShift, onRemove }: Props) {
  const { print } = useUnits();
  const { board, endForEnd, side, along, trim } = member;
  const { tag } = board;
  const none = um(0);
  return (
    <fieldset className="flex flex-col gap-3 rounded-md border border-rule p-3">
      <legend className="sr-only">Board {tag}</legend>
      <div className="flex items-center gap-1">
        <p className="min-w-0 grow">
          <span className="measure text-lg">{tag}</span> <span className="text-sm">{board.species}</span>
          <span className="block text-sm text-pencil">
            <span className="measure">
              {print(board.length)} × {print(board.width)} × {print(board.thickness)}
            </span>
            {strip && <span className="measure">, {print(strip.rect.height)} wide in the blank</span>}
          </span>
        </p>
        <IconButton label={`Move ${tag} up`} disabled={first} onClick={() => onShift(-1)}>
          <ArrowUp className="size-5" aria-hidden="true" />
        </IconButton>
        <IconButton label={`Move ${tag} down`} disabled={last} onClick={() => onShift(1)}>
          <ArrowDown className="size-5" aria-hidden="true" />
        </IconButton>
        <IconButton label={`Take ${tag} out`} danger onClick={onRemove}>
          <Trash2 className="size-5" aria-hidden="true" />
        </IconButton>
      </div>
      <label className="flex min-h-11 cursor-pointer items-center gap-2 md:min-h-8">
        <input
          type="checkbox"
          className="size-5 accent-chalk"
          checked={endForEnd}
          onChange={(event) => onChange({ endForEnd: event.target.checked })}
        />
        Turned end for end
      </label>
      {board.backStraighteningId !== null && (
        <Choice
          legend="Comes up"
          value={side}
          options={[
            { value: "face", label: "its face" },
            { value: "back", label: "its back" },
          ]}
          onChange={(up) => onChange({ side: up })}
        />
      )}
      <div className="grid grid-cols-3 items-end gap-2">
        <LengthField label="Left end in by" value={along} onChange={(value) => onChange({ along: value ?? none })} />
        <LengthField
          label="Trim upper edge"
          value={trim.upper}
          onChange={(value) => onChange({ trim: { ...trim, upper: value ?? none } })}
        />
        <LengthField
          label="Trim lower edge"
          value={trim.lower}
          onChange={(value) => onChange({ trim: { ...trim, lower: value ?? none } })}
        />
      </div>
    </fieldset>
  );
}

interface IconButtonProps {
  label: string;
  disabled?: boolean;
  danger?: boolean;
  onClick: () => void;
  children: React.ReactNode;
}

function IconButton({ label, disabled = false, danger = false, onClick, children }: IconButtonProps) {
  const look = danger ? "text-crayon hover:bg-crayon-wash" : "text-graphite hover:bg-chalk-wash disabled:text-rule";
  return (
    <button
      type="button"
      aria-label={label}
      disabled={disabled}
      onClick={onClick}
      className={`grid size-11 shrink-0 place-items-center rounded-md ${look}`}
    >
      {children}
    </button>
  );
}
