import { Form } from "react-router";
import { z } from "zod";
import { roleNames } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";
import { formatWithUnit } from "~/engineering/quantity/format";
import { listPeople } from "~/models/person.server";
import { findShopRules, updateShopRules } from "~/models/shop.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import { fieldErrors, fieldsOf, numberBetween, quantity, wholeBetween } from "~/routes/form-fields";
import type { Route } from "./+types/shop";

export const meta: Route.MetaFunction = () => [{ title: "Shop · Tenthbook" }];

const rulesForm = z.object({
  largestStep: quantity("small-length", "in").refine(
    (step) => step.si > 0 && step.si <= 25.4e-6,
    "A step closes the fit by more than nothing and at most a thou.",
  ),
  leastHours: numberBetween(0, 100, "Hours are a number from 0 to 100."),
  stopGrade: wholeBetween(1, 4, "A grade is 1 to 4."),
  baselineRuns: wholeBetween(0, 10, "0 to 10 builds."),
  wearRateRise: numberBetween(1.05, 10, "A rise is a factor over 1: 1.5 is half as much again."),
  version: z.coerce.number().int(),
});

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "shop:read");
  const [people, rules] = await orPage(Promise.all([listPeople(scope), findShopRules(scope)]));
  return {
    shopName: person.shopName,
    people: people.map(({ id, name, email, role }) => ({ id, name, email, role: roleNames[role] })),
    rules: { ...rules, largestStep: formatWithUnit(rules.largest_step_pm * 1e-12, "in", 5) },
  };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { scope } = requirePerson({ request, context }, "shop:write");
  const form = await request.formData();
  const typed = rulesForm.safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  const { version, largestStep, leastHours, stopGrade, baselineRuns, wearRateRise } = typed.data;
  return orFormErrors(form, async () => {
    await updateShopRules(
      scope,
      {
        largest_step_pm: largestStep.picometres as number,
        least_hours: leastHours,
        stop_grade: stopGrade,
        baseline_runs: baselineRuns,
        wear_rate_rise: wearRateRise,
      },
      version,
    );
    return null;
  });
}

export default function Shop({ loaderData: { shopName, people, rules }, actionData }: Route.ComponentProps) {
  const errors = actionData?.errors ?? [];
  const field = (name: keyof z.input<typeof rulesForm>, start: string | number) => ({
    name,
    defaultValue: actionData?.values[name] ?? String(start),
    error: errors.find((error) => error.path === name)?.message,
  });
  return (
    <Page title={shopName}>
      <Table caption="People">
        <thead>
          <tr>
            <th scope="col">name</th>
            <th scope="col">role</th>
            <th scope="col">e-mail</th>
          </tr>
        </thead>
        <tbody>
          {people.map((person) => (
            <tr key={person.id}>
              <th scope="row">{person.name}</th>
              <td className="words">{person.role}</td>
              <td className="words">{person.email}</td>
            </tr>
          ))}
        </tbody>
      </Table>
      <Form key={rules.version} method="post" noValidate className="mt-9 grid max-w-xl gap-5">
        <h2 className="text-lg font-semibold">Rules of the next step</h2>
        <ErrorSummary errors={errors} />
        <input type="hidden" name="version" value={rules.version} />
        <Field
          label="Largest step"
          hint="By how much one build may close a fit"
          {...field("largestStep", rules.largestStep)}
        />
        <Field
          label="Least hours"
          suffix="h"
          hint="A build that ran less is not judged"
          {...field("leastHours", rules.least_hours)}
        />
        <Field
          label="Stop grade"
          hint="A grade of this or worse, where the clearance did it, opens the fit"
          {...field("stopGrade", rules.stop_grade)}
        />
        <Field
          label="Baseline builds"
          hint="Clean builds at the usual clearance before a new coating is stepped"
          {...field("baselineRuns", rules.baseline_runs)}
        />
        <Field
          label="Wear rate rise"
          hint="Times the engine's own baseline that opens the fit"
          {...field("wearRateRise", rules.wear_rate_rise)}
        />
        <div>
          <Button type="submit">Keep these rules</Button>
        </div>
      </Form>
    </Page>
  );
}
