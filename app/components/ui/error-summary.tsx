import { type MouseEvent, useEffect, useRef } from "react";
import { fieldWithError } from "./field-parts";

interface ErrorSummaryProps {
  /** `path` is the field's name, empty for a mistake of the whole form. */
  errors: readonly { path: string; message: string }[];
}

/** What is wrong with a form, in one place above it: it takes the focus, and each sentence leads to its field. */
export function ErrorSummary({ errors }: ErrorSummaryProps) {
  const box = useRef<HTMLElement>(null);
  // By what they say: a list that is only made anew at a drawing must not take the focus from who is typing.
  const said = errors.map(({ path, message }) => `${path} ${message}`).join("\n");
  useEffect(() => {
    if (said !== "") box.current?.focus();
  }, [said]);
  if (errors.length === 0) return null;

  return (
    <section
      ref={box}
      tabIndex={-1}
      role="alert"
      aria-labelledby="problem"
      className="mb-6 max-w-3xl border-l-4 border-stop bg-stop-wash px-4 py-3"
    >
      <h2 id="problem" className="mb-1 text-lg font-semibold">
        There is a problem
      </h2>
      <ul>
        {errors.map(({ path, message }) => (
          <li key={`${path} ${message}`}>
            {path === "" ? (
              message
            ) : (
              <a
                href={`#${fieldWithError(path)}`}
                onClick={(event) => goToField(event, path)}
                className="target inline-flex items-center text-stop underline underline-offset-2"
              >
                {message}
              </a>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}

/** To the field itself, by its name too, where its page does not write the mistake beside it. */
function goToField(event: MouseEvent, path: string): void {
  const field = document.getElementById(fieldWithError(path)) ?? document.getElementsByName(path)[0];
  if (!field) return;
  event.preventDefault();
  field.focus();
}
