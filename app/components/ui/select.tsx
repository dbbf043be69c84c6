import { type SelectHTMLAttributes, useId } from "react";
import { describedBy, FieldError } from "./field";

interface SelectProps extends SelectHTMLAttributes<HTMLSelectElement> {
  label: string;
  options: readonly { value: string; label: string }[];
  hint?: string | undefined;
  error?: string | undefined;
}

/** A choice of one from a list. */
export function Select({ label, options, hint, error, ...select }: SelectProps) {
  const id = useId();
  return (
    <div>
      <label htmlFor={id} className="mb-1 block font-semibold">
        {label}
      </label>
      {hint && (
        <p id={`${id}-hint`} className="mb-1 text-[13px] text-mute">
          {hint}
        </p>
      )}
      {error && <FieldError id={`${id}-error`} message={error} />}
      <select
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(id, hint, error)}
        className="min-h-11 w-full rounded border border-line-strong bg-paper px-3 aria-[invalid=true]:border-stop"
        {...select}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </div>
  );
}
