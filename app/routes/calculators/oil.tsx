import { requireSignedIn } from "~/access/who.server";
import { ViscosityChart } from "~/components/drawings/viscosity-chart";
import { Table } from "~/components/ui/table";
import type { Route } from "./+types/oil";
import { Calculator, Grounds, Results } from "./calculator";
import { calculateOil, oilFields } from "./oil.server";

export const meta: Route.MetaFunction = () => [{ title: "Oil · Tenthbook" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  requireSignedIn({ request, context });
  return { fields: oilFields, ...(await calculateOil(new URL(request.url).searchParams)) };
}

export default function Oil({ loaderData: { fields, typed, errors, result } }: Route.ComponentProps) {
  return (
    <Calculator
      title="Oil"
      subtitle="Viscosity at any temperature from the two on the data sheet"
      fields={fields}
      typed={typed}
      errors={errors}
    >
      {result && (
        <div className="grid gap-6">
          <Results caption="The oil" rows={result.rows} />
          {result.disagreements.map((sentence) => (
            <p key={sentence} className="text-watch">
              <span aria-hidden="true">! </span>
              {sentence}
            </p>
          ))}
          <ViscosityChart title="Viscosity over temperature" oils={[result.chart]} />
          <div className="max-w-3xl">
            <Table caption="At each temperature">
              <thead>
                <tr>
                  <th scope="col">°C</th>
                  <th scope="col">kinematic, mm²/s</th>
                  <th scope="col">dynamic, mPa·s</th>
                  <th scope="col">density, kg/m³</th>
                  <th scope="col">note</th>
                </tr>
              </thead>
              <tbody>
                {result.points.map((point) => (
                  <tr key={point.temperature}>
                    <th scope="row">{point.temperature}</th>
                    <td>{point.kinematic}</td>
                    <td>{point.dynamic}</td>
                    <td>{point.density}</td>
                    <td className="words">{point.outsideRange ? "outside 0 to 150 °C: extrapolated" : ""}</td>
                  </tr>
                ))}
              </tbody>
            </Table>
          </div>
          <Grounds
            sentences={[
              "Viscosity over temperature: ASTM D341, log log (ν + 0.7) straight over log T; 1 to 2 % between the two points (from memory).",
              "Viscosity index: ASTM D2270. Grade: SAE J300 by the viscosity at 100 °C and the HTHS given; winter grades need cold tests that are not asked here.",
              "Density over temperature: the lubricating-oil form of API MPMS 11.1. Dynamic viscosity is without shear thinning.",
            ]}
          />
        </div>
      )}
    </Calculator>
  );
}
