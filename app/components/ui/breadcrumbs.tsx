import { Link } from "react-router";

export interface Crumb {
  to: string;
  label: string;
}

/** The way back up from this page, the nearest last; the page itself is not in it, its title says it. */
export function Breadcrumbs({ crumbs }: { crumbs: readonly Crumb[] }) {
  if (crumbs.length === 0) return null;
  return (
    <nav aria-label="The way back" className="mb-1 text-dense print:hidden">
      <ol className="flex flex-wrap">
        {crumbs.map(({ to, label }) => (
          <li key={to} className="flex items-center">
            <Link
              to={to}
              className="target inline-flex items-center text-mute underline underline-offset-2 hover:text-ink"
            >
              {label}
            </Link>
            <span aria-hidden="true" className="px-2 text-mute">
              /
            </span>
          </li>
        ))}
      </ol>
    </nav>
  );
}
