import { type InputHTMLAttributes, useId } from "react";

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
  const own = useId();
  const boxId = id ?? own;
  return (
    <div className="flex flex-col">
      <label htmlFor={boxId} className="mb-1 block font-semibold">
        {label}
      </label>
      {hint && (
        <p id={`${boxId}-hint`} className="mb-1 text-[13px] text-mute">
          {hint}
        </p>
      )}
      {error && <FieldError id={`${boxId}-error`} message={error} />}
      <span className="mt-auto flex items-center gap-2">
        <input
          id={boxId}
          type="text"
          autoComplete="off"
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(boxId, hint, error)}
          className="min-h-11 w-full min-w-0 rounded border border-line-strong bg-paper px-3 aria-[invalid=true]:border-stop"
          {...input}
        />
        {suffix && <span className="font-mono text-[13px] text-mute">{suffix}</span>}
      </span>
    </div>
  );
}

/** The ids of the hint and the error, for `aria-describedby`. */
export function describedBy(
  id: string,
  hint: string | undefined,
  error: string | undefined,
): string | undefined {
  return [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(" ") || undefined;
}

/** The sentence beside a field that says what is wrong with it. */
export function FieldError({ id, message }: { id: string; message: string }) {
  return (
    <p id={id} className="mb-1 text-stop">
      <span className="sr-only">Error: </span>
      {message}
    </p>
  );
}
