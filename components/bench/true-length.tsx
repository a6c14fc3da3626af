"use client";
/** A true length beside the planned one: typed, or stepped to with a thumb. What is typed counts at once. */
import { Minus, Plus } from "lucide-react";
import { useId, useState } from "react";
import { printLength, type Um, um } from "@/lib/layout";
import { useUnits } from "../shell/units";

interface Props {
  label: string;
  planned: Um;
  value: Um;
  onChange: (value: Um) => void;
}

const stepButton =
  "grid size-12 shrink-0 place-items-center rounded-md border border-line bg-sheet text-chalk hover:bg-chalk-wash";

export function TrueLength({ label, planned, value, onChange }: Props) {
  const { style, parse } = useUnits();
  const id = useId();
  const print = (length: Um) => printLength(length, style);
  /** What is being typed and cannot be read yet, or not as it will be printed. */
  const [typing, setTyping] = useState<string | null>(null);
  const parsed = typing === null ? null : parse(typing);
  const step = style.unit === "mm" ? 100 : Math.round(25_400 / style.denominator);
  const stepBy = (by: number) => {
    setTyping(null);
    onChange(um(Math.max(0, value + by)));
  };
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="font-semibold">
        {label}
      </label>
      <div className="flex items-center gap-2">
        <button type="button" className={stepButton} aria-label={`${label}: less`} onClick={() => stepBy(-step)}>
          <Minus className="size-6" aria-hidden="true" />
        </button>
        <input
          id={id}
          aria-describedby={`${id}-planned`}
          aria-invalid={parsed && !parsed.ok ? true : undefined}
          className="measure min-h-12 w-full min-w-0 rounded-md border border-line bg-sheet px-3 text-center text-xl aria-invalid:border-crayon"
          inputMode={style.unit === "mm" ? "decimal" : "text"}
          autoComplete="off"
          value={typing ?? print(value)}
          onFocus={(event) => event.currentTarget.select()}
          onChange={(event) => {
            setTyping(event.target.value);
            const read = parse(event.target.value);
            if (read.ok) onChange(read.value);
          }}
          onBlur={() => setTyping(null)}
        />
        <button type="button" className={stepButton} aria-label={`${label}: more`} onClick={() => stepBy(step)}>
          <Plus className="size-6" aria-hidden="true" />
        </button>
      </div>
      <p id={`${id}-planned`} className="text-sm text-pencil">
        Planned {print(planned)}
      </p>
    </div>
  );
}
