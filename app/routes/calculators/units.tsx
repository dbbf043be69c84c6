import { Form, href } from "react-router";
import { requireSignedIn } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";
import { EngineeringError } from "~/engineering/engineering-error";
import { convert, parseAnyQuantity } from "~/engineering/quantity/convert";
import { unitLabel } from "~/engineering/quantity/units";
import type { Route } from "./+types/units";

export const meta: Route.MetaFunction = () => [{ title: "Units · Tenthbook" }];

export function loader({ request, context }: Route.LoaderArgs) {
  requireSignedIn({ request, context });
  const typed = new URL(request.url).searchParams.get("quantity") ?? "";
  if (typed.trim() === "") return { typed };
  try {
    const rows = convert(parseAnyQuantity(typed)).map(({ unit, text }) => ({
      unit: unitLabel(unit),
      number: text.slice(0, text.length - unitLabel(unit).length - 1),
    }));
    return { typed, rows };
  } catch (error) {
    if (!(error instanceof EngineeringError)) throw error;
    return { typed, error: error.message };
  }
}

export default function Units({ loaderData }: Route.ComponentProps) {
  const { typed } = loaderData;
  return (
    <Page title="Units" breadcrumbs={[{ to: href("/calculators"), label: "Calculators" }]}>
      {"error" in loaderData && loaderData.error && (
        <ErrorSummary errors={[{ path: "quantity", message: loaderData.error }]} />
      )}
      <Form method="get" className="mb-7 flex max-w-xl items-end gap-4">
        <div className="grow">
          <Field
            label="Quantity with its unit"
            name="quantity"
            hint="2.1000 in, 25 tenths, 95 degC, 60 psi"
            defaultValue={typed}
            error={"error" in loaderData ? loaderData.error : undefined}
          />
        </div>
        <Button type="submit" variant="primary">
          Convert
        </Button>
      </Form>
      {"rows" in loaderData && loaderData.rows && (
        <div className="max-w-xl">
          <Table caption={`${typed} in other units`}>
            <thead>
              <tr>
                <th scope="col">unit</th>
                <th scope="col">value</th>
              </tr>
            </thead>
            <tbody>
              {loaderData.rows.map((row) => (
                <tr key={row.unit}>
                  <th scope="row">{row.unit}</th>
                  <td>{row.number}</td>
                </tr>
              ))}
            </tbody>
          </Table>
        </div>
      )}
      <p className="mt-6 max-w-prose text-[13px] text-mute">
        Inch, pound and standard gravity are exact by definition (NIST SP 811, appendix B). A thou is 0.001
        in, a tenth 0.0001 in.
      </p>
    </Page>
  );
}
