import { instant } from "#database/id";
import type { BuildState } from "#database/schema";
import { metres } from "~/engineering/quantity/length";
import { windowAround } from "~/models/build.server";
import { type Bench, type DemoBuild, type DemoFit, noteHistory, noteMove } from "./bench";
import { makePart, sizeOfRecord, stationsOf } from "./parts";
import type { DemoReading } from "./reading";
import { lastRunDay } from "./run-log";
import { newJournal } from "./set-up-engine";
import { measureParts, signSheet, startSheet } from "./sheet";
import { buildScatter } from "./wear-model";

/** Days from a build's start to its teardown. */
export const teardownDay = lastRunDay + 2;

/** A build's row counts the steps it has gone. */
const versionOf: Record<BuildState, number> = {
  measuring: 1,
  assembled: 2,
  running: 3,
  "torn-down": 4,
  reviewed: 5,
};

/** The oil that a build of the engine runs on. */
export function oilOf({ spec }: Bench, number: number) {
  return spec.oils.findLast(({ fromBuild }) => fromBuild <= number)!.oil;
}

/** Starts a build that will have come to a state by today: each fit aims at what was signed last. */
export function startBuild(bench: Bench, number: number, daysAgo: number, state: BuildState): DemoBuild {
  const { rows, calendar, shop, engineId } = bench;
  const at = calendar.at(daysAgo, 7);
  const isTornDown = state === "torn-down" || state === "reviewed";
  const build = { id: rows.idAt(at), number, createdAt: instant(at), daysAgo, oil: oilOf(bench, number) };
  rows.add("build", {
    id: build.id,
    shop_id: shop.id,
    engine_id: engineId,
    number,
    state,
    oil_id: shop.oilIds.get(build.oil)!,
    note: "",
    created_at: build.createdAt,
    created_by: shop.personOf("builder"),
    torn_down_at: isTornDown ? instant(calendar.at(daysAgo - teardownDay, 8)) : null,
    version: versionOf[state],
  });
  noteHistory(bench, at, shop.personOf("builder"), {
    subjectKind: "build",
    subjectId: build.id,
    what: `started build ${number}`,
  });
  for (const fit of bench.fits) {
    rows.add("target", {
      id: rows.idAt(at),
      shop_id: shop.id,
      build_id: build.id,
      fit_id: fit.row.id,
      ...windowAround(fit.aim.pm, fit.row),
      coating: fit.row.coating,
      sign_off_id: fit.aim.signOffId,
      created_at: build.createdAt,
    });
  }
  return build;
}

/** Chooses the bores that bring each position near its target, and measures them with their journals. */
export function assemble(bench: Bench, build: DemoBuild, endsAs: BuildState): Map<DemoFit, DemoReading[]> {
  const boxes = bench.fits.reduce(
    (sum, { positions, kind }) => sum + positions.length * kind.stations.length,
    0,
  );
  const half = endsAs === "measuring" ? Math.round(boxes / 2) : undefined;
  const sheet = startSheet(bench, "assembly", build, build.daysAgo, half);
  const readings = new Map<DemoFit, DemoReading[]>();
  for (const fit of bench.fits) {
    choosePart(fit, build);
    readings.set(fit, measureParts(bench, fit, sheet));
  }
  if (half) return readings;
  const at = bench.calendar.at(build.daysAgo, 17);
  signSheet(bench, sheet, at, [...readings.values()].flat());
  noteMove(bench, at, bench.shop.personOf("builder"), build, ["measuring", "assembled"]);
  return readings;
}

function choosePart(fit: DemoFit, build: DemoBuild): void {
  const { kind, row, random, spec } = fit;
  const journal = stationsOf(kind, "journal");
  // A hard coating comes on new pins; a shell brings its own.
  if (spec.coating?.fromBuild === build.number && spec.coating.kind !== "dry-film") {
    fit.journals = fit.journals.map(() => newJournal(kind, row, random));
  }
  fit.bores = fit.journals.map((part) =>
    makePart(
      stationsOf(kind, "bore"),
      sizeOfRecord(journal, part) + metres(fit.aim.pm) + random.normal(buildScatter),
      random,
    ),
  );
}
