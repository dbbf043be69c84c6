import type { CallDescription } from "./describe-calls.server";

/** One call of the API as a person reads it: what it takes, an example, what it answers. */
export function CallSection({ call, origin }: { call: CallDescription; origin: string }) {
  return (
    <section id={call.id} className="mb-7 border-t border-line pt-4">
      <h3 className="text-lg font-semibold">
        <code className="font-mono">
          {call.method} {call.path}
        </code>
      </h3>
      <p>{call.title}.</p>
      {call.about && (
        <p className="max-w-prose text-mute">
          <WithCode text={call.about} />
        </p>
      )}
      <p className="text-[13px] text-mute">{call.who}</p>
      {call.query.length > 0 && <Fields caption="Query" fields={call.query} />}
      {call.body.length > 0 && <Fields caption="Body" fields={call.body} />}
      {call.example && (
        // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by key
        <pre tabIndex={0} className="my-3 overflow-x-auto bg-plate-deep p-3 font-mono text-[13px]">
          {curl(origin, call)}
        </pre>
      )}
      {call.answer.length > 0 && (
        <details>
          <summary className="min-h-11 cursor-pointer py-2 text-layout">Answers {call.status} with</summary>
          <Fields caption="Answer" fields={call.answer} />
        </details>
      )}
    </section>
  );
}

function Fields({ caption, fields }: { caption: string; fields: CallDescription["body"] }) {
  return (
    <>
      <h4 className="mt-3 font-semibold">{caption}</h4>
      <dl className="mb-3">
        {fields.map(({ path, type, needed, what }) => (
          <div key={path} className="border-b border-line py-1 sm:grid sm:grid-cols-2 sm:gap-4">
            <dt className="break-words font-mono text-[13px] font-semibold">{path}</dt>
            <dd>
              {type}
              {needed ? "" : ", may be left out"}
              {what && `. ${what}`}
            </dd>
          </div>
        ))}
      </dl>
    </>
  );
}

/** Text in which names of fields stand between backticks. */
function WithCode({ text }: { text: string }) {
  const parts = text.split("`");
  return parts.map((part, index) =>
    // Every second part stood between backticks; the parts of a sentence never change places.
    // biome-ignore lint/suspicious/noArrayIndexKey: see above
    index % 2 === 1 ? <code key={index}>{part}</code> : part,
  );
}

const curl = (origin: string, { path, example }: CallDescription) =>
  [
    `curl ${origin}/api/v1${path} \\`,
    '  -H "Authorization: Bearer $TOKEN" -H "Content-Type: application/json" \\',
    `  -d '${example}'`,
  ].join("\n");
