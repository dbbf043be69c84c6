import { useEffect, useRef } from "react";

interface ErrorSummaryProps {
  errors: readonly { path: string; message: string }[];
}

/** What is wrong with a form, in one place above it: it takes the focus, and each sentence leads to its field. */
export function ErrorSummary({ errors }: ErrorSummaryProps) {
  const box = useRef<HTMLElement>(null);
  useEffect(() => {
    if (errors.length > 0) box.current?.focus();
  }, [errors]);
  if (errors.length === 0) return null;

  const goToField = (path: string) => {
    const field = document.getElementsByName(path)[0];
    field?.focus();
  };
  return (
    <section
      ref={box}
      tabIndex={-1}
      role="alert"
      aria-labelledby="problem"
      className="mb-6 max-w-3xl border-l-4 border-stop bg-stop-wash px-4 py-3"
    >
      <h2 id="problem" className="mb-1 font-semibold">
        There is a problem
      </h2>
      <ul>
        {errors.map(({ path, message }) => (
          <li key={`${path} ${message}`}>
            {path === "" ? (
              message
            ) : (
              <button type="button" className="text-left underline" onClick={() => goToField(path)}>
                {message}
              </button>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
