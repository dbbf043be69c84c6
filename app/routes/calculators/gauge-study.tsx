import { requireSignedIn } from "~/access/who.server";
import { Table } from "~/components/ui/table";
import { TextArea } from "~/components/ui/text-area";
import type { Route } from "./+types/gauge-study";
import { Calculator, Grounds } from "./calculator";
import { calculateGaugeStudy } from "./gauge-study.server";

export const meta: Route.MetaFunction = () => [{ title: "Gauge study · Tenthbook" }];

export function loader({ request, context }: Route.LoaderArgs) {
  requireSignedIn({ request, context });
  return calculateGaugeStudy(new URL(request.url).searchParams);
}

const fields = [
  { name: "tolerance", label: "Tolerance", hint: "Its width, in the readings' unit; may be blank" },
];

export default function GaugeStudy({ loaderData: { typed, errors, result } }: Route.ComponentProps) {
  return (
    <Calculator
      title="Gauge study"
      subtitle="Whether a gauge and its hands can tell the parts apart"
      fields={fields}
      typed={typed}
      errors={errors}
      more={
        <TextArea
          label="Readings"
          hint="A line each: part, person, trial, value. Plain numbers, or lengths with their unit, which are reckoned in mm"
          name="readings"
          rows={10}
          defaultValue={typed.readings}
          error={errors.find((error) => error.path === "readings")?.message}
        />
      }
    >
      {result && (
        <div className="grid max-w-3xl gap-6">
          {result.cautions.map((caution) => (
            <p key={caution} className="text-watch">
              <span aria-hidden="true">! </span>
              {caution}
            </p>
          ))}
          {result.methods.map((method) => (
            <div key={method.name}>
              <Table caption={method.name}>
                <thead>
                  <tr>
                    <th scope="col">variation</th>
                    <th scope="col">standard deviation</th>
                    <th scope="col">of the study</th>
                    <th scope="col">of the tolerance</th>
                  </tr>
                </thead>
                <tbody>
                  {method.rows.map((row) => (
                    <tr key={row.what}>
                      <th scope="row">{row.what}</th>
                      <td>{row.deviation}</td>
                      <td>{row.ofStudy}</td>
                      <td>{row.ofTolerance}</td>
                    </tr>
                  ))}
                </tbody>
              </Table>
              <p className="mt-2">
                Distinct categories: <span className="font-mono">{method.categories}</span>. By the guide,{" "}
                {method.verdict}.
              </p>
            </div>
          ))}
          <Grounds
            sentences={[
              "Average and range, and analysis of variance with the interaction pooled where it is not significant: AIAG, Measurement Systems Analysis, 4th ed.",
              "2 to 20 parts, up to 10 people, 2 to 10 trials; every person measures every part as often.",
            ]}
          />
        </div>
      )}
    </Calculator>
  );
}
