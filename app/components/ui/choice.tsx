import { type InputHTMLAttributes, useId } from "react";
import { FieldError } from "./field";

interface ChoiceProps extends Omit<InputHTMLAttributes<HTMLInputElement>, "defaultValue" | "type"> {
  legend: string;
  type: "radio" | "checkbox";
  options: readonly { value: string; label: string }[];
  defaultValue?: string | readonly string[];
  error?: string | undefined;
}

/** Radio buttons or ticks under one legend. */
export function Choice({ legend, type, options, defaultValue, error, ...input }: ChoiceProps) {
  const id = useId();
  const chosen = typeof defaultValue === "string" ? [defaultValue] : (defaultValue ?? []);
  return (
    <fieldset aria-describedby={error ? `${id}-error` : undefined}>
      <legend className="mb-1 font-semibold">{legend}</legend>
      {error && <FieldError id={`${id}-error`} message={error} />}
      <div className="flex flex-wrap gap-x-5">
        {options.map((option) => (
          <label key={option.value} className="flex min-h-11 items-center gap-2">
            <input
              type={type}
              value={option.value}
              defaultChecked={chosen.includes(option.value)}
              className="size-5 accent-layout"
              {...input}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
