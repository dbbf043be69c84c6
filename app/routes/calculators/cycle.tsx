import { requireSignedIn } from "~/access/who.server";
import { OrbitDrawing } from "~/components/drawings/orbit-drawing";
import { PolarLoad } from "~/components/drawings/polar-load";
import { Notice } from "~/components/ui/notice";
import { TextArea } from "~/components/ui/text-area";
import type { Route } from "./+types/cycle";
import { Calculator, Grounds, Results } from "./calculator";
import { calculateCycle, cycleFields } from "./cycle.server";

export const meta: Route.MetaFunction = () => [{ title: "Engine cycle · Tenthbook" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person } = requireSignedIn({ request, context });
  return { fields: cycleFields, ...(await calculateCycle(new URL(request.url).searchParams, person.units)) };
}

const direction = "towards the wrist pin";

export default function Cycle({ loaderData: { fields, typed, errors, result } }: Route.ComponentProps) {
  return (
    <Calculator
      title="Engine cycle"
      subtitle="A big end over two turns: its load, its orbit, its least film"
      fields={fields}
      typed={typed}
      errors={errors}
      more={
        <TextArea
          label="Pressure trace"
          hint="Instead of peak pressure: lines of crank angle in degrees and pressure in bar, over 720°"
          name="trace"
          defaultValue={typed.trace}
          error={errors.find((error) => error.path === "trace")?.message}
        />
      }
    >
      {result && (
        <div className="grid gap-6">
          {result.outsideRange && (
            <Notice
              tone="watch"
              title="The journal goes beyond an eccentricity ratio of 0.99: the film there is an upper bound."
            />
          )}
          {!result.converged && (
            <Notice tone="watch" title="Two cycles did not agree yet: the orbit has not settled." />
          )}
          <Results caption="Over the cycle" rows={result.rows} />
          <PolarLoad title="Load on the big end" loads={result.loads} direction={direction} />
          <OrbitDrawing
            title="Orbit of the crankpin"
            orbit={result.orbit}
            direction={direction}
            limitFilm={result.filmLimit}
          />
          <Grounds
            sentences={[
              "Exact slider-crank, gas by a closed model from its peak (or by the trace), masses reciprocating and rotating; crank angle 0 is top dead centre of firing.",
              "Orbit by Booker's mobility method; the mobility is of the finite bearing where its length asks for it.",
              "Real bearings bend, starve and heat: these films serve to compare builds, not to promise one.",
            ]}
          />
        </div>
      )}
    </Calculator>
  );
}
