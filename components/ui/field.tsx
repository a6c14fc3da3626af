import { type ComponentProps, type ReactNode, type SelectHTMLAttributes, type TextareaHTMLAttributes, useId } from "react";

const box =
  "w-full min-h-11 md:min-h-10 rounded-md border border-line bg-sheet px-3 text-base aria-invalid:border-crayon disabled:border-rule disabled:bg-paper disabled:text-pencil";

interface FieldProps {
  label: string;
  /** What the field changes or how to fill it in. */
  hint?: string | undefined;
  error?: string | undefined;
}

interface Wiring {
  id: string;
  "aria-invalid": true | undefined;
  "aria-describedby": string | undefined;
}

/** A label, its control, and what to say below it. */
function Labelled({ label, hint, error, children }: FieldProps & { children: (wiring: Wiring) => ReactNode }) {
  const id = useId();
  const describedBy = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(" ") || undefined;
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="text-sm font-semibold">
        {label}
      </label>
      {children({ id, "aria-invalid": error ? true : undefined, "aria-describedby": describedBy })}
      {hint && (
        <p id={`${id}-hint`} className="text-sm text-pencil">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className="text-sm text-crayon">
          {error}
        </p>
      )}
    </div>
  );
}

export function TextField({ label, hint, error, className = "", ...rest }: FieldProps & ComponentProps<"input">) {
  return (
    <Labelled label={label} hint={hint} error={error}>
      {(wiring) => <input {...wiring} {...rest} className={`${box} ${className}`} />}
    </Labelled>
  );
}

export function SelectField({ label, hint, error, children, ...rest }: FieldProps & SelectHTMLAttributes<HTMLSelectElement>) {
  return (
    <Labelled label={label} hint={hint} error={error}>
      {(wiring) => (
        <select {...wiring} {...rest} className={box}>
          {children}
        </select>
      )}
    </Labelled>
  );
}

export function TextAreaField({ label, hint, error, ...rest }: FieldProps & TextareaHTMLAttributes<HTMLTextAreaElement>) {
  return (
    <Labelled label={label} hint={hint} error={error}>
      {(wiring) => <textarea rows={3} {...wiring} {...rest} className={`${box} py-2`} />}
    </Labelled>
  );
}
