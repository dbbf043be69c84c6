import type { BuildState } from "#database/schema";
import { dynamicViscosity } from "~/engineering/oil/viscosity";
import { iterationOfBuild } from "~/models/iteration-of-build";
import { assemble, oilOf, startBuild, teardownDay } from "./assembly";
import {
  type Bench,
  type DemoBuild,
  type DemoFit,
  type DemoShop,
  fitOf,
  noteHistory,
  noteMove,
} from "./bench";
import type { Calendar } from "./calendar";
import type { EngineSpec } from "./engine-spec";
import { demoOil } from "./oils";
import type { DemoReading } from "./reading";
import { reviewFit } from "./review";
import type { Rows } from "./rows";
import { type DemoRun, lastRunDay, runBuild } from "./run-log";
import { setUpEngine } from "./set-up-engine";
import { measureParts, signSheet, startSheet } from "./sheet";
import { findParts, wearParts } from "./teardown";

/** Days from a build's start to its review. */
const reviewDay = teardownDay + 1;

/** How many days ago the last build of an engine was started, so that what it ends with was yesterday. */
const startOfLast: Record<EngineSpec["endsAs"], number> = {
  measuring: 1,
  running: 8,
  "torn-down": teardownDay + 1,
};

/** Plays an engine through its season, build by build, each aiming at what was signed after the one before. */
export function playSeason(rows: Rows, calendar: Calendar, shop: DemoShop, spec: EngineSpec): void {
  const startOf = (number: number) =>
    startOfLast[spec.endsAs] + (spec.builds - number) * spec.daysBetweenBuilds;
  const bench = setUpEngine(rows, calendar, shop, spec, startOf(1) + 3);
  for (let number = 1; number <= spec.builds; number++) {
    playBuild(bench, number, startOf(number), number === spec.builds ? spec.endsAs : "reviewed");
  }
}

function playBuild(bench: Bench, number: number, daysAgo: number, endsAs: BuildState): void {
  const build = startBuild(bench, number, daysAgo, endsAs);
  const assembly = assemble(bench, build, endsAs);
  if (endsAs === "measuring") return;
  const runs = runBuild(bench, build, endsAs === "running" ? daysAgo - 1 : lastRunDay);
  if (endsAs === "running") return;
  const viscosity = tearDown(bench, build, assembly, runs);
  if (endsAs === "reviewed") review(bench, build, viscosity);
}

/** Measures and grades the worn parts; gives the viscosity that the build ran on, Pa·s. */
function tearDown(
  bench: Bench,
  build: DemoBuild,
  assembly: Map<DemoFit, DemoReading[]>,
  runs: readonly DemoRun[],
): number {
  const { calendar, shop } = bench;
  const day = build.daysAgo - teardownDay;
  const hours = runs.reduce((sum, run) => sum + run.hours, 0);
  const temperatureC = runs.reduce((sum, run) => sum + run.hours * run.oil_temperature_c, 0) / hours;
  const viscosity = dynamicViscosity(demoOil(build.oil), temperatureC);
  noteMove(bench, calendar.at(day, 8), shop.personOf("builder"), build, ["running", "torn-down"]);
  const sheet = startSheet(bench, "teardown", build, day);
  const seen = bench.fits.map((fit) => {
    const wears = wearParts(bench, build, fit, { hours, viscosity });
    const readings = measureParts(bench, fit, sheet);
    const findings = findParts(bench, build, fit, wears, sheet.at);
    const evidence = { readings: [...assembly.get(fit)!, ...readings], findings, runs };
    const target = { number: build.number, createdAt: build.createdAt, aim_pm: fit.aim.pm };
    fit.iterations.push(
      iterationOfBuild(
        fitOf(fit),
        { ...target, coating: fit.row.coating },
        evidence,
        shop.gauges.map(({ row }) => row),
      ),
    );
    return { readings, findings };
  });
  const at = calendar.at(day, 17);
  signSheet(
    bench,
    sheet,
    at,
    seen.flatMap(({ readings }) => readings),
    seen.flatMap(({ findings }) => findings),
  );
  return viscosity;
}

/** Sends out what is to be coated for the next build, then signs the next step of every fit. */
function review(bench: Bench, build: DemoBuild, viscosity: number): void {
  const { calendar, signer, fits } = bench;
  const day = build.daysAgo - reviewDay;
  for (const fit of fits) {
    const { coating } = fit.spec;
    if (coating?.fromBuild === build.number + 1) coatFit(bench, fit, coating.kind, day);
  }
  const nextOil = oilOf(bench, build.number + 1);
  for (const [index, fit] of fits.entries()) {
    reviewFit(bench, fit, {
      build,
      viscosity,
      nextOil: nextOil === build.oil ? undefined : nextOil,
      at: calendar.at(day, 9, index * 6 * 60),
    });
  }
  noteMove(bench, calendar.at(day, 10), signer, build, ["torn-down", "reviewed"]);
}

function coatFit(bench: Bench, fit: DemoFit, coating: string, day: number): void {
  const from = { coating: fit.row.coating };
  fit.row.coating = coating;
  fit.row.coated_since_build = fit.spec.coating!.fromBuild;
  fit.row.version += 1;
  noteHistory(bench, bench.calendar.at(day, 8), bench.shop.personOf("builder"), {
    subjectKind: "fit",
    subjectId: fit.row.id,
    what: "changed a fit",
    from,
    to: { coating },
  });
}
