import { Form, href, Link } from "react-router";
import { z } from "zod";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { Button, ButtonLink } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";
import { clearanceText, clearanceUnit, dayText } from "~/engineering/quantity/figures";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { findBuild, listTargets } from "~/models/build.server";
import { listFits } from "~/models/fit.server";
import { countStanding } from "~/models/reading.server";
import { listRuns } from "~/models/run.server";
import { listSignatures, takeBuildFurther } from "~/models/sheet.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import { stateWords } from "~/routes/engines/words";
import { fieldErrors, fieldsOf } from "~/routes/form-fields";
import type { Route } from "./+types/build";
import { BuildTabs } from "./build-tabs";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.title ?? "Build"} · Tenthbook` },
];

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:read");
  const build = await orPage(findBuild(scope, params.buildId));
  const [fits, targets, counts, runs, signatures] = await Promise.all([
    listFits(scope, build.engine_id),
    listTargets(scope, build.id),
    countStanding(scope, build.id),
    listRuns(scope, build.id),
    listSignatures(scope, build.id),
  ]);
  return {
    id: build.id,
    engineId: build.engine_id,
    engineName: build.engineName,
    title: `${build.engineName}, build ${build.number}`,
    state: build.state,
    stands: stateWords[build.state],
    version: build.version,
    oil: build.oilName,
    note: build.note,
    hours: runs.reduce((sum, run) => sum + run.hours, 0).toFixed(1),
    runs: runs.length,
    signatures: signatures.map(({ stage, personName, signedAt }) => ({
      stage,
      personName,
      day: dayText(signedAt),
    })),
    unit: clearanceUnit(person.units),
    fits: fits.map((fit) => {
      const target = targets.find((row) => row.fitId === fit.id);
      const due = fit.positions.length * fitKind(fit.kind).stations.length;
      return {
        id: fit.id,
        name: fitKind(fit.kind).name,
        least: target ? clearanceText(target.least_pm, person.units) : "–",
        aim: target ? clearanceText(target.aim_pm, person.units) : "–",
        most: target ? clearanceText(target.most_pm, person.units) : "–",
        coating: target?.coating ?? "",
        due,
        assembly: counts.get(`${fit.id} assembly`) ?? 0,
        teardown: counts.get(`${fit.id} teardown`) ?? 0,
      };
    }),
    may: {
      teardown: may(person.role, "build:write") && (build.state === "assembled" || build.state === "running"),
    },
  };
}

const move = z.object({ to: z.enum(["torn-down"]), version: z.coerce.number().int() });

export async function action({ request, context, params }: Route.ActionArgs) {
  const { scope } = requirePerson({ request, context }, "build:write");
  const build = await orPage(findBuild(scope, params.buildId));
  const form = await request.formData();
  const asked = move.safeParse(fieldsOf(form));
  if (!asked.success) return refuseForm(fieldErrors(asked.error), form);
  return orFormErrors(form, async () => {
    await takeBuildFurther(scope, build, asked.data.to, asked.data.version);
    return null;
  });
}

export default function Build({ loaderData: build, actionData }: Route.ComponentProps) {
  const tornDown = build.state === "torn-down" || build.state === "reviewed";
  return (
    <Page
      title={build.title}
      subtitle={[build.stands, `${build.hours} h in ${build.runs} runs`, build.oil]
        .filter(Boolean)
        .join(" · ")}
      breadcrumbs={[
        { to: href("/engines"), label: "Engines" },
        { to: href("/engines/:engineId", { engineId: build.engineId }), label: build.engineName },
      ]}
    >
      <BuildTabs buildId={build.id} tornDown={tornDown} />
      <ErrorSummary errors={actionData?.errors ?? []} />
      {build.note && <p className="mb-5 max-w-prose">{build.note}</p>}
      <Table caption={`Targets of this build, ${build.unit}, diametral at 20 °C`}>
        <thead>
          <tr>
            <th scope="col">fit</th>
            <th scope="col">least</th>
            <th scope="col">aim</th>
            <th scope="col">most</th>
            <th scope="col">coating</th>
            <th scope="col">as built</th>
            {tornDown && <th scope="col">torn down</th>}
          </tr>
        </thead>
        <tbody>
          {build.fits.map((fit) => (
            <tr key={fit.id}>
              <th scope="row">
                <Link
                  to={href("/engines/:engineId/fits/:fitId", { engineId: build.engineId, fitId: fit.id })}
                >
                  {fit.name}
                </Link>
              </th>
              <td>{fit.least}</td>
              <td>{fit.aim}</td>
              <td>{fit.most}</td>
              <td className="words">{fit.coating.replaceAll("-", " ")}</td>
              <td>
                <Link to={`${href("/builds/:buildId/sheet", { buildId: build.id })}?fit=${fit.id}`}>
                  {fit.assembly} of {fit.due}
                </Link>
              </td>
              {tornDown && (
                <td>
                  <Link to={`${href("/builds/:buildId/teardown", { buildId: build.id })}?fit=${fit.id}`}>
                    {fit.teardown} of {fit.due}
                  </Link>
                </td>
              )}
            </tr>
          ))}
        </tbody>
      </Table>
      {build.signatures.length > 0 && (
        <ul className="mt-5">
          {build.signatures.map((signature) => (
            <li key={signature.stage}>
              {signature.stage === "assembly" ? "Assembly sheet" : "Teardown sheet"} signed by{" "}
              {signature.personName}, {signature.day}.
            </li>
          ))}
        </ul>
      )}
      {build.may.teardown && (
        <Form method="post" className="mt-7">
          <input type="hidden" name="to" value="torn-down" />
          <input type="hidden" name="version" value={build.version} />
          <p className="mb-3 max-w-prose text-mute">
            Before it is opened: leak-down while warm, an oil sample, the filter, lash as found. Oil and parts
            are hot; springs are loaded.
          </p>
          <Button type="submit">Tear it down</Button>
        </Form>
      )}
      {build.state === "reviewed" && (
        <ButtonLink to={href("/engines/:engineId", { engineId: build.engineId })}>To the engine</ButtonLink>
      )}
    </Page>
  );
}
