import { useId } from "react";
import { ToneGlyph } from "./tone-glyph";

interface Described {
  id?: string | undefined;
  name?: string | undefined;
  hint?: string | undefined;
  suffix?: string | undefined;
  error?: string | undefined;
}

/** The address of a field that has a mistake: what the list of mistakes above the form leads to. */
export const fieldWithError = (name: string): string => `mistake-${name}`;

/**
 * A field's id and the ids of what describes it. A field with a mistake goes by its name, so that the list above the
 * form can link to it before script; others take an id of their own, since a page may have a name more than once.
 */
export function useFieldId({ id, name, hint, suffix, error }: Described) {
  const own = useId();
  const fieldId = id ?? (error && name ? fieldWithError(name) : own);
  const describedBy = [
    hint && `${fieldId}-hint`,
    error && `${fieldId}-error`,
    suffix && `${fieldId}-unit`,
  ].filter(Boolean);
  return { fieldId, describedBy: describedBy.join(" ") || undefined };
}

/** How to fill a field in. */
export function FieldHint({ id, children }: { id: string; children: string | undefined }) {
  if (!children) return null;
  return (
    <p id={`${id}-hint`} className="mb-1 text-dense text-mute">
      {children}
    </p>
  );
}

/** The sentence beside a field that says what is wrong with it. */
export function FieldError({ id, children }: { id: string; children: string | undefined }) {
  if (!children) return null;
  return (
    <p id={`${id}-error`} className="mb-1 flex items-baseline gap-1.5 text-stop">
      <span className="translate-y-0.5 leading-none">
        <ToneGlyph tone="stop" />
      </span>
      <span>
        <span className="sr-only">Error: </span>
        {children}
      </span>
    </p>
  );
}
