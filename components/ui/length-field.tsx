"use client";
import { useEffect, useState } from "react";
import { type ParsedLength, printLength, type Um } from "@/lib/layout";
import { useUnits } from "../shell/units";
import { TextField } from "./field";

interface Props {
  label: string;
  hint?: string | undefined;
  /** null: left empty. */
  value: Um | null;
  onChange: (value: Um | null) => void;
  error?: string | undefined;
  disabled?: boolean;
}

const sayings: Record<Exclude<ParsedLength, { ok: true }>["reason"], string> = {
  empty: "Enter a length",
  "not-a-length": "Write a length such as 12.7 mm or 23 5/16 in",
  "zero-denominator": "A fraction cannot be divided by 0",
  "ambiguous-comma": "Write 1200 or 1.2: a comma can mean both",
  "out-of-range": "That is longer than any board",
};

/** A length typed in the shop's units or any other it can be written in; reported when the field is left or Enter is pressed. */
export function LengthField({ label, hint, value, onChange, error, disabled }: Props) {
  const { style, parse } = useUnits();
  const printed = value === null ? "" : printLength(value, style);
  const [text, setText] = useState(printed);
  const [refusal, setRefusal] = useState<string>();

  useEffect(() => {
    setText(printed);
    setRefusal(undefined);
  }, [printed]);

  const take = () => {
    if (text === printed) return;
    if (text.trim() === "") return onChange(null);
    const parsed = parse(text);
    if (!parsed.ok) return setRefusal(sayings[parsed.reason]);
    setRefusal(undefined);
    setText(printLength(parsed.value, style));
    onChange(parsed.value);
  };

  return (
    <TextField
      label={label}
      hint={hint}
      error={refusal ?? error}
      disabled={disabled}
      inputMode={style.unit === "mm" ? "decimal" : "text"}
      className="measure"
      autoComplete="off"
      value={text}
      onChange={(event) => setText(event.target.value)}
      onBlur={take}
      onKeyDown={(event) => {
        if (event.key === "Enter") take();
      }}
    />
  );
}
