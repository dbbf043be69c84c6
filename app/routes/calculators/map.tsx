import { requireSignedIn } from "~/access/who.server";
import { FilmMap } from "~/components/drawings/film-map";
import { Notice } from "~/components/ui/notice";
import type { Route } from "./+types/map";
import { Calculator, Grounds } from "./calculator";
import { calculateMap, mapFields } from "./map.server";

export const meta: Route.MetaFunction = () => [{ title: "Film map · Tenthbook" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person } = requireSignedIn({ request, context });
  const answer = await calculateMap(new URL(request.url).searchParams, person.units);
  return { fields: mapFields, units: person.units, ...answer };
}

export default function FilmMapPage({ loaderData }: Route.ComponentProps) {
  const { fields, typed, errors, result, units } = loaderData;
  return (
    <Calculator
      title="Film map"
      subtitle="Least film over clearance and viscosity, at one steady duty"
      fields={fields}
      typed={typed}
      errors={errors}
    >
      {result && (
        <div className="grid gap-6">
          {result.outsideRange && (
            <Notice
              tone="watch"
              title="Part of the map lies beyond an eccentricity ratio of 0.99; its film there is an upper bound."
            />
          )}
          <FilmMap
            title="Least film"
            units={units}
            clearances={result.clearances}
            viscosities={result.viscosities}
            leastFilm={result.leastFilm}
            limitFilm={result.limitFilm}
            builds={[]}
          />
          <Grounds
            sentences={[
              "Each point is a steady bearing at that clearance and viscosity, the speed and load held; heat is not balanced.",
              ...(result.limitFilm
                ? ["The limit line is where the film equals the combined roughness, λ = 1."]
                : []),
            ]}
          />
        </div>
      )}
    </Calculator>
  );
}
