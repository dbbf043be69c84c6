import { data, Form, href } from "react-router";
import { z } from "zod";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { ConditionGlyph } from "~/components/drawings/condition-glyph";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Select } from "~/components/ui/select";
import { dayText } from "~/engineering/quantity/figures";
import { coatingStates, conditionGrades, damageTerms, inWords } from "~/engineering/trade/condition";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { findBuild, listTargets } from "~/models/build.server";
import { insertFinding, listFindings } from "~/models/finding.server";
import { listFits } from "~/models/fit.server";
import { listGauges } from "~/models/gauge.server";
import { measureFit } from "~/models/measured-fit";
import { listStandingReadings } from "~/models/reading.server";
import { listSignatures, sheetProgress, signTeardown } from "~/models/sheet.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import { fieldErrors, fieldsOf, note, optionalNumber } from "~/routes/form-fields";
import type { Route } from "./+types/teardown";
import { BuildTabs } from "./build-tabs";
import { FitPicker } from "./fit-picker";
import { orUnreachable } from "./or-unreachable";
import { saveBoxes } from "./sheet-action.server";
import { SheetPanel } from "./sheet-panel";
import { boxStates, gaugeChoice, sheetOf } from "./sheet-view.server";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.title ?? "Teardown"} · Tenthbook` },
];

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:read");
  const build = await orPage(findBuild(scope, params.buildId));
  if (build.state !== "torn-down" && build.state !== "reviewed") {
    throw data(`Build ${build.number} is not torn down yet.`, { status: 404 });
  }
  const [fits, targets, progress, signatures, findings] = await Promise.all([
    listFits(scope, build.engine_id),
    listTargets(scope, build.id),
    sheetProgress(scope, build, "teardown"),
    listSignatures(scope, build.id),
    listFindings(scope, build.id),
  ]);
  const asked = new URL(request.url).searchParams.get("fit");
  const fit = fits.find((candidate) => candidate.id === asked) ?? fits[0];
  if (!fit) throw data("This engine has no fits to measure.", { status: 404 });
  const readings = (await listStandingReadings(scope, build.id)).filter((row) => row.fitId === fit.id);
  const gauges = await listGauges(scope);
  const after = readings.filter((row) => row.stage === "teardown");
  const signature = signatures.find((row) => row.stage === "teardown");
  const open = build.state === "torn-down" && !signature;
  return {
    id: build.id,
    engineId: build.engine_id,
    engineName: build.engineName,
    title: `${build.engineName}, build ${build.number}: teardown, ${fitKind(fit.kind).name.toLowerCase()}`,
    units: person.units,
    progress,
    signed: signature && { by: signature.personName, day: dayText(signature.signedAt) },
    mayMeasure: open && may(person.role, "reading:write"),
    mayFind: open && may(person.role, "finding:write"),
    maySign: open && may(person.role, "sheet:sign"),
    sheet: sheetOf(
      fit,
      targets.find((target) => target.fitId === fit.id),
      after,
    ),
    boxes: boxStates(after, person.units),
    asBuilt: measureFit(
      fit,
      readings.filter((row) => row.stage === "assembly"),
      gauges,
    ).map(({ positionId, clearance }) => ({ positionId, clearance })),
    before: Object.fromEntries(
      boxStates(
        readings.filter((row) => row.stage === "assembly"),
        person.units,
      ).map(([key, box]) => [key, box.text]),
    ),
    gauges: gauges.map(gaugeChoice),
    lastTemperature: after.at(-1)?.temperatureC?.toFixed(1) ?? "",
    lastGauges: {
      bore: after.findLast((row) => row.feature === "bore")?.gaugeId ?? "",
      journal: after.findLast((row) => row.feature === "journal")?.gaugeId ?? "",
    },
    coated: targets.find((target) => target.fitId === fit.id)?.coating ?? null,
    findings: fit.positions.map((position) => {
      const found = findings.find((row) => row.position_id === position.id);
      return {
        positionId: position.id,
        number: position.number,
        grade: found?.grade,
        damage: found?.damage ?? "",
        place: found?.place ?? "",
        areaShare: found?.area_share === null || !found ? "" : String(Math.round(found.area_share * 100)),
        cause: found?.cause ?? "",
        coatingState: found?.coating_state ?? "",
        note: found?.note ?? "",
      };
    }),
  };
}

const findingForm = z.object({
  fit: z.string(),
  positionId: z.string(),
  grade: z.enum(["0", "1", "2", "3", "4"], { error: "Grade the part, 0 to 4." }).transform(Number),
  damage: z.union([z.literal("").transform(() => undefined), z.enum(damageTerms)]).optional(),
  place: note(120),
  areaShare: optionalNumber(0, 100, "A share is between 0 and 100 %."),
  cause: note(300),
  coatingState: z.union([z.literal("").transform(() => undefined), z.enum(coatingStates)]).optional(),
  note: note(),
});

export async function action({ request, context, params }: Route.ActionArgs) {
  const form = await request.formData();
  const intent = form.get("intent");
  const permission =
    intent === "finding" ? "finding:write" : intent === "sign" ? "sheet:sign" : "reading:write";
  const { person, scope } = requirePerson({ request, context }, permission);
  const build = await orPage(findBuild(scope, params.buildId));
  return orFormErrors(form, async () => {
    if (intent === "sign") {
      await signTeardown(scope, build);
      return null;
    }
    if (intent !== "finding") return saveBoxes(scope, person.units, build, "teardown", form);
    const typed = findingForm.safeParse(fieldsOf(form));
    if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
    const { fit, areaShare, ...finding } = typed.data;
    await insertFinding(scope, build, {
      ...finding,
      fitId: fit,
      areaShare: areaShare === undefined ? undefined : areaShare / 100,
    });
    return null;
  });
}

export const clientAction = ({ serverAction }: Route.ClientActionArgs) => orUnreachable(serverAction());

export default function Teardown({ loaderData, actionData }: Route.ComponentProps) {
  const refused = actionData && "errors" in actionData ? actionData : undefined;
  return (
    <Page
      title={loaderData.title}
      breadcrumbs={[
        { to: href("/engines"), label: "Engines" },
        { to: href("/engines/:engineId", { engineId: loaderData.engineId }), label: loaderData.engineName },
        { to: href("/builds/:buildId", { buildId: loaderData.id }), label: "Build" },
      ]}
    >
      <BuildTabs buildId={loaderData.id} tornDown />
      <FitPicker
        path={href("/builds/:buildId/teardown", { buildId: loaderData.id })}
        fits={loaderData.progress}
        current={loaderData.sheet.id}
      />
      <ErrorSummary errors={refused?.errors ?? []} />
      <SheetPanel
        key={`${loaderData.sheet.id} ${loaderData.units}`}
        stage="teardown"
        sheet={loaderData.sheet}
        boxes={loaderData.boxes}
        before={loaderData.before}
        asBuilt={loaderData.asBuilt}
        units={loaderData.units}
        gauges={loaderData.gauges}
        lastTemperature={loaderData.lastTemperature}
        lastGauges={loaderData.lastGauges}
        frozen={!loaderData.mayMeasure}
        answers={actionData && "results" in actionData ? actionData.results : undefined}
      />
      <section className="mt-9">
        <h2 className="mb-1 text-lg font-semibold">What the parts show</h2>
        <p className="mb-4 max-w-prose text-mute">
          Look before you wipe. Grade what is seen; what may have caused it stands in a field of its own.
        </p>
        <ul className="divide-y divide-line border-y border-line">
          {loaderData.findings.map((finding) => (
            <FindingRow
              key={finding.positionId}
              finding={finding}
              loaderData={loaderData}
              refused={refused}
            />
          ))}
        </ul>
      </section>
      {loaderData.signed && (
        <p className="mt-6">
          Signed by {loaderData.signed.by}, {loaderData.signed.day}. Readings and findings are frozen.
        </p>
      )}
      {loaderData.maySign && (
        <Form method="post" className="mt-9 grid max-w-xl gap-4 border-t border-line pt-5">
          <h2 className="text-lg font-semibold">Sign the teardown sheet</h2>
          <p className="text-mute">
            Your signature freezes the readings and findings of every fit, and the build goes to its crew
            chief.
          </p>
          <input type="hidden" name="intent" value="sign" />
          <div>
            <Button type="submit">Sign: torn down as found</Button>
          </div>
        </Form>
      )}
    </Page>
  );
}

interface FindingRowProps {
  finding: Route.ComponentProps["loaderData"]["findings"][number];
  loaderData: Route.ComponentProps["loaderData"];
  refused: { errors: { path: string; message: string }[]; values: Record<string, string> } | undefined;
}

function FindingRow({ finding, loaderData, refused }: FindingRowProps) {
  const { sheet } = loaderData;
  const title = `${sheet.position} ${finding.number}`;
  const isRefused = refused?.values.positionId === finding.positionId;
  const field = (
    name: "damage" | "place" | "areaShare" | "cause" | "coatingState" | "note" | "grade",
    start: string,
  ) => ({
    name,
    defaultValue: isRefused ? refused?.values[name] : start,
    error: isRefused ? refused?.errors.find((error) => error.path === name)?.message : undefined,
  });
  return (
    <li className="py-3">
      <details open={isRefused}>
        <summary className="flex min-h-11 cursor-pointer items-center gap-4">
          <span className="w-40 font-semibold">{title}</span>
          {finding.grade === undefined ? (
            <span className="text-mute">not graded yet</span>
          ) : (
            <>
              <ConditionGlyph grade={finding.grade} />
              <span>
                {[conditionGrades[finding.grade], inWords(finding.damage), finding.place, finding.note]
                  .filter(Boolean)
                  .join(" · ")}
              </span>
            </>
          )}
        </summary>
        {loaderData.mayFind && (
          <Form method="post" preventScrollReset noValidate className="mt-3 grid gap-4 sm:grid-cols-3">
            <input type="hidden" name="intent" value="finding" />
            <input type="hidden" name="fit" value={sheet.id} />
            <input type="hidden" name="positionId" value={finding.positionId} />
            <Select
              label="Grade"
              {...field("grade", finding.grade === undefined ? "" : String(finding.grade))}
              options={[
                { value: "", label: "Choose" },
                ...conditionGrades.map((word, grade) => ({
                  value: String(grade),
                  label: `${grade} ${word}`,
                })),
              ]}
            />
            <Select
              label="Damage"
              {...field("damage", finding.damage)}
              options={[
                { value: "", label: "None to name" },
                ...damageTerms.map((term) => ({ value: term, label: inWords(term) })),
              ]}
            />
            <Field
              label="Place"
              hint="Upper shell, front edge, 5 o'clock"
              {...field("place", finding.place)}
            />
            <Field
              label="Share of the area"
              suffix="%"
              inputMode="decimal"
              {...field("areaShare", finding.areaShare)}
            />
            {loaderData.coated && (
              <Select
                label={`Coating (${inWords(loaderData.coated)})`}
                {...field("coatingState", finding.coatingState)}
                options={[
                  { value: "", label: "Not looked at" },
                  ...coatingStates.map((state) => ({ value: state, label: inWords(state) })),
                ]}
              />
            )}
            <Field label="Suspected cause" {...field("cause", finding.cause)} />
            <Field label="Note" {...field("note", finding.note)} />
            <div className="self-end">
              <Button type="submit">
                Write it down<span className="sr-only">, {title}</span>
              </Button>
            </div>
          </Form>
        )}
      </details>
    </li>
  );
}
