import { Form, href, redirect } from "react-router";
import { z } from "zod";
import { requirePerson } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { insertOil } from "~/models/oil.server";
import { orFormErrors, refuseForm } from "~/routes/answer.server";
import {
  fieldErrors,
  fieldsOf,
  note,
  optionalNumber,
  optionalQuantity,
  quantity,
  text,
} from "~/routes/form-fields";
import type { Route } from "./+types/new-oil";

export const meta: Route.MetaFunction = () => [{ title: "Add an oil · Tenthbook" }];

const oilForm = z.object({
  name: text("Give the oil a name."),
  grade: text("Say its grade: 10W-40, 30 …", 20),
  kv40: quantity("kinematic-viscosity", "mm2/s"),
  kv100: quantity("kinematic-viscosity", "mm2/s"),
  density15: optionalNumber(600, 1200, "Density is between 600 and 1200 kg/m³."),
  hths: optionalQuantity("dynamic-viscosity", "mPa s"),
  note: note(),
});

export function loader({ request, context }: Route.LoaderArgs) {
  requirePerson({ request, context }, "oil:write");
  return null;
}

export async function action({ request, context }: Route.ActionArgs) {
  const { scope } = requirePerson({ request, context }, "oil:write");
  const form = await request.formData();
  const typed = oilForm.safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  const oil = typed.data;
  return orFormErrors(form, async () => {
    await insertOil(scope, { ...oil, kv40: oil.kv40.si, kv100: oil.kv100.si, hthsPaS: oil.hths?.si });
    throw redirect(href("/oils"));
  });
}

export default function NewOil({ actionData }: Route.ComponentProps) {
  const errors = actionData?.errors ?? [];
  const field = (name: keyof z.input<typeof oilForm>) => ({
    name,
    defaultValue: actionData?.values[name],
    error: errors.find((error) => error.path === name)?.message,
  });
  return (
    <Page
      title="Add an oil"
      subtitle="From its data sheet"
      breadcrumbs={[{ to: href("/oils"), label: "Oils" }]}
    >
      <ErrorSummary errors={errors} />
      <Form method="post" noValidate className="grid max-w-xl gap-5">
        <Field label="Name" {...field("name")} hint="As the shop calls it" />
        <Field label="Grade" {...field("grade")} hint="As on the can: 10W-40" />
        <Field label="Kinematic viscosity at 40 °C" suffix="mm²/s" inputMode="decimal" {...field("kv40")} />
        <Field label="Kinematic viscosity at 100 °C" suffix="mm²/s" inputMode="decimal" {...field("kv100")} />
        <Field label="Density at 15 °C" suffix="kg/m³" inputMode="decimal" {...field("density15")} />
        <Field label="HTHS at 150 °C" suffix="mPa·s" inputMode="decimal" {...field("hths")} />
        <Field label="Note" {...field("note")} />
        <div>
          <Button type="submit" variant="primary">
            Add it
          </Button>
        </div>
      </Form>
    </Page>
  );
}
