import { Table } from "~/components/ui/table";
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
      {call.about && <p className="max-w-prose text-mute">{call.about}</p>}
      <p className="text-[13px] text-mute">{call.who}</p>
      {call.query.length > 0 && <Fields caption="Query" fields={call.query} />}
      {call.body.length > 0 && <Fields caption="Body" fields={call.body} />}
      {call.example && (
        // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by key
        <pre tabIndex={0} className="my-3 overflow-x-auto bg-plate-deep p-3 font-mono text-[13px]">
          {`curl ${origin}/api/v1${call.path} -H "Authorization: Bearer $TOKEN" -H "Content-Type: application/json" -d '${call.example}'`}
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
    <Table caption={caption}>
      <thead>
        <tr>
          <th scope="col">field</th>
          <th scope="col">type</th>
          <th scope="col">what</th>
        </tr>
      </thead>
      <tbody>
        {fields.map(({ path, type, needed, what }) => (
          <tr key={path}>
            <th scope="row">
              <code className="font-mono">{path}</code>
            </th>
            <td>{type}</td>
            <td className="whitespace-normal">
              {needed ? "" : "may be left out. "}
              {what}
            </td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
