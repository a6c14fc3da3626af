"use client";
import { useCallback, useEffect, useRef, useState } from "react";
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
  /** May not be left empty. */
  required?: boolean;
}

const sayings: Record<Exclude<ParsedLength, { ok: true }>["reason"], string> = {
  empty: "Enter a length",
  "not-a-length": "Write a length such as 12.7 mm or 23 5/16 in",
  "zero-denominator": "A fraction cannot be divided by 0",
  "ambiguous-comma": "Write 1200 or 1.2: a comma can mean both",
  "out-of-range": "That is longer than any board",
};

/**
 * A length typed in the shop's units or any other it can be written in; reported when the field is left or Enter is pressed.
 * What cannot be read makes the field invalid to the browser: a form around it is not sent with the length that stood there before.
 */
export function LengthField({ label, hint, value, onChange, error, disabled, required = false }: Props) {
  const { style, parse } = useUnits();
  const printed = value === null ? "" : printLength(value, style);
  const [text, setText] = useState(printed);
  const [refusal, setRefusal] = useState<string>();
  const input = useRef<HTMLInputElement>(null);
  // At once, not with the next drawing: the Enter that is refused here would send the form in the same moment.
  const refuse = useCallback((why: string | undefined) => {
    input.current?.setCustomValidity(why ?? "");
    setRefusal(why);
  }, []);

  useEffect(() => {
    setText(printed);
    refuse(undefined);
  }, [printed, refuse]);

  const take = () => {
    if (text === printed) return refuse(undefined);
    if (text.trim() === "") {
      if (required) return refuse(sayings.empty);
      refuse(undefined);
      return onChange(null);
    }
    const parsed = parse(text);
    if (!parsed.ok) return refuse(sayings[parsed.reason]);
    refuse(undefined);
    setText(printLength(parsed.value, style));
    onChange(parsed.value);
  };

  return (
    <TextField
      ref={input}
      label={label}
      hint={hint}
      error={refusal ?? error}
      disabled={disabled}
      inputMode={style.unit === "mm" ? "decimal" : "text"}
      className="measure"
      autoComplete="off"
      value={text}
      onChange={(event) => {
        setText(event.target.value);
        // Taken back while typing, not on leaving: the button being pressed would move away as the line below the field goes.
        if (refusal && parse(event.target.value).ok) refuse(undefined);
      }}
      onBlur={take}
      onInvalid={(event) => {
        // The reason stands below the field already: the browser's own note would cover it.
        event.preventDefault();
        if (isFirstInvalid(event.currentTarget)) event.currentTarget.focus();
      }}
      onKeyDown={(event) => {
        if (event.key === "Enter") take();
      }}
    />
  );
}

const isFirstInvalid = (input: HTMLInputElement): boolean => input.form?.querySelector("input:invalid") === input;
