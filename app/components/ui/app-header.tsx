import { Form, Link, NavLink, useLocation } from "react-router";
import type { PageUnits } from "~/engineering/quantity/figures";

interface AppHeaderProps {
  links: readonly { to: string; label: string }[];
  units: PageUnits;
  personName: string;
  roleName: string;
  shopName: string;
}

/** The head of every page: where one can go, in which units, as whom. Its lower edge is ruled like a scale. */
export function AppHeader({ links, units, personName, roleName, shopName }: AppHeaderProps) {
  const { pathname, search } = useLocation();
  return (
    <header className="border-b border-line bg-paper print:hidden">
      <div className="mx-auto flex max-w-[1280px] flex-wrap items-center gap-x-6 px-4 sm:px-7">
        <Link to="/" className="flex min-h-11 items-center gap-2 text-[17px] font-semibold">
          <img src="/mark.svg" alt="" width="24" height="24" /> Tenthbook
        </Link>
        <nav aria-label="Tenthbook" className="flex flex-wrap gap-x-5">
          {links.map(({ to, label }) => (
            <NavLink
              key={to}
              to={to}
              end={to === "/"}
              className={({ isActive }) =>
                `flex min-h-11 items-center ${isActive ? "font-semibold shadow-[0_2px_0_var(--layout)]" : "text-mute"}`
              }
            >
              {label}
            </NavLink>
          ))}
        </nav>
        <div className="ml-auto flex items-center gap-x-5">
          <Form method="post" action="/account" preventScrollReset>
            <input type="hidden" name="intent" value="units" />
            <input type="hidden" name="back" value={`${pathname}${search}`} />
            <button
              type="submit"
              name="units"
              value={units === "inch" ? "metric" : "inch"}
              className="min-h-11 cursor-pointer"
              aria-label={
                units === "inch" ? "Units: inches. Show micrometres" : "Units: micrometres. Show inches"
              }
            >
              <span className={units === "inch" ? "font-semibold" : "text-mute"}>in</span>
              <span className="text-mute"> · </span>
              <span className={units === "metric" ? "font-semibold" : "text-mute"}>µm</span>
            </button>
          </Form>
          <Link to="/account" className="flex min-h-11 flex-col justify-center text-right leading-tight">
            <span>{personName}</span>
            <span className="text-[13px] text-mute">
              {roleName}, {shopName}
            </span>
          </Link>
        </div>
      </div>
      <svg className="block h-2 w-full" aria-hidden="true">
        <defs>
          <pattern id="scale" width="100" height="8" patternUnits="userSpaceOnUse">
            <path
              d="M.5 8V0M10.5 8V5M20.5 8V5M30.5 8V5M40.5 8V5M50.5 8V3M60.5 8V5M70.5 8V5M80.5 8V5M90.5 8V5"
              stroke="var(--line)"
            />
          </pattern>
        </defs>
        <rect width="100%" height="8" fill="url(#scale)" />
      </svg>
    </header>
  );
}
