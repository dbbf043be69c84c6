import { href, Link } from "react-router";
import { requireSignedIn } from "~/access/who.server";
import { Page } from "~/components/ui/page";
import type { Route } from "./+types/calculators";

export const meta: Route.MetaFunction = () => [{ title: "Calculators · Tenthbook" }];

export function loader({ request, context }: Route.LoaderArgs) {
  requireSignedIn({ request, context });
  return null;
}

const calculators = [
  {
    to: href("/calculators/clearance"),
    name: "Clearance",
    what: "From any bore and journal readings, with its uncertainty.",
  },
  { to: href("/calculators/units"), name: "Units", what: "A quantity in every unit of the trade, exact." },
  {
    to: href("/calculators/oil"),
    name: "Oil",
    what: "Viscosity at any temperature, index and grade from the data sheet.",
  },
  {
    to: href("/calculators/film"),
    name: "Oil film",
    what: "Least film, friction, flow and warmth at a steady speed and load.",
  },
  {
    to: href("/calculators/cycle"),
    name: "Engine cycle",
    what: "A big end's load, orbit and least film over two turns.",
  },
  {
    to: href("/calculators/map"),
    name: "Film map",
    what: "Least film over clearance and viscosity at one duty.",
  },
  {
    to: href("/calculators/gauge-study"),
    name: "Gauge study",
    what: "Repeatability and reproducibility by both methods.",
  },
];

export default function Calculators() {
  return (
    <Page title="Calculators" subtitle="Nothing typed here is stored.">
      <ul className="divide-y divide-line border-y border-line">
        {calculators.map(({ to, name, what }) => (
          <li key={to} className="py-3">
            <Link to={to} className="text-lg font-semibold text-layout">
              {name}
            </Link>
            <p className="text-mute">{what}</p>
          </li>
        ))}
      </ul>
    </Page>
  );
}
