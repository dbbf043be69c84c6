import { Form, href, Link, redirect } from "react-router";
import { z } from "zod";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { Ladder } from "~/components/drawings/ladder";
import { Button, ButtonLink } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Select } from "~/components/ui/select";
import { Table } from "~/components/ui/table";
import {
  clearanceText,
  clearanceUnit,
  dayText,
  diameterText,
  diameterUnitName,
} from "~/engineering/quantity/figures";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { insertBuild, listBuilds } from "~/models/build.server";
import { assignEngine, findEngine, listAssignments, unassignEngine } from "~/models/engine.server";
import { listFits } from "~/models/fit.server";
import { listEngineHistory } from "~/models/history.server";
import { listRungs } from "~/models/ladder.server";
import { listOils } from "~/models/oil.server";
import { listPeople } from "~/models/person.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import { fieldErrors, fieldsOf, note } from "~/routes/form-fields";
import type { Route } from "./+types/engine";
import { engineKind, stateWords } from "./words";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.name ?? "Engine"} · Tenthbook` },
];

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:read");
  const engine = await orPage(findEngine(scope, params.engineId));
  const mayBuild = may(person.role, "build:write");
  const mayAssign = may(person.role, "shop:write");
  const [fits, builds, rungs, history, oils, assigned, people] = await Promise.all([
    listFits(scope, engine.id),
    listBuilds(scope, engine.id),
    listRungs(scope, engine.id),
    listEngineHistory(scope, engine.id, 8),
    mayBuild ? listOils(scope) : [],
    mayAssign ? listAssignments(scope, engine.id) : [],
    mayAssign ? listPeople(scope) : [],
  ]);
  const last = builds[0];
  return {
    id: engine.id,
    name: engine.name,
    kind: engineKind(engine),
    duty: engine.duty,
    sizes: `${engine.bore_typed} bore, ${engine.stroke_typed} stroke, ${engine.rod_length_typed} rod, ${engine.rev_limit_rpm} rpm`,
    last: last && { id: last.id, number: last.number, stands: stateWords[last.state] },
    mayStart: mayBuild && (!last || last.state === "torn-down" || last.state === "reviewed"),
    mayAssign,
    nextNumber: (last?.number ?? 0) + 1,
    clearanceUnit: clearanceUnit(person.units),
    diameterUnit: diameterUnitName(person.units),
    rungs: rungs.map((rung) => ({ ...rung, to: href("/builds/:buildId", { buildId: rung.id }) })),
    fits: fits.map((fit) => ({
      id: fit.id,
      name: fitKind(fit.kind).name,
      positions: fit.positions.length,
      nominal: diameterText(fit.nominal_pm, person.units),
      least: clearanceText(fit.least_pm, person.units),
      usual: clearanceText(fit.usual_pm, person.units),
      most: clearanceText(fit.most_pm, person.units),
      coating: fit.coating?.replaceAll("-", " ") ?? "",
    })),
    oils: oils.map((oil) => ({ value: oil.id, label: `${oil.name}, ${oil.grade}` })),
    assigned,
    assignable: people
      .filter((one) => one.role === "crew-chief" || one.role === "viewer")
      .filter((one) => !assigned.some((other) => other.id === one.id))
      .map((one) => ({ value: one.id, label: one.name })),
    history: history.map((change) => ({
      id: change.id,
      say: `${change.personName} ${change.what}`,
      day: dayText(change.happenedAt),
    })),
  };
}

const engineAction = z.discriminatedUnion("intent", [
  z.object({ intent: z.literal("start"), oilId: z.string().optional(), note: note() }),
  z.object({ intent: z.literal("assign"), personId: z.string().min(1, "Choose a person.") }),
  z.object({ intent: z.literal("unassign"), personId: z.string().min(1, "Choose a person.") }),
]);

export async function action({ request, context, params }: Route.ActionArgs) {
  const form = await request.formData();
  const typed = engineAction.safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  const asked = typed.data;
  const { scope } = requirePerson(
    { request, context },
    asked.intent === "start" ? "build:write" : "shop:write",
  );
  return orFormErrors(form, async () => {
    switch (asked.intent) {
      case "start": {
        const buildId = await insertBuild(scope, params.engineId, {
          oilId: asked.oilId || undefined,
          note: asked.note,
        });
        throw redirect(href("/builds/:buildId/sheet", { buildId }));
      }
      case "assign":
        await assignEngine(scope, params.engineId, asked.personId);
        return null;
      case "unassign":
        await unassignEngine(scope, params.engineId, asked.personId);
        return null;
    }
  });
}

export default function EnginePage({ loaderData: engine, actionData }: Route.ComponentProps) {
  return (
    <Page
      title={engine.name}
      subtitle={[engine.kind, engine.duty, engine.sizes].filter(Boolean).join(" · ")}
      breadcrumbs={[{ to: href("/engines"), label: "Engines" }]}
      aside={engine.rungs.length > 0 && <Ladder title="The ladder" rungs={engine.rungs} />}
    >
      <ErrorSummary errors={actionData?.errors ?? []} />
      {engine.last && (
        <p className="mb-6 flex flex-wrap items-center gap-4">
          Build {engine.last.number} is {engine.last.stands}.
          <ButtonLink to={href("/builds/:buildId", { buildId: engine.last.id })} variant="primary">
            Open build {engine.last.number}
          </ButtonLink>
        </p>
      )}
      <Table caption={`Fits; clearances in ${engine.clearanceUnit}, diametral at 20 °C`}>
        <thead>
          <tr>
            <th scope="col">fit</th>
            <th scope="col">positions</th>
            <th scope="col">nominal, {engine.diameterUnit}</th>
            <th scope="col">never under</th>
            <th scope="col">usual</th>
            <th scope="col">never over</th>
            <th scope="col">coating</th>
          </tr>
        </thead>
        <tbody>
          {engine.fits.map((fit) => (
            <tr key={fit.id}>
              <th scope="row">
                <Link to={href("/engines/:engineId/fits/:fitId", { engineId: engine.id, fitId: fit.id })}>
                  {fit.name}
                </Link>
              </th>
              <td>{fit.positions}</td>
              <td>{fit.nominal}</td>
              <td>{fit.least}</td>
              <td>{fit.usual}</td>
              <td>{fit.most}</td>
              <td className="words">{fit.coating}</td>
            </tr>
          ))}
        </tbody>
      </Table>
      {engine.mayStart && <StartBuild engine={engine} values={actionData?.values} />}
      {engine.mayAssign && <Assignments engine={engine} />}
      {engine.history.length > 0 && (
        <section className="mt-9">
          <h2 className="mb-2 text-lg font-semibold">What was changed last</h2>
          <ul>
            {engine.history.map((change) => (
              <li key={change.id}>
                <span className="font-mono text-[13px] text-mute">{change.day}</span> {change.say}
              </li>
            ))}
          </ul>
        </section>
      )}
    </Page>
  );
}

type EngineData = Route.ComponentProps["loaderData"];

function StartBuild({ engine, values }: { engine: EngineData; values: Record<string, string> | undefined }) {
  return (
    <Form method="post" className="mt-9 grid max-w-xl gap-4">
      <h2 className="text-lg font-semibold">Start build {engine.nextNumber}</h2>
      <p className="text-mute">
        {engine.last
          ? "Each fit aims at what was signed last; where nothing was signed it keeps its target."
          : "Each fit aims at its usual clearance. Look at the fits first: their limits are only a place to start."}
      </p>
      <input type="hidden" name="intent" value="start" />
      <Select
        label="Oil it will run on"
        name="oilId"
        defaultValue={values?.oilId ?? ""}
        options={[{ value: "", label: "Not decided" }, ...engine.oils]}
      />
      <Field label="Note" name="note" defaultValue={values?.note} />
      <div>
        <Button type="submit" variant={engine.last ? "plain" : "primary"}>
          Start build {engine.nextNumber}
        </Button>
      </div>
    </Form>
  );
}

function Assignments({ engine }: { engine: EngineData }) {
  return (
    <section className="mt-9 max-w-xl">
      <h2 className="mb-2 text-lg font-semibold">Who else sees it</h2>
      <p className="mb-3 text-mute">
        Crew chiefs and customers see the engines they are assigned to and no others.
      </p>
      <ul>
        {engine.assigned.map((person) => (
          <li key={person.id} className="flex items-center justify-between border-t border-line">
            {person.name}
            <Form method="post">
              <input type="hidden" name="personId" value={person.id} />
              <Button type="submit" variant="quiet" name="intent" value="unassign">
                Take it back<span className="sr-only"> from {person.name}</span>
              </Button>
            </Form>
          </li>
        ))}
      </ul>
      {engine.assignable.length > 0 && (
        <Form method="post" className="mt-3 flex items-end gap-4">
          <input type="hidden" name="intent" value="assign" />
          <Select label="Person" name="personId" options={engine.assignable} />
          <Button type="submit">Assign</Button>
        </Form>
      )}
    </section>
  );
}
