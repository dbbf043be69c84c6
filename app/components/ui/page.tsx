import type { ReactNode } from "react";
import { Breadcrumbs, type Crumb } from "./breadcrumbs";

interface PageProps {
  title: string;
  subtitle?: string | undefined;
  breadcrumbs?: readonly Crumb[];
  /** Buttons beside the title. */
  actions?: ReactNode;
  /** What stands beside the page's matter: the ladder. */
  aside?: ReactNode;
  children: ReactNode;
}

/** The frame of every page: way back, title, what it is, matter. */
export function Page({ title, subtitle, breadcrumbs = [], actions, aside, children }: PageProps) {
  return (
    <main
      id="matter"
      tabIndex={-1}
      className="mx-auto max-w-[1280px] px-4 py-6 outline-none sm:px-7 print:p-0"
    >
      <Breadcrumbs crumbs={breadcrumbs} />
      <div className="mb-5 flex flex-wrap items-start justify-between gap-x-8 gap-y-3">
        <div className="min-w-0">
          <h1 className="text-2xl font-semibold text-balance">{title}</h1>
          {subtitle && <p className="text-mute">{subtitle}</p>}
        </div>
        {actions && <div className="flex flex-wrap gap-3">{actions}</div>}
      </div>
      {aside ? (
        <div className="grid gap-9 lg:grid-cols-[272px_minmax(0,1fr)]">
          <aside className="order-2 lg:order-1">{aside}</aside>
          <div className="order-1 min-w-0 lg:order-2">{children}</div>
        </div>
      ) : (
        children
      )}
    </main>
  );
}
