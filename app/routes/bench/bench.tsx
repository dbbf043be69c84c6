import { href } from "react-router";
import { may, type Permission } from "~/access/permissions";
import { requireSignedIn } from "~/access/who.server";
import { ButtonLink } from "~/components/ui/button";
import { EmptyState } from "~/components/ui/empty-state";
import { Page } from "~/components/ui/page";
import { type BuildInHand, listBuildsInHand } from "~/models/bench.server";
import { orPage } from "~/routes/answer.server";
import type { Route } from "./+types/bench";

export const meta: Route.MetaFunction = () => [{ title: "Bench · Tenthbook" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person, scope } = requireSignedIn({ request, context });
  const builds = await orPage(listBuildsInHand(scope));
  const items = builds.map((build) => waitingFor(build));
  return {
    mayAddEngine: may(person.role, "engine:write"),
    yours: items.filter((item) => item.permission && may(person.role, item.permission)),
    others: items.filter((item) => !item.permission || !may(person.role, item.permission)),
  };
}

interface Waiting {
  build: string;
  /** What has to be done, as a sentence. */
  say: string;
  detail: string;
  /** Who may do it; undefined where nothing is to be done. */
  permission?: Permission;
  button: string;
  to: string;
}

/** What a build in hand waits for. */
function waitingFor(build: BuildInHand): Waiting {
  const buildId = build.id;
  const name = `${build.engineName}, build ${build.number}`;
  const open = { build: name, button: "Look at it", to: href("/builds/:buildId", { buildId }) };
  const hours = `${build.hours.toFixed(1)} h run`;
  switch (build.state) {
    case "measuring": {
      const left = build.boxesDue - build.assemblyDone;
      return {
        ...open,
        say:
          left > 0
            ? `${left} of ${build.boxesDue} boxes to measure.`
            : "everything is measured; the sheet waits for its signature.",
        detail: "Assembly sheet",
        permission: "reading:write",
        button: left > 0 ? "Go on measuring" : "Sign the sheet",
        to: href("/builds/:buildId/sheet", { buildId }),
      };
    }
    case "assembled":
    case "running":
      return {
        ...open,
        say: build.state === "assembled" ? "assembled, no run logged yet." : `running, ${hours}.`,
        detail: "Run log",
        permission: "run:write",
        button: "Log a run",
        to: href("/builds/:buildId/runs", { buildId }),
      };
    case "torn-down":
      return build.teardownSigned
        ? {
            ...open,
            say: `torn down; ${build.fits - build.signedFits} of ${build.fits} fits wait for a signature.`,
            detail: hours,
            permission: "proposal:sign",
            button: `Review build ${build.number}`,
            to: href("/builds/:buildId/review", { buildId }),
          }
        : {
            ...open,
            say: `torn down; ${build.boxesDue - build.teardownDone} boxes to measure, findings to write down.`,
            detail: hours,
            permission: "reading:write",
            button: "Go on with the teardown",
            to: href("/builds/:buildId/teardown", { buildId }),
          };
    case "reviewed":
      return {
        ...open,
        say: "reviewed; the next build can be started.",
        detail: hours,
        permission: "build:write",
        button: "Start the next build",
        to: href("/engines/:engineId", { engineId: build.engineId }),
      };
  }
}

export default function Bench({ loaderData }: Route.ComponentProps) {
  const { yours, others, mayAddEngine } = loaderData;
  const none = yours.length + others.length === 0;
  return (
    <Page
      title={greeting(yours.length)}
      subtitle={others.length > 0 ? `${others.length} more on the bench` : undefined}
    >
      {none && (
        <EmptyState title="Nothing is on the bench yet.">
          <p>
            {mayAddEngine
              ? "Set an engine up from its layout; its fits and positions follow, and the first build sheet is a minute away."
              : "As soon as an engine is assigned to you, it stands here."}
          </p>
          {mayAddEngine && (
            <ButtonLink to={href("/engines/new")} variant="primary">
              Set up an engine
            </ButtonLink>
          )}
        </EmptyState>
      )}
      <ul className="divide-y divide-line border-y border-line">
        {yours.map((item) => (
          <BenchItem key={item.build} item={item} primary />
        ))}
      </ul>
      {others.length > 0 && (
        <section className="mt-9">
          <h2 className="mb-2 text-lg font-semibold">Also on the bench</h2>
          <ul className="divide-y divide-line border-y border-line">
            {others.map((item) => (
              <BenchItem key={item.build} item={item} primary={false} />
            ))}
          </ul>
        </section>
      )}
    </Page>
  );
}

function greeting(count: number): string {
  if (count === 0) return "Nothing waits for you.";
  return count === 1 ? "One thing waits for you." : `${count} things wait for you.`;
}

function BenchItem({ item, primary }: { item: Waiting; primary: boolean }) {
  return (
    <li className="flex flex-wrap items-center justify-between gap-4 py-4">
      <div>
        <p className="text-lg">
          {item.build}: {item.say}
        </p>
        <p className="text-mute">{item.detail}</p>
      </div>
      <ButtonLink to={item.to} variant={primary ? "primary" : "plain"}>
        {primary ? item.button : "Look at it"}
      </ButtonLink>
    </li>
  );
}
