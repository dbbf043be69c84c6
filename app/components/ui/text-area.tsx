import type { TextareaHTMLAttributes } from "react";
import { FieldError, FieldHint, useFieldId } from "./field-parts";

interface TextAreaProps extends TextareaHTMLAttributes<HTMLTextAreaElement> {
  label: string;
  hint?: string | undefined;
  error?: string | undefined;
}

/** A box for several lines: pasted tables, notes. */
export function TextArea({ label, hint, error, id, ...area }: TextAreaProps) {
  const { fieldId, describedBy } = useFieldId({ id, name: area.name, hint, error });
  return (
    <div className="flex flex-col">
      <label htmlFor={fieldId} className="mb-1 block font-semibold">
        {label}
      </label>
      <FieldHint id={fieldId}>{hint}</FieldHint>
      <FieldError id={fieldId}>{error}</FieldError>
      <textarea
        id={fieldId}
        rows={5}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy}
        className="entry font-mono text-dense"
        {...area}
      />
    </div>
  );
}
