import { href } from "react-router";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { ButtonLink } from "~/components/ui/button";
import { EmptyState } from "~/components/ui/empty-state";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";
import { listOils } from "~/models/oil.server";
import { orPage } from "~/routes/answer.server";
import type { Route } from "./+types/oils";

export const meta: Route.MetaFunction = () => [{ title: "Oils · Tenthbook" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "oil:read");
  const oils = await orPage(listOils(scope));
  return {
    mayAdd: may(person.role, "oil:write"),
    oils: oils.map((oil) => ({
      id: oil.id,
      name: oil.name,
      grade: oil.grade,
      kv40: oil.kv40.toFixed(1),
      kv100: oil.kv100.toFixed(2),
      density15: oil.density15?.toFixed(0) ?? "",
      hths: oil.hths_pa_s === null ? "" : (oil.hths_pa_s * 1000).toFixed(2),
      note: oil.note,
    })),
  };
}

export default function Oils({ loaderData: { oils, mayAdd } }: Route.ComponentProps) {
  const add = mayAdd && (
    <ButtonLink to={href("/oils/new")} variant={oils.length === 0 ? "primary" : "plain"}>
      Add an oil
    </ButtonLink>
  );
  return (
    <Page title="Oils" actions={oils.length > 0 && add}>
      {oils.length === 0 ? (
        <EmptyState title="No oil is known yet.">
          <p>
            An oil's data sheet gives its viscosity at 40 and 100 °C; the rest of its curve follows from those
            two.
          </p>
          {add}
        </EmptyState>
      ) : (
        <Table caption="The shop's oils">
          <thead>
            <tr>
              <th scope="col">oil</th>
              <th scope="col">grade</th>
              <th scope="col">at 40 °C, mm²/s</th>
              <th scope="col">at 100 °C, mm²/s</th>
              <th scope="col">density at 15 °C, kg/m³</th>
              <th scope="col">HTHS, mPa·s</th>
              <th scope="col">note</th>
            </tr>
          </thead>
          <tbody>
            {oils.map((oil) => (
              <tr key={oil.id}>
                <th scope="row">{oil.name}</th>
                <td className="words">{oil.grade}</td>
                <td>{oil.kv40}</td>
                <td>{oil.kv100}</td>
                <td>{oil.density15}</td>
                <td>{oil.hths}</td>
                <td className="words">{oil.note}</td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
    </Page>
  );
}
