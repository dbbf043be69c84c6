import type { InputHTMLAttributes } from "react";
import { FieldError, FieldHint, useFieldId } from "./field-parts";

interface FieldProps extends InputHTMLAttributes<HTMLInputElement> {
  label: string;
  /** How to fill it in: an example says more than a rule. */
  hint?: string | undefined;
  /** The unit, behind the box. */
  suffix?: string | undefined;
  /** What is wrong with what was typed; it stays in the box. */
  error?: string | undefined;
}

/** A labelled box with its hint, its unit and the sentence that says what is wrong. */
export function Field({ label, hint, suffix, error, id, ...input }: FieldProps) {
  const { fieldId, describedBy } = useFieldId({ id, name: input.name, hint, suffix, error });
  return (
    <div className="flex flex-col">
      <label htmlFor={fieldId} className="mb-1 block font-semibold">
        {label}
      </label>
      <FieldHint id={fieldId}>{hint}</FieldHint>
      <FieldError id={fieldId}>{error}</FieldError>
      <span className="mt-auto flex items-center gap-2">
        <input
          id={fieldId}
          type="text"
          autoComplete="off"
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy}
          className={`entry ${input.inputMode === "decimal" || input.inputMode === "numeric" ? "font-mono" : ""}`}
          {...input}
        />
        {suffix && (
          <span id={`${fieldId}-unit`} className="font-mono text-dense text-mute">
            {suffix}
          </span>
        )}
      </span>
    </div>
  );
}
