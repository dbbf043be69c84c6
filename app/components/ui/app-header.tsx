import { Form, Link, NavLink, useLocation } from "react-router";
import type { PageUnits } from "~/engineering/quantity/figures";
import { PersonMenu } from "./person-menu";

interface AppHeaderProps {
  links: readonly { to: string; label: string }[];
  units: PageUnits;
  personName: string;
  roleName: string;
  shopName: string;
}

/** The head of every page: where one can go, in which units, as whom. Its lower edge is ruled like a scale. */
export function AppHeader({ links, units, ...person }: AppHeaderProps) {
  return (
    <header className="bg-paper print:hidden">
      <a
        href="#matter"
        className="sr-only rounded-b bg-layout text-on-layout focus:not-sr-only focus:absolute focus:left-2 focus:top-0 focus:z-20 focus:px-4 focus:py-3"
      >
        Skip to the page
      </a>
      <div className="mx-auto flex max-w-[1280px] flex-wrap items-center gap-x-7 px-4 sm:px-7">
        <Link to="/" className="flex min-h-12 items-center gap-2.5 text-[1.0625rem] font-semibold">
          <Mark /> Tenthbook
        </Link>
        <nav
          aria-label="Tenthbook"
          className="order-last flex w-full gap-x-5 overflow-x-auto lg:order-none lg:w-auto"
        >
          {links.map(({ to, label }) => (
            <NavLink
              key={to}
              to={to}
              end={to === "/"}
              className="group target flex items-center whitespace-nowrap text-mute hover:text-ink aria-[current=page]:font-semibold aria-[current=page]:text-ink"
            >
              <span className="border-b-2 border-transparent py-0.5 group-aria-[current=page]:border-layout">
                {label}
              </span>
            </NavLink>
          ))}
        </nav>
        <div className="ml-auto flex items-center gap-x-5">
          <UnitSwitch units={units} />
          <PersonMenu {...person} />
        </div>
      </div>
      <Rule />
    </header>
  );
}

/** Inches or micrometres on every page: a form, so that it works before script and comes back to the same page. */
function UnitSwitch({ units }: { units: PageUnits }) {
  const { pathname, search } = useLocation();
  const inch = units === "inch";
  const chosen = "font-semibold text-ink";
  return (
    <Form method="post" action="/account" preventScrollReset>
      <input type="hidden" name="intent" value="units" />
      <input type="hidden" name="back" value={`${pathname}${search}`} />
      <button
        type="submit"
        name="units"
        value={inch ? "metric" : "inch"}
        className="min-h-11 min-w-11 cursor-pointer whitespace-nowrap text-mute hover:text-ink"
        aria-label={`thou · µm. ${inch ? "Units: inches. Show micrometres" : "Units: micrometres. Show inches"}`}
      >
        <span className={inch ? chosen : undefined}>thou</span> ·{" "}
        <span className={inch ? undefined : chosen}>µm</span>
      </button>
    </Form>
  );
}

/** A journal in its bore, a little off centre as it runs. */
function Mark() {
  return (
    <svg aria-hidden="true" viewBox="0 0 26 26" className="size-[23px]">
      <circle cx="13" cy="13" r="10.6" fill="none" strokeWidth="2.6" className="stroke-bronze" />
      <circle cx="14.3" cy="14.5" r="7.2" className="fill-layout" />
    </svg>
  );
}

function Rule() {
  return (
    <svg className="block h-[9px] w-full" aria-hidden="true">
      <defs>
        <pattern id="rule" width="100" height="9" patternUnits="userSpaceOnUse">
          <path
            d="M.5 9V0M10.5 9V6M20.5 9V6M30.5 9V6M40.5 9V6M50.5 9V3M60.5 9V6M70.5 9V6M80.5 9V6M90.5 9V6M0 8.5H100"
            className="stroke-line"
          />
        </pattern>
      </defs>
      <rect width="100%" height="9" fill="url(#rule)" />
    </svg>
  );
}
