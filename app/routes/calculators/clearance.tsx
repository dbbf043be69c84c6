import { Form, href } from "react-router";
import { requireSignedIn } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Select } from "~/components/ui/select";
import { Table } from "~/components/ui/table";
import { materials } from "~/engineering/temperature/materials";
import type { Route } from "./+types/clearance";
import { calculateClearance } from "./clearance.server";

export const meta: Route.MetaFunction = () => [{ title: "Clearance · Tenthbook" }];

export function loader({ request, context }: Route.LoaderArgs) {
  const { person } = requireSignedIn({ request, context });
  return calculateClearance(new URL(request.url).searchParams, person.units);
}

export default function Clearance({
  loaderData: { typed, errors, result, stations, unit, extra },
}: Route.ComponentProps) {
  const field = (name: string) => ({
    name,
    defaultValue: typed[name] ?? "",
    error: errors.find((error) => error.path === name)?.message,
  });
  const materialChoices = materials.map(({ key, name }) => ({ value: key, label: name }));
  return (
    <Page
      title="Clearance"
      subtitle="Diametral, at 20 °C where temperatures are given. Any unit; blank boxes are left out."
      breadcrumbs={[{ to: href("/calculators"), label: "Calculators" }]}
    >
      <ErrorSummary errors={errors} />
      <Form method="get" noValidate className="grid max-w-3xl gap-6">
        {(["bore", "journal"] as const).map((feature) => (
          <fieldset key={feature}>
            <legend className="mb-2 text-lg font-semibold capitalize">{feature}</legend>
            <div className="grid grid-cols-2 gap-4 sm:grid-cols-3">
              {stations[feature].map(({ name, label }) => (
                <Field key={name} label={label} inputMode="decimal" {...field(name)} />
              ))}
              <Field
                label="Temperature"
                suffix="°C"
                inputMode="decimal"
                {...field(`${feature}Temperature`)}
              />
              <Select label="Material" {...field(`${feature}Material`)} options={materialChoices} />
            </div>
          </fieldset>
        ))}
        <fieldset>
          <legend className="mb-2 text-lg font-semibold">Gauges</legend>
          <div className="grid grid-cols-2 gap-4 sm:grid-cols-3">
            {extra.map(({ name, label }) => (
              <Field key={name} label={label} {...field(name)} />
            ))}
            <Select
              label="Method"
              {...field("method")}
              options={[
                { value: "absolute", label: "Absolute: two gauges" },
                { value: "comparative", label: "Comparative: zeroed on the journal's setting" },
              ]}
            />
          </div>
        </fieldset>
        <div>
          <Button type="submit" variant="primary">
            Work it out
          </Button>
        </div>
      </Form>
      {result && (
        <section className="mt-9 grid max-w-3xl gap-6">
          <Table caption={`Result, ${unit}`}>
            <tbody>
              {result.rows.map(({ what, value }) => (
                <tr key={what}>
                  <th scope="row">{what}</th>
                  <td>{value}</td>
                </tr>
              ))}
            </tbody>
          </Table>
          {result.missing.map((sentence) => (
            <p key={sentence} className="text-watch">
              <span aria-hidden="true">! </span>
              {sentence}
            </p>
          ))}
          <Table caption={`Where the uncertainty comes from, standard, ${unit}`}>
            <tbody>
              {result.budget.map(({ what, value }) => (
                <tr key={what}>
                  <th scope="row">{what}</th>
                  <td>{value}</td>
                </tr>
              ))}
            </tbody>
          </Table>
          <p className="text-[13px] text-mute">
            Reference temperature: ISO 1. Uncertainty: JCGM 100:2008, covering about 95 %. Vertical is 90° to
            the parting line; the journal counts with the mean of its axes, in the least clearance with its
            largest. A calculated clearance does not say that an engine will live with it: the parts maker's
            limits come first.
          </p>
        </section>
      )}
    </Page>
  );
}
