import type { SelectHTMLAttributes } from "react";
import { FieldError, FieldHint, useFieldId } from "./field-parts";

interface SelectProps extends SelectHTMLAttributes<HTMLSelectElement> {
  label: string;
  options: readonly { value: string; label: string }[];
  hint?: string | undefined;
  error?: string | undefined;
}

/** A choice of one from a list. */
export function Select({ label, options, hint, error, id, ...select }: SelectProps) {
  const { fieldId, describedBy } = useFieldId({ id, name: select.name, hint, error });
  return (
    <div className="flex flex-col">
      <label htmlFor={fieldId} className="mb-1 block font-semibold">
        {label}
      </label>
      <FieldHint id={fieldId}>{hint}</FieldHint>
      <FieldError id={fieldId}>{error}</FieldError>
      <span className="mt-auto">
        <select
          id={fieldId}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy}
          className="entry"
          {...select}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      </span>
    </div>
  );
}
