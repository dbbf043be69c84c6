import { useId } from "react";
import { FieldError } from "./field";

interface ChoiceProps {
  legend: string;
  name: string;
  type: "radio" | "checkbox";
  options: readonly { value: string; label: string }[];
  defaultValue?: string | readonly string[];
  error?: string | undefined;
  onChange?: (value: string) => void;
}

/** Radio buttons or ticks under one legend. */
export function Choice({ legend, name, type, options, defaultValue, error, onChange }: ChoiceProps) {
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
              name={name}
              value={option.value}
              defaultChecked={chosen.includes(option.value)}
              onChange={(event) => onChange?.(event.currentTarget.value)}
              className="size-5 accent-layout"
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
