import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { Form, href, redirect, useSubmit } from "react-router";
import { requirePerson } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { Choice } from "~/components/ui/choice";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { insertEngine } from "~/models/engine.server";
import { orFormErrors, refuseForm } from "~/routes/answer.server";
import { fieldErrors, fieldsOf } from "~/routes/form-fields";
import type { Route } from "./+types/new-engine";
import { type EngineForm, engineForm } from "./engine-form";

export const meta: Route.MetaFunction = () => [{ title: "Set up an engine · Tenthbook" }];

export function loader({ request, context }: Route.LoaderArgs) {
  const { person } = requirePerson({ request, context }, "engine:write");
  return { units: person.units };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:write");
  const form = await request.formData();
  const typed = engineForm(person.units).safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  return orFormErrors(form, async () => {
    const engineId = await insertEngine(scope, typed.data);
    throw redirect(href("/engines/:engineId", { engineId }));
  });
}

// What most shops set up, so that the form can be sent with little typed.
const starting = {
  name: "",
  form: "V",
  cylinders: "8",
  mains: "5",
  valvesPerCylinder: "2",
  bore: "",
  stroke: "",
  rodLength: "",
  revLimitRpm: "",
  duty: "",
  environment: "clean",
} satisfies EngineForm["in"];

export default function NewEngine({ loaderData, actionData }: Route.ComponentProps) {
  const submit = useSubmit();
  const { register, handleSubmit, formState } = useForm<EngineForm["in"], unknown, EngineForm["out"]>({
    resolver: zodResolver(engineForm(loaderData.units)),
    mode: "onTouched",
    defaultValues: { ...starting, ...(actionData?.values as Partial<EngineForm["in"]> | undefined) },
  });
  const sent = actionData?.errors ?? [];
  const errorOf = (name: keyof EngineForm["in"]) =>
    formState.errors[name]?.message ?? sent.find((error) => error.path === name)?.message;
  const field = (name: keyof EngineForm["in"]) => ({
    ...register(name),
    defaultValue: actionData?.values[name] ?? starting[name],
    error: errorOf(name),
  });
  return (
    <Page
      title="Set up an engine"
      subtitle="Its fits and their positions follow from the layout; each can be changed afterwards."
    >
      <ErrorSummary errors={sent} />
      <Form
        method="post"
        noValidate
        className="grid max-w-2xl gap-6"
        onSubmit={(event) => {
          const form = event.currentTarget;
          handleSubmit(() => submit(form))(event);
        }}
      >
        <Field label="Name" {...field("name")} hint="As the shop calls it: Engine 12" />
        <Choice
          legend="Layout"
          {...field("form")}
          type="radio"
          options={[
            { value: "inline", label: "Inline" },
            { value: "V", label: "V" },
            { value: "flat", label: "Flat" },
          ]}
        />
        <div className="grid grid-cols-3 gap-4">
          <Field label="Cylinders" inputMode="numeric" {...field("cylinders")} />
          <Field label="Main bearings" inputMode="numeric" {...field("mains")} />
          <Field label="Valves per cylinder" inputMode="numeric" {...field("valvesPerCylinder")} />
        </div>
        <div className="grid grid-cols-3 gap-4">
          <Field label="Bore" {...field("bore")} hint="4.125 in or 104.78 mm" />
          <Field label="Stroke" {...field("stroke")} />
          <Field label="Rod length" {...field("rodLength")} hint="Between centres" />
        </div>
        <div className="grid grid-cols-3 gap-4">
          <Field label="Rev limit" suffix="rpm" inputMode="numeric" {...field("revLimitRpm")} />
          <div className="col-span-2">
            <Field label="Duty" {...field("duty")} hint="Sprint, endurance, what it is run for" />
          </div>
        </div>
        <Choice
          legend="Where it runs"
          {...field("environment")}
          type="radio"
          options={[
            { value: "clean", label: "Clean" },
            { value: "dusty", label: "Dusty" },
          ]}
        />
        <div>
          <Button type="submit" variant="primary">
            Set it up
          </Button>
        </div>
      </Form>
    </Page>
  );
}
