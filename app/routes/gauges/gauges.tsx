import { href } from "react-router";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { ButtonLink } from "~/components/ui/button";
import { EmptyState } from "~/components/ui/empty-state";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";
import { listGauges } from "~/models/gauge.server";
import { orPage } from "~/routes/answer.server";
import type { Route } from "./+types/gauges";

export const meta: Route.MetaFunction = () => [{ title: "Gauges · Tenthbook" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "gauge:read");
  const gauges = await orPage(listGauges(scope));
  const today = new Date().toISOString().slice(0, 10);
  return {
    mayAdd: may(person.role, "gauge:write"),
    gauges: gauges.map((gauge) => ({
      id: gauge.id,
      name: gauge.name,
      kind: gauge.kind,
      serial: gauge.serial,
      resolution: gauge.resolution_typed,
      calibration: gauge.calibration_typed,
      repeatability: gauge.repeatability_typed,
      due: gauge.due_on ? `${gauge.due_on}${gauge.due_on < today ? ", overdue" : ""}` : "",
    })),
  };
}

export default function Gauges({ loaderData: { gauges, mayAdd } }: Route.ComponentProps) {
  const add = mayAdd && (
    <ButtonLink to={href("/gauges/new")} variant={gauges.length === 0 ? "primary" : "plain"}>
      Add a gauge
    </ButtonLink>
  );
  return (
    <Page title="Gauges" actions={gauges.length > 0 && add}>
      {gauges.length === 0 ? (
        <EmptyState title="No gauge is known yet.">
          <p>
            A gauge's resolution, calibration and repeats say how sure a clearance is; without them a reading
            only gets what its digits allow.
          </p>
          {add}
        </EmptyState>
      ) : (
        <Table caption="The shop's gauges; calibration and repeatability as standard uncertainties">
          <thead>
            <tr>
              <th scope="col">gauge</th>
              <th scope="col">kind</th>
              <th scope="col">serial</th>
              <th scope="col">resolves</th>
              <th scope="col">calibration</th>
              <th scope="col">repeatability</th>
              <th scope="col">due</th>
            </tr>
          </thead>
          <tbody>
            {gauges.map((gauge) => (
              <tr key={gauge.id}>
                <th scope="row">{gauge.name}</th>
                <td className="words">{gauge.kind}</td>
                <td>{gauge.serial}</td>
                <td>{gauge.resolution}</td>
                <td>{gauge.calibration}</td>
                <td>{gauge.repeatability}</td>
                <td>{gauge.due}</td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
    </Page>
  );
}
