"use client";
import { useCallback, useEffect, useRef, useState } from "react";
import { TextField } from "./field";

interface Props {
  label: string;
  hint?: string | undefined;
  /** null: left empty. */
  value: number | null;
  onChange: (value: number | null) => void;
  min: number;
  max: number;
  /** Decimals that are kept. */
  digits?: number;
  error?: string | undefined;
  disabled?: boolean;
  /** May not be left empty. */
  required?: boolean;
}

/**
 * A plain number, typed with a point or a comma; reported when the field is left or Enter is pressed. What cannot be read makes the
 * field invalid to the browser: a form around it is not sent with the number that stood there before.
 */
export function NumberField({ label, hint, value, onChange, min, max, digits = 1, error, disabled, required = false }: Props) {
  const printed = value === null ? "" : String(value);
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
    if (text.trim() === "" && !required) {
      refuse(undefined);
      return onChange(null);
    }
    const number = readNumber(text, digits);
    if (number === null || number < min || number > max) return refuse(`A number from ${min} to ${max}`);
    refuse(undefined);
    setText(String(number));
    if (number !== value) onChange(number);
  };

  return (
    <TextField
      ref={input}
      label={label}
      hint={hint}
      error={refusal ?? error}
      disabled={disabled}
      inputMode="decimal"
      className="measure"
      autoComplete="off"
      value={text}
      onChange={(event) => {
        setText(event.target.value);
        if (refusal) refuse(undefined);
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

/** Null for what is no number. */
function readNumber(text: string, digits: number): number | null {
  const plain = text.trim().replace(",", ".").replace("−", "-");
  return /^-?(\d+(\.\d*)?|\.\d+)$/.test(plain) ? Number(Number(plain).toFixed(digits)) : null;
}
