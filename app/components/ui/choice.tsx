import type { InputHTMLAttributes } from "react";
import { FieldError, FieldHint, useFieldId } from "./field-parts";

interface ChoiceProps extends Omit<InputHTMLAttributes<HTMLInputElement>, "defaultValue" | "type"> {
  legend: string;
  type: "radio" | "checkbox";
  options: readonly { value: string; label: string; hint?: string }[];
  defaultValue?: string | readonly string[];
  hint?: string | undefined;
  error?: string | undefined;
}

/** Radio buttons or ticks under one legend; each line is the target of a press, not the small box alone. */
export function Choice({ legend, type, options, defaultValue, hint, error, id, ...input }: ChoiceProps) {
  const { fieldId, describedBy } = useFieldId({ id, name: input.name, hint, error });
  const chosen = typeof defaultValue === "string" ? [defaultValue] : (defaultValue ?? []);
  return (
    <fieldset aria-describedby={describedBy}>
      <legend className="mb-1 font-semibold">{legend}</legend>
      <FieldHint id={fieldId}>{hint}</FieldHint>
      <FieldError id={fieldId}>{error}</FieldError>
      <div className="flex flex-wrap gap-x-6">
        {options.map((option, index) => (
          <label key={option.value} className="flex min-h-11 cursor-pointer items-center gap-2">
            <input
              type={type}
              value={option.value}
              defaultChecked={chosen.includes(option.value)}
              id={index === 0 ? fieldId : undefined}
              className="size-5 shrink-0 accent-layout"
              {...input}
            />
            <span>
              {option.label}
              {option.hint && <span className="block text-dense text-mute">{option.hint}</span>}
            </span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}
