import { data, Form, href, Link } from "react-router";
import { z } from "zod";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { Button, ButtonLink } from "~/components/ui/button";
import { Choice } from "~/components/ui/choice";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Select } from "~/components/ui/select";
import { buildColumns } from "~/engineering/next-step/build-columns";
import { likelyLimit } from "~/engineering/next-step/likely-band";
import {
  clearanceUnit,
  clearanceUnitName,
  diameterUnitName,
  type PageUnits,
} from "~/engineering/quantity/figures";
import { metres } from "~/engineering/quantity/length";
import { materials } from "~/engineering/temperature/materials";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { findEngine } from "~/models/engine.server";
import { findFit, retirePosition, updateFit } from "~/models/fit.server";
import { fitHistory } from "~/models/fit-history.server";
import { findLatestProposal } from "~/models/proposal.server";
import { listDecisions } from "~/models/sign-off.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import { fieldErrors, fieldsOf, optionalQuantity, quantity, text } from "~/routes/form-fields";
import type { Route } from "./+types/fit";
import { calculatorsFor } from "./calculators-for-fit";
import { FitCharts } from "./fit-charts";
import { PastDecisions, pastDecisions } from "./past-decisions";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.title ?? "Fit"} · Tenthbook` },
];

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:read");
  const engine = await orPage(findEngine(scope, params.engineId));
  const fit = await orPage(findFit(scope, params.engineId, params.fitId));
  const [history, decisions, latest] = await Promise.all([
    fitHistory(scope, fit),
    listDecisions(scope, fit.id),
    findLatestProposal(scope, fit),
  ]);
  return {
    engineId: engine.id,
    engineName: engine.name,
    title: `${engine.name}: ${fitKind(fit.kind).name.toLowerCase()}`,
    units: person.units,
    positions: fit.positions.map(({ id, number }) => ({
      value: id,
      label: `${fitKind(fit.kind).position} ${number}`,
    })),
    mayWrite: may(person.role, "engine:write"),
    version: fit.version,
    fields: {
      nominal: fit.nominal_typed,
      length: fit.length_typed ?? "",
      usual: fit.usual_typed,
      least: fit.least_typed,
      most: fit.most_typed,
      limitsSource: fit.limits_source,
      tolerance: fit.tolerance_typed,
      boreMaterial: fit.bore_material,
      journalMaterial: fit.journal_material,
      boreFinish: fit.bore_finish_typed ?? "",
      journalFinish: fit.journal_finish_typed ?? "",
      coating: fit.coating ?? "",
      method: fit.method,
    },
    materials: materials.map(({ key, name }) => ({ value: key, label: name })),
    limits: history.fit.hardLimits,
    builds: buildColumns(history.iterations, metres(fit.tolerance_pm)),
    evidence: latest?.answer.evidence.builds ?? [],
    likelyLimit: latest && likelyLimit(latest.answer),
    calculators: calculatorsFor(fit, history.iterations.at(-1)),
    decisions: pastDecisions(decisions, history.iterations, person.units),
  };
}

const coatings = [
  { value: "", label: "None" },
  { value: "hard-carbon", label: "Thin hard carbon" },
  { value: "chromium-nitride", label: "Chromium nitride" },
  { value: "dry-film", label: "Dry film" },
] as const;

const fitForm = (units: PageUnits) => {
  const clearance = () => quantity("small-length", clearanceUnitName(units));
  const finish = () => optionalQuantity("finish", units === "inch" ? "uin" : "um");
  const material = z.string().refine((key) => materials.some((one) => one.key === key), "Choose a material.");
  return z.object({
    nominal: quantity("length", diameterUnitName(units)),
    length: optionalQuantity("length", diameterUnitName(units)),
    usual: clearance(),
    least: clearance(),
    most: clearance(),
    limitsSource: text("Say where the limits are from: maker's sheet, shop, rules.", 200),
    tolerance: clearance().refine((value) => value.si > 0, "The window is wider than nothing."),
    boreMaterial: material,
    journalMaterial: material,
    boreFinish: finish(),
    journalFinish: finish(),
    coating: z.enum(coatings.map(({ value }) => value)),
    method: z.enum(["absolute", "comparative"]),
    version: z.coerce.number().int(),
  });
};

export async function action({ request, context, params }: Route.ActionArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:write");
  const fit = await orPage(findFit(scope, params.engineId, params.fitId));
  const form = await request.formData();
  if (form.get("intent") === "retire") {
    return orFormErrors(form, async () => {
      await retirePosition(scope, fit, String(form.get("positionId")));
      return null;
    });
  }
  const typed = fitForm(person.units).safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  const { version, ...change } = typed.data;
  return orFormErrors(form, async () => {
    await updateFit(scope, fit, change, version);
    return data({ saved: true });
  });
}

export default function FitPage({ loaderData: fit, actionData }: Route.ComponentProps) {
  const refused = actionData && "errors" in actionData ? actionData : undefined;
  return (
    <Page
      title={fit.title}
      subtitle={`${fit.positions.length} positions · clearances diametral at 20 °C, ${clearanceUnit(fit.units)}`}
      breadcrumbs={[
        { to: href("/engines"), label: "Engines" },
        { to: href("/engines/:engineId", { engineId: fit.engineId }), label: fit.engineName },
      ]}
    >
      {fit.builds.length === 0 ? (
        <p className="mb-6 text-mute">
          No build of this engine is torn down yet; the first one starts its history.
        </p>
      ) : (
        <FitCharts
          title={fit.title}
          units={fit.units}
          builds={fit.builds}
          evidence={fit.evidence}
          likelyLimit={fit.likelyLimit}
        />
      )}
      <nav aria-label="Calculators filled from this fit" className="mb-6 flex flex-wrap gap-3">
        {fit.calculators.map(({ to, label }) => (
          <ButtonLink key={to} to={to}>
            {label}
          </ButtonLink>
        ))}
      </nav>
      <PastDecisions decisions={fit.decisions} />
      {fit.mayWrite ? (
        <>
          <FitSettings fit={fit} refused={refused} />
          <Form method="post" className="mt-9 flex max-w-xl flex-wrap items-end gap-4">
            <input type="hidden" name="intent" value="retire" />
            <Select
              label="Position that is no longer there"
              hint="What was measured at it stays in the record"
              name="positionId"
              options={fit.positions}
            />
            <Button type="submit">Take it out of use</Button>
          </Form>
        </>
      ) : (
        <p className="mt-6 text-mute">
          Limits {fit.fields.least} to {fit.fields.most}, usual {fit.fields.usual}. {fit.fields.limitsSource}.
        </p>
      )}
      <p className="mt-6">
        <Link to={href("/engines/:engineId", { engineId: fit.engineId })}>Back to {fit.engineName}</Link>
      </p>
    </Page>
  );
}

interface FitSettingsProps {
  fit: Route.ComponentProps["loaderData"];
  refused: { errors: { path: string; message: string }[]; values: Record<string, string> } | undefined;
}

function FitSettings({ fit, refused }: FitSettingsProps) {
  const field = (name: Extract<keyof typeof fit.fields, string>) => ({
    name,
    defaultValue: refused?.values[name] ?? fit.fields[name],
    error: refused?.errors.find((error) => error.path === name)?.message,
  });
  return (
    <Form key={fit.version} method="post" noValidate className="mt-9 grid max-w-3xl gap-5">
      <h2 className="text-lg font-semibold">What is known of this fit</h2>
      <ErrorSummary errors={refused?.errors ?? []} />
      <input type="hidden" name="version" value={fit.version} />
      <div className="grid grid-cols-2 gap-4 sm:grid-cols-3">
        <Field label="Nominal size" {...field("nominal")} />
        <Field label="Length" hint="Of the bearing, for its film" {...field("length")} />
        <Field label="Usual clearance" hint="Where a new fit starts" {...field("usual")} />
        <Field label="Never under" {...field("least")} />
        <Field label="Never over" {...field("most")} />
        <Field label="Window either side of the aim" {...field("tolerance")} />
      </div>
      <Field label="Where the limits are from" {...field("limitsSource")} />
      <div className="grid grid-cols-2 gap-4 sm:grid-cols-3">
        <Select label="Bore material" {...field("boreMaterial")} options={fit.materials} />
        <Select label="Journal material" {...field("journalMaterial")} options={fit.materials} />
        <Select
          label="Coating"
          {...field("coating")}
          options={coatings}
          hint="A new one starts its history anew"
        />
        <Field label="Bore finish, Ra" {...field("boreFinish")} />
        <Field label="Journal finish, Ra" {...field("journalFinish")} />
      </div>
      <Choice
        legend="How it is measured"
        name="method"
        type="radio"
        options={[
          { value: "absolute", label: "Absolute: two gauges" },
          { value: "comparative", label: "Comparative: bore gauge zeroed on the journal's setting" },
        ]}
        defaultValue={refused?.values.method ?? fit.fields.method}
      />
      <div>
        <Button type="submit">Keep it</Button>
      </div>
    </Form>
  );
}
