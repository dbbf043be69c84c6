import { Outlet } from "react-router";
import { may, roleNames } from "~/access/permissions";
import { requireSignedIn } from "~/access/who.server";
import { AppHeader } from "~/components/ui/app-header";
import type { Route } from "./+types/signed-in";

/** Who is signed in, for the header of every page. The loader is there so that a client navigation asks again too. */
export function loader({ request, context }: Route.LoaderArgs) {
  const { person } = requireSignedIn({ request, context });
  return {
    name: person.name,
    role: person.role,
    shopName: person.shopName,
    units: person.units,
  };
}

export default function SignedIn({ loaderData: { name, role, shopName, units } }: Route.ComponentProps) {
  const links = [
    { to: "/", label: "Bench" },
    { to: "/engines", label: "Engines" },
    ...(may(role, "oil:read") ? [{ to: "/oils", label: "Oils" }] : []),
    ...(may(role, "gauge:read") ? [{ to: "/gauges", label: "Gauges" }] : []),
    { to: "/calculators", label: "Calculators" },
    ...(may(role, "shop:read") ? [{ to: "/shop", label: "Shop" }] : []),
  ];
  return (
    <>
      <AppHeader
        links={links}
        units={units}
        personName={name}
        roleName={roleNames[role]}
        shopName={shopName}
      />
      <Outlet />
    </>
  );
}
