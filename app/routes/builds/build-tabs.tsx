import { href, NavLink } from "react-router";

/** The pages of one build, in the order of the loop. */
export function BuildTabs({ buildId, tornDown }: { buildId: string; tornDown: boolean }) {
  const tabs = [
    { to: href("/builds/:buildId", { buildId }), label: "Build" },
    { to: href("/builds/:buildId/sheet", { buildId }), label: "Sheet" },
    { to: href("/builds/:buildId/runs", { buildId }), label: "Runs" },
    ...(tornDown
      ? [
          { to: href("/builds/:buildId/teardown", { buildId }), label: "Teardown" },
          { to: href("/builds/:buildId/review", { buildId }), label: "Review" },
        ]
      : []),
  ];
  return (
    <nav aria-label="This build" className="mb-5 flex gap-5 border-b border-line">
      {tabs.map((tab) => (
        <NavLink
          key={tab.to}
          to={tab.to}
          end
          className={({ isActive }) =>
            `flex min-h-11 items-center ${isActive ? "font-semibold shadow-[0_2px_0_var(--color-layout)]" : "text-mute"}`
          }
        >
          {tab.label}
        </NavLink>
      ))}
    </nav>
  );
}
