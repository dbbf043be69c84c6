import { createHash } from "node:crypto";
import { database } from "#database/connection";
import type { FitOfHistory, History } from "~/engineering/next-step/types";
import { metres } from "~/engineering/quantity/length";
import type { Fit } from "./fit.server";
import { listGauges } from "./gauge.server";
import { type BuildOfHistory, iterationOfBuild } from "./iteration-of-build";
import type { StandingReading } from "./reading.server";
import type { Scope } from "./scope";

/**
 * The whole history of one fit as the next step takes it: every build that was torn down, oldest first.
 * Up to and including build `upTo` where it is given, so that a past proposal can be looked at as it was then.
 */
export async function fitHistory(scope: Scope, fit: Fit, upTo = Number.MAX_SAFE_INTEGER): Promise<History> {
  const builds = await database()
    .selectFrom("build")
    .innerJoin("target", (join) =>
      join.onRef("target.build_id", "=", "build.id").on("target.fit_id", "=", fit.id),
    )
    .select(["build.id", "build.number", "build.created_at as createdAt", "target.aim_pm", "target.coating"])
    .where("build.engine_id", "=", fit.engine_id)
    .where("build.shop_id", "=", scope.shopId)
    .where("build.state", "in", ["torn-down", "reviewed"])
    .where("build.number", "<=", upTo)
    .orderBy("build.number")
    .execute();
  const ids = builds.map((build) => build.id);
  const [readings, findings, runs, gauges] = await Promise.all([
    ids.length > 0 ? standingReadings(scope, fit.id) : [],
    ids.length > 0 ? standingFindings(scope, fit.id) : [],
    ids.length > 0 ? runsOf(scope, ids) : [],
    listGauges(scope),
  ]);
  const readingsOf = groupBy(readings, (reading) => reading.buildId);
  const findingsOf = groupBy(findings, (finding) => finding.build_id);
  const runsOfBuild = groupBy(runs, (run) => run.build_id);
  return {
    fit: fitOfHistory(fit, builds[0]),
    iterations: builds.map((build) =>
      iterationOfBuild(
        fit,
        build,
        {
          readings: readingsOf.get(build.id) ?? [],
          findings: findingsOf.get(build.id) ?? [],
          runs: runsOfBuild.get(build.id) ?? [],
        },
        gauges,
      ),
    ),
  };
}

/** The fit itself as the next step takes it. @param first the first build of its history */
export function fitOfHistory(fit: Fit, first: Pick<BuildOfHistory, "coating"> | undefined): FitOfHistory {
  return {
    kind: fit.kind,
    nominal: metres(fit.nominal_pm),
    positions: fit.positions.length,
    hardLimits: { least: metres(fit.least_pm), most: metres(fit.most_pm) },
    coating: fit.coating ? { kind: fit.coating, isNew: first?.coating === fit.coating } : null,
    finishes: {
      ...(fit.bore_finish_pm === null ? {} : { bore: metres(fit.bore_finish_pm) }),
      ...(fit.journal_finish_pm === null ? {} : { journal: metres(fit.journal_finish_pm) }),
    },
  };
}

/** A hash of what a proposal was made from: another hash says that the evidence has changed since. */
export function hashHistory(history: History): string {
  return createHash("sha256").update(JSON.stringify(history)).digest("hex");
}

function standingReadings(scope: Scope, fitId: string): Promise<(StandingReading & { buildId: string })[]> {
  return database()
    .selectFrom("reading")
    .innerJoin("position", "position.id", "reading.position_id")
    .select([
      "reading.id",
      "reading.build_id as buildId",
      "reading.position_id as positionId",
      "reading.stage",
      "reading.feature",
      "reading.plane",
      "reading.axis",
      "reading.repeat",
      "reading.state",
      "reading.value_pm as valuePm",
      "reading.temperature_c as temperatureC",
      "reading.gauge_id as gaugeId",
    ])
    .where("reading.fit_id", "=", fitId)
    .where("reading.shop_id", "=", scope.shopId)
    .where("reading.state", "=", "measured")
    .where((reading) =>
      reading.not(
        reading.exists(
          reading
            .selectFrom("reading as later")
            .select("later.id")
            .whereRef("later.supersedes_id", "=", "reading.id"),
        ),
      ),
    )
    .orderBy("reading.id")
    .execute() as Promise<(StandingReading & { buildId: string })[]>;
}

async function standingFindings(scope: Scope, fitId: string) {
  const rows = await database()
    .selectFrom("finding")
    .select(["id", "build_id", "position_id", "grade", "damage", "coating_state", "supersedes_id"])
    .where("fit_id", "=", fitId)
    .where("shop_id", "=", scope.shopId)
    .execute();
  const superseded = new Set(rows.map((row) => row.supersedes_id));
  return rows.filter((row) => !superseded.has(row.id));
}

function runsOf(scope: Scope, buildIds: string[]) {
  return database()
    .selectFrom("run")
    .innerJoin("oil", "oil.id", "run.oil_id")
    .selectAll("run")
    .select(["oil.name", "oil.grade", "oil.kv40", "oil.kv100", "oil.density15"])
    .where("run.build_id", "in", buildIds)
    .where("run.shop_id", "=", scope.shopId)
    .orderBy("run.started_at")
    .execute();
}

function groupBy<Item, Key>(items: readonly Item[], keyOf: (item: Item) => Key): Map<Key, Item[]> {
  const groups = new Map<Key, Item[]>();
  for (const item of items) {
    const group = groups.get(keyOf(item));
    if (group) group.push(item);
    else groups.set(keyOf(item), [item]);
  }
  return groups;
}
