import { Form, href } from "react-router";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { Choice } from "~/components/ui/choice";
import { EmptyState } from "~/components/ui/empty-state";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Select } from "~/components/ui/select";
import { Table } from "~/components/ui/table";
import { dayText, pressureText, pressureUnit } from "~/engineering/quantity/figures";
import { inWords, runEvents, runKinds } from "~/engineering/trade/condition";
import { findBuild } from "~/models/build.server";
import { listOils } from "~/models/oil.server";
import { insertRun, listRuns } from "~/models/run.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import { fieldErrors, fieldsOf } from "~/routes/form-fields";
import type { Route } from "./+types/runs";
import { BuildTabs } from "./build-tabs";
import { runForm } from "./run-form";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.title ?? "Runs"} · Tenthbook` },
];

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:read");
  const build = await orPage(findBuild(scope, params.buildId));
  const mayLog = may(person.role, "run:write") && (build.state === "assembled" || build.state === "running");
  const [runs, oils] = await Promise.all([listRuns(scope, build.id), mayLog ? listOils(scope) : []]);
  return {
    id: build.id,
    engineId: build.engine_id,
    engineName: build.engineName,
    title: `${build.engineName}, build ${build.number}: runs`,
    state: build.state,
    oilId: runs.at(-1)?.oil_id ?? build.oil_id ?? "",
    pressureUnit: pressureUnit(person.units),
    oils: oils.map((oil) => ({ value: oil.id, label: `${oil.name}, ${oil.grade}` })),
    mayLog,
    today: dayText(new Date().toISOString()),
    runs: runs.map((run) => ({
      id: run.id,
      day: dayText(run.started_at),
      kind: run.kind,
      hours: run.hours.toFixed(1),
      laps: run.laps ?? "",
      starts: run.starts ?? "",
      topSpeed: run.top_speed_rpm ?? "",
      oil: run.oilName,
      oilTemperature: run.oil_temperature_c?.toFixed(0) ?? "",
      idle: pressureText(run.pressure_idle_pa, person.units),
      atSpeed: pressureText(run.pressure_at_speed_pa, person.units),
      atSpeedRpm: run.pressure_at_speed_rpm ?? "",
      events: run.events.map(inWords).join(", "),
      note: run.note,
    })),
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const { person, scope } = requirePerson({ request, context }, "run:write");
  const build = await orPage(findBuild(scope, params.buildId));
  const form = await request.formData();
  const typed = runForm(person.units).safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  const run = typed.data;
  return orFormErrors(form, async () => {
    await insertRun(scope, build, {
      ...run,
      oilTemperatureC: run.oilTemperature?.si,
      pressureIdlePa: run.pressureIdle?.si,
      pressureAtSpeedPa: run.pressureAtSpeed?.si,
    });
    return null;
  });
}

export default function Runs({ loaderData, actionData }: Route.ComponentProps) {
  const { runs } = loaderData;
  return (
    <Page
      title={loaderData.title}
      breadcrumbs={[
        { to: href("/engines"), label: "Engines" },
        { to: href("/engines/:engineId", { engineId: loaderData.engineId }), label: loaderData.engineName },
      ]}
    >
      <BuildTabs
        buildId={loaderData.id}
        tornDown={loaderData.state === "torn-down" || loaderData.state === "reviewed"}
      />
      {runs.length === 0 ? (
        <EmptyState title="No run is logged yet.">
          <p>
            {loaderData.state === "measuring"
              ? "The build has to be assembled and its sheet signed before it runs."
              : "Hours, oil and oil temperature make the teardown mean something: log each run."}
          </p>
        </EmptyState>
      ) : (
        <Table caption="Runs of this build">
          <thead>
            <tr>
              <th scope="col">day</th>
              <th scope="col">kind</th>
              <th scope="col">hours</th>
              <th scope="col">laps</th>
              <th scope="col">starts</th>
              <th scope="col">top speed, rpm</th>
              <th scope="col">oil</th>
              <th scope="col">oil, °C</th>
              <th scope="col">hot idle, {loaderData.pressureUnit}</th>
              <th scope="col">at speed, {loaderData.pressureUnit}</th>
              <th scope="col">at, rpm</th>
              <th scope="col">events and notes</th>
            </tr>
          </thead>
          <tbody>
            {runs.map((run) => (
              <tr key={run.id}>
                <th scope="row">{run.day}</th>
                <td className="words">{run.kind}</td>
                <td>{run.hours}</td>
                <td>{run.laps}</td>
                <td>{run.starts}</td>
                <td>{run.topSpeed}</td>
                <td className="words">{run.oil}</td>
                <td>{run.oilTemperature}</td>
                <td>{run.idle}</td>
                <td>{run.atSpeed}</td>
                <td>{run.atSpeedRpm}</td>
                <td className="words">{[run.events, run.note].filter(Boolean).join(". ")}</td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      {loaderData.mayLog && <LogRun loaderData={loaderData} refused={actionData} />}
    </Page>
  );
}

interface LogRunProps {
  loaderData: Route.ComponentProps["loaderData"];
  refused: Route.ComponentProps["actionData"];
}

function LogRun({ loaderData, refused }: LogRunProps) {
  const errors = refused?.errors ?? [];
  const field = (name: string, start = "") => ({
    name,
    defaultValue: refused?.values[name] ?? start,
    error: errors.find((error) => error.path === name)?.message,
  });
  return (
    // A run that was written down leaves an empty form for the next one.
    <Form key={loaderData.runs.length} method="post" noValidate className="mt-9 grid max-w-3xl gap-5">
      <h2 className="text-lg font-semibold">Log a run</h2>
      <ErrorSummary errors={errors} />
      <div className="grid grid-cols-2 gap-4 sm:grid-cols-4">
        <Select
          label="Kind"
          {...field("kind", "test")}
          options={runKinds.map((kind) => ({ value: kind, label: kind }))}
        />
        <Field label="Day" hint="Year-month-day" {...field("startedAt", loaderData.today)} />
        <Field label="Hours" inputMode="decimal" {...field("hours")} />
        <Field label="Laps" inputMode="numeric" {...field("laps")} />
        <Field label="Starts" inputMode="numeric" {...field("starts")} />
        <Field label="Top speed" suffix="rpm" inputMode="numeric" {...field("topSpeedRpm")} />
        <Select
          label="Oil"
          {...field("oilId", loaderData.oilId)}
          options={[{ value: "", label: "Choose" }, ...loaderData.oils]}
        />
        <Field label="Oil temperature" hint="°C, or 221 degF" {...field("oilTemperature")} />
        <Field
          label="Pressure, hot idle"
          hint={`${loaderData.pressureUnit}, or with its unit`}
          {...field("pressureIdle")}
        />
        <Field label="Pressure at speed" hint="Lowest under load" {...field("pressureAtSpeed")} />
        <Field label="At" suffix="rpm" inputMode="numeric" {...field("pressureAtSpeedRpm")} />
      </div>
      <Choice
        legend="What happened"
        name="events"
        type="checkbox"
        options={runEvents.map((event) => ({ value: event, label: inWords(event) }))}
        defaultValue={refused?.values.events?.split(",") ?? []}
      />
      <Field label="Note" {...field("note")} />
      <div>
        <Button type="submit" variant="primary">
          Log it
        </Button>
      </div>
    </Form>
  );
}
