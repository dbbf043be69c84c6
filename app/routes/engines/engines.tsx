import { href, Link } from "react-router";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { ButtonLink } from "~/components/ui/button";
import { EmptyState } from "~/components/ui/empty-state";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";
import { listEngines } from "~/models/engine.server";
import { orPage } from "~/routes/answer.server";
import type { Route } from "./+types/engines";
import { engineKind, stateWords } from "./words";

export const meta: Route.MetaFunction = () => [{ title: "Engines · Tenthbook" }];

const pageLength = 100;

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:read");
  const after = new URL(request.url).searchParams.get("after") ?? undefined;
  const rows = await orPage(listEngines(scope, { after, most: pageLength + 1 }));
  const engines = rows.slice(0, pageLength);
  return {
    mayAdd: may(person.role, "engine:write"),
    next: rows.length > pageLength ? engines.at(-1)?.id : undefined,
    engines: engines.map((engine) => ({
      id: engine.id,
      name: engine.name,
      kind: engineKind(engine),
      stands: engine.buildNumber
        ? `build ${engine.buildNumber} ${stateWords[engine.buildState!]}`
        : "no build yet",
    })),
  };
}

export default function Engines({ loaderData: { engines, mayAdd, next } }: Route.ComponentProps) {
  const add = mayAdd && (
    <ButtonLink to={href("/engines/new")} variant={engines.length === 0 ? "primary" : "plain"}>
      Set up an engine
    </ButtonLink>
  );
  return (
    <Page title="Engines" actions={engines.length > 0 && add}>
      {engines.length === 0 ? (
        <EmptyState title="No engine is set up yet.">
          <p>
            An engine needs its layout, bore, stroke and rod length; its fits and positions follow from them.
          </p>
          {add}
        </EmptyState>
      ) : (
        <Table caption="Engines" hideCaption>
          <thead>
            <tr>
              <th scope="col">engine</th>
              <th scope="col">what it is</th>
              <th scope="col">where it stands</th>
            </tr>
          </thead>
          <tbody>
            {engines.map((engine) => (
              <tr key={engine.id}>
                <th scope="row">
                  <Link to={href("/engines/:engineId", { engineId: engine.id })}>{engine.name}</Link>
                </th>
                <td className="words">{engine.kind}</td>
                <td className="words">{engine.stands}</td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      {next && (
        <p className="mt-4">
          <Link to={`${href("/engines")}?after=${next}`}>More engines</Link>
        </p>
      )}
    </Page>
  );
}
