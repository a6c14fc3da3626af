"use client";
import { useId } from "react";

interface Props<Value extends string> {
  legend: string;
  value: Value;
  options: readonly { readonly value: Value; readonly label: string }[];
  onChange: (value: Value) => void;
}

/** One of a few, all in view. */
export function Choice<Value extends string>({ legend, value, options, onChange }: Props<Value>) {
  const name = useId();
  return (
    <fieldset className="flex flex-col gap-1">
      <legend className="text-sm font-semibold">{legend}</legend>
      <div className="flex flex-wrap gap-2">
        {options.map((option) => (
          <label
            key={option.value}
            className="flex min-h-11 cursor-pointer items-center gap-2 rounded-md border border-line bg-sheet px-3 has-checked:border-chalk has-checked:bg-chalk-wash has-focus-visible:outline-2 has-focus-visible:outline-chalk md:min-h-10"
          >
            <input
              type="radio"
              name={name}
              className="accent-chalk"
              checked={option.value === value}
              onChange={() => onChange(option.value)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
