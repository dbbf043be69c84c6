import { data, Form, href, Link, redirect } from "react-router";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { Choice } from "~/components/ui/choice";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Page } from "~/components/ui/page";
import { dayText } from "~/engineering/quantity/figures";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { findBuild, listTargets } from "~/models/build.server";
import { listFits } from "~/models/fit.server";
import { listGauges } from "~/models/gauge.server";
import { listStandingReadings } from "~/models/reading.server";
import { blankBoxes, listSignatures, sheetProgress, takeBuildFurther } from "~/models/sheet.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import type { Route } from "./+types/sheet";
import { BuildTabs } from "./build-tabs";
import { FitPicker } from "./fit-picker";
import { orUnreachable } from "./or-unreachable";
import { saveBoxes } from "./sheet-action.server";
import { SheetPanel } from "./sheet-panel";
import { boxStates, gaugeChoice, sheetOf } from "./sheet-view.server";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.title ?? "Sheet"} · Tenthbook` },
];

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:read");
  const build = await orPage(findBuild(scope, params.buildId));
  const [fits, targets, progress, signatures] = await Promise.all([
    listFits(scope, build.engine_id),
    listTargets(scope, build.id),
    sheetProgress(scope, build, "assembly"),
    listSignatures(scope, build.id),
  ]);
  const asked = new URL(request.url).searchParams.get("fit");
  const fit = fits.find((candidate) => candidate.id === asked) ?? fits[0];
  if (!fit) throw data("This engine has no fits to measure.", { status: 404 });
  const readings = (await listStandingReadings(scope, build.id, "assembly")).filter(
    (row) => row.fitId === fit.id,
  );
  const signature = signatures.find((row) => row.stage === "assembly");
  const mayWrite = may(person.role, "reading:write") && build.state === "measuring";
  return {
    id: build.id,
    engineId: build.engine_id,
    engineName: build.engineName,
    title: `${build.engineName}, build ${build.number}: ${fitKind(fit.kind).name.toLowerCase()}`,
    state: build.state,
    version: build.version,
    units: person.units,
    progress,
    blank: blankBoxes(progress),
    signed: signature && { by: signature.personName, day: dayText(signature.signedAt) },
    frozen: !mayWrite,
    maySign: may(person.role, "sheet:sign") && build.state === "measuring",
    sheet: sheetOf(
      fit,
      targets.find((target) => target.fitId === fit.id),
      readings,
    ),
    boxes: boxStates(readings, person.units),
    gauges: mayWrite || may(person.role, "gauge:read") ? (await listGauges(scope)).map(gaugeChoice) : [],
    lastTemperature: readings.at(-1)?.temperatureC?.toFixed(1) ?? "",
    lastGauges: {
      bore: readings.findLast((row) => row.feature === "bore")?.gaugeId ?? "",
      journal: readings.findLast((row) => row.feature === "journal")?.gaugeId ?? "",
    },
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const { person, scope } = requirePerson({ request, context }, "reading:write");
  const build = await orPage(findBuild(scope, params.buildId));
  const form = await request.formData();
  return orFormErrors(form, async () => {
    if (form.get("intent") === "sign") {
      requirePerson({ request, context }, "sheet:sign");
      const version = Number(form.get("version"));
      const blank = blankBoxes(await sheetProgress(scope, build, "assembly"));
      if (blank > 0 && form.get("accept") !== "blank") {
        const message = `${blank} boxes are blank. Fill them, mark them not measured, or say below that they stay blank.`;
        return refuseForm([{ path: "accept", code: "blank-boxes", message }], form);
      }
      await takeBuildFurther(scope, build, "assembled", version);
      throw redirect(href("/builds/:buildId", { buildId: build.id }));
    }
    const answer = await saveBoxes(scope, person.units, build, "assembly", form);
    return answer;
  });
}

export const clientAction = ({ serverAction }: Route.ClientActionArgs) => orUnreachable(serverAction());

export default function SheetPage({ loaderData, actionData }: Route.ComponentProps) {
  const errors = actionData && "errors" in actionData ? actionData.errors : [];
  return (
    <Page
      title={loaderData.title}
      breadcrumbs={[
        { to: href("/engines"), label: "Engines" },
        { to: href("/engines/:engineId", { engineId: loaderData.engineId }), label: loaderData.engineName },
        { to: href("/builds/:buildId", { buildId: loaderData.id }), label: "Build" },
      ]}
    >
      <BuildTabs
        buildId={loaderData.id}
        tornDown={loaderData.state === "torn-down" || loaderData.state === "reviewed"}
      />
      <FitPicker
        path={href("/builds/:buildId/sheet", { buildId: loaderData.id })}
        fits={loaderData.progress}
        current={loaderData.sheet.id}
      />
      <ErrorSummary errors={errors} />
      <SheetPanel
        key={`${loaderData.sheet.id} ${loaderData.units}`}
        stage="assembly"
        sheet={loaderData.sheet}
        boxes={loaderData.boxes}
        units={loaderData.units}
        gauges={loaderData.gauges}
        lastTemperature={loaderData.lastTemperature}
        lastGauges={loaderData.lastGauges}
        frozen={loaderData.frozen}
        answers={actionData && "results" in actionData ? actionData.results : undefined}
      />
      {loaderData.signed && (
        <p className="mt-6">
          Signed by {loaderData.signed.by}, {loaderData.signed.day}. The sheet is frozen.
        </p>
      )}
      {loaderData.maySign && (
        <Form method="post" className="mt-9 grid max-w-xl gap-4 border-t border-line pt-5">
          <h2 className="text-lg font-semibold">Sign the sheet</h2>
          <p className="text-mute">
            Your signature freezes every fit of this build as measured. {loaderData.blank} of its boxes are
            blank.
          </p>
          <input type="hidden" name="intent" value="sign" />
          <input type="hidden" name="version" value={loaderData.version} />
          {loaderData.blank > 0 && (
            <Choice
              legend="Blank boxes"
              name="accept"
              type="checkbox"
              options={[{ value: "blank", label: "What is blank now stays blank" }]}
              error={errors.find((error) => error.path === "accept")?.message}
            />
          )}
          <div>
            <Button type="submit">Sign: assembled as measured</Button>
          </div>
        </Form>
      )}
      {!loaderData.maySign && loaderData.state === "assembled" && (
        <p className="mt-4">
          <Link to={href("/builds/:buildId/runs", { buildId: loaderData.id })}>To the run log</Link>
        </p>
      )}
    </Page>
  );
}
