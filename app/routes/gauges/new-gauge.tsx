import { Form, href, redirect } from "react-router";
import { z } from "zod";
import { requirePerson } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Select } from "~/components/ui/select";
import { insertGauge } from "~/models/gauge.server";
import { orFormErrors, refuseForm } from "~/routes/answer.server";
import { fieldErrors, fieldsOf, quantity, text } from "~/routes/form-fields";
import type { Route } from "./+types/new-gauge";

export const meta: Route.MetaFunction = () => [{ title: "Add a gauge · Tenthbook" }];

const gaugeKinds = [
  "micrometer",
  "bore gauge",
  "ball-anvil micrometer",
  "small-hole gauge",
  "other",
] as const;

const gaugeForm = z.object({
  name: text("Give the gauge a name."),
  kind: z.enum(gaugeKinds, { error: "Say what kind of gauge it is." }),
  serial: z.string().trim().max(60).default(""),
  resolution: quantity("small-length", "in"),
  calibration: quantity("small-length", "in"),
  repeatability: quantity("small-length", "in"),
  dueOn: z
    .union([z.literal("").transform(() => undefined), z.iso.date("Type the day as year-month-day.")])
    .optional(),
});

export function loader({ request, context }: Route.LoaderArgs) {
  requirePerson({ request, context }, "gauge:write");
  return null;
}

export async function action({ request, context }: Route.ActionArgs) {
  const { scope } = requirePerson({ request, context }, "gauge:write");
  const form = await request.formData();
  const typed = gaugeForm.safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  return orFormErrors(form, async () => {
    await insertGauge(scope, typed.data);
    throw redirect(href("/gauges"));
  });
}

export default function NewGauge({ actionData }: Route.ComponentProps) {
  const errors = actionData?.errors ?? [];
  const field = (name: keyof z.input<typeof gaugeForm>, start?: string) => ({
    name,
    defaultValue: actionData?.values[name] ?? start,
    error: errors.find((error) => error.path === name)?.message,
  });
  return (
    <Page title="Add a gauge" breadcrumbs={[{ to: href("/gauges"), label: "Gauges" }]}>
      <ErrorSummary errors={errors} />
      <Form method="post" noValidate className="grid max-w-xl gap-5">
        <Field label="Name" {...field("name")} />
        <Select
          label="Kind"
          {...field("kind", "micrometer")}
          options={gaugeKinds.map((kind) => ({ value: kind, label: kind }))}
        />
        <Field label="Serial number" {...field("serial")} />
        <Field label="Resolution" hint="The step it shows: 0.0001 in, 1 µm" {...field("resolution")} />
        <Field
          label="Calibration"
          hint="Standard uncertainty from its certificate: half of what it gives at 95 %"
          {...field("calibration")}
        />
        <Field
          label="Repeatability"
          hint="Standard deviation of repeats by the same hand"
          {...field("repeatability")}
        />
        <Field label="Calibration due" hint="Year-month-day" {...field("dueOn")} />
        <div>
          <Button type="submit" variant="primary">
            Add it
          </Button>
        </div>
      </Form>
    </Page>
  );
}
