import type { ReactNode } from "react";
import { Link } from "react-router";

interface PageProps {
  title: string;
  subtitle?: string | undefined;
  breadcrumbs?: readonly { to: string; label: string }[];
  /** Buttons beside the title. */
  actions?: ReactNode;
  /** What stands beside the page's matter: the ladder. */
  aside?: ReactNode;
  children: ReactNode;
}

/** The frame of every page: way back, title, what it is, matter. */
export function Page({ title, subtitle, breadcrumbs = [], actions, aside, children }: PageProps) {
  return (
    <main className="mx-auto max-w-[1280px] px-4 py-6 sm:px-7">
      {breadcrumbs.length > 0 && (
        <nav aria-label="The way back" className="mb-2 text-[13px]">
          <ol className="flex flex-wrap gap-2">
            {breadcrumbs.map(({ to, label }) => (
              <li key={to} className="flex gap-2">
                <Link to={to} className="text-mute underline underline-offset-2">
                  {label}
                </Link>
                <span aria-hidden="true" className="text-mute">
                  /
                </span>
              </li>
            ))}
          </ol>
        </nav>
      )}
      <div className="mb-5 flex flex-wrap items-start justify-between gap-4">
        <div>
          <h1 className="text-2xl font-semibold">{title}</h1>
          {subtitle && <p className="text-mute">{subtitle}</p>}
        </div>
        {actions}
      </div>
      {aside ? (
        <div className="grid gap-9 lg:grid-cols-[250px_minmax(0,1fr)]">
          <aside className="order-2 lg:order-1">{aside}</aside>
          <div className="order-1 min-w-0 lg:order-2">{children}</div>
        </div>
      ) : (
        children
      )}
    </main>
  );
}
