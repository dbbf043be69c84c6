import { Link } from "react-router";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";
import type { Route } from "./+types/page";
import { CallSection } from "./call-section";
import { describeCalls } from "./describe-calls.server";

export const meta: Route.MetaFunction = () => [{ title: "API · Tenthbook" }];

export function loader({ request }: Route.LoaderArgs) {
  return { origin: new URL(request.url).origin, ...describeCalls() };
}

export default function Api({ loaderData: { origin, groups, problems, limits } }: Route.ComponentProps) {
  return (
    <Page
      title="The API"
      subtitle="For gauges, loggers and scripts: JSON over HTTP, under /api/v1."
      breadcrumbs={[{ to: "/", label: "Tenthbook" }]}
      aside={
        <nav aria-label="Calls" className="lg:sticky lg:top-5">
          {groups.map(({ title, calls }) => (
            <div key={title} className="mb-4">
              <p className="font-semibold">{title}</p>
              <ul>
                {calls.map(({ id, method, path }) => (
                  <li key={id}>
                    <a
                      href={`#${id}`}
                      className="inline-flex min-h-6 items-center font-mono text-[13px] text-layout"
                    >
                      {method} {path}
                    </a>
                  </li>
                ))}
              </ul>
            </div>
          ))}
        </nav>
      }
    >
      <Introduction origin={origin} limits={limits} />
      <h2 className="mt-9 mb-3 text-xl font-semibold">Problems</h2>
      <p className="mb-3 max-w-prose">
        What cannot be answered comes as <code>application/problem+json</code> (RFC 9457) with a stable{" "}
        <code>code</code>, a sentence in <code>detail</code>, and for 422 the place of each error.
      </p>
      <Table caption="Problems by status" hideCaption>
        <thead>
          <tr>
            <th scope="col">status</th>
            <th scope="col">title</th>
          </tr>
        </thead>
        <tbody>
          {problems.map(({ status, title }) => (
            <tr key={status} id={`problem-${status}`}>
              <th scope="row">{status}</th>
              <td>{title}</td>
            </tr>
          ))}
        </tbody>
      </Table>
      {groups.map(({ title, calls }) => (
        <section key={title}>
          <h2 className="mt-9 mb-3 text-xl font-semibold">{title}</h2>
          {calls.map((call) => (
            <CallSection key={call.id} call={call} origin={origin} />
          ))}
        </section>
      ))}
    </Page>
  );
}

type Limits = Route.ComponentProps["loaderData"]["limits"];

function Introduction({ origin, limits }: { origin: string; limits: Limits }) {
  return (
    <div className="flex max-w-prose flex-col gap-3">
      <p>
        Make a token on <Link to="/account">your account's page</Link> and send it with every call:{" "}
        <code>Authorization: Bearer …</code>. It can do what you can, in one shop; a reading token changes
        nothing. Programs that write programs take{" "}
        <a href={`${origin}/api/v1/openapi.json`}>the description as OpenAPI 3.1</a>.
      </p>
      <p>
        Send quantities as text with their unit, as you would type them: <code>"2.1000 in"</code>,{" "}
        <code>"25 tenths"</code>, <code>"95 degC"</code>, <code>"7200 rpm"</code>. They come back as{" "}
        <code>{'{ "si": 0.0000635, "text": "0.0025 in" }'}</code>, the text in inches or with{" "}
        <code>?units=metric</code> in metric units. Where a calculator takes a quantity it also takes one that
        an answer gave. Angles are in radians; clearances are diametral, at 20 °C.
      </p>
      <p>
        Send an <code>Idempotency-Key</code> with each write that you may repeat: the same key and body gets
        the first answer again for a day. Lists come in parts: ask again with <code>?cursor=</code> the{" "}
        <code>next</code> of the part before. A body has at most {limits.megabytes} MB; a token makes at most{" "}
        {limits.callsPerMinute} calls a minute.
      </p>
      <p>
        What is worked out here is advice to a qualified builder. The parts makers' limits and the rules of
        the event come first, and no target changes without a named person's signature.
      </p>
    </div>
  );
}
