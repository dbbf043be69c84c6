import { requireSignedIn } from "~/access/who.server";
import { Notice } from "~/components/ui/notice";
import type { Route } from "./+types/film";
import { Calculator, Grounds, Results } from "./calculator";
import { calculateFilm, filmFields } from "./film.server";

export const meta: Route.MetaFunction = () => [{ title: "Oil film · Tenthbook" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person } = requireSignedIn({ request, context });
  return { fields: filmFields, ...(await calculateFilm(new URL(request.url).searchParams, person.units)) };
}

export default function Film({ loaderData: { fields, typed, errors, result } }: Route.ComponentProps) {
  return (
    <Calculator
      title="Oil film"
      subtitle="A plain bearing at a steady speed and load"
      fields={fields}
      typed={typed}
      errors={errors}
    >
      {result && (
        <div className="grid gap-6">
          {result.outsideRange && (
            <Notice tone="watch" title="Outside the range that was checked: see what it rests on, below." />
          )}
          {!result.converged && <Notice tone="stop" title="No temperature balances the heat here." />}
          <Results caption="The film" rows={result.rows} />
          <Results caption="Published least films to hold it against" rows={result.guides} />
          <Grounds
            sentences={[
              ...result.assumptions,
              ...result.guides.map((guide) => `${guide.what}: ${guide.source}.`),
              "Reynolds equation with Reynolds' film end, solved by finite differences; within 1 % of Khonsari & Booser's and Butenschön's tables. L/D 0.15 to 1.5, eccentricity ratio to 0.99.",
            ]}
          />
        </div>
      )}
    </Calculator>
  );
}
