import { database } from "#database/connection";
import { fitKind } from "~/engineering/trade/fit-kinds";
import type { Scope } from "./scope";
import { isVisible } from "./visible-engines.server";

/** The build in hand of each engine this person may see, and what is left to do on it. */
export async function listBuildsInHand(scope: Scope) {
  const builds = await database()
    .selectFrom("build")
    .innerJoin("engine", "engine.id", "build.engine_id")
    .select([
      "build.id",
      "build.number",
      "build.state",
      "build.torn_down_at as tornDownAt",
      "engine.id as engineId",
      "engine.name as engineName",
      "engine.form",
      "engine.cylinders",
      "engine.environment",
    ])
    .where(isVisible(scope))
    .where((build) =>
      build.not(
        build.exists(
          build
            .selectFrom("build as later")
            .select("later.id")
            .whereRef("later.engine_id", "=", "build.engine_id")
            .whereRef("later.number", ">", "build.number"),
        ),
      ),
    )
    .orderBy("engine.name")
    .limit(200)
    .execute();
  const ids = builds.map((build) => build.id);
  if (ids.length === 0) return [];
  const [due, done, hours, signatures, signOffs] = await Promise.all([
    countBoxesDue(builds.map((build) => build.engineId)),
    countBoxesDone(ids),
    sumHours(ids),
    listSigned(ids),
    countSignOffs(ids),
  ]);
  return builds.map((build) => ({
    ...build,
    fits: due.get(build.engineId)?.fits ?? 0,
    boxesDue: due.get(build.engineId)?.boxes ?? 0,
    assemblyDone: done.get(`${build.id} assembly`) ?? 0,
    teardownDone: done.get(`${build.id} teardown`) ?? 0,
    hours: hours.get(build.id) ?? 0,
    teardownSigned: signatures.has(`${build.id} teardown`),
    signedFits: signOffs.get(build.id) ?? 0,
  }));
}

export type BuildInHand = Awaited<ReturnType<typeof listBuildsInHand>>[number];

async function countBoxesDue(engineIds: string[]) {
  const rows = await database()
    .selectFrom("fit")
    .innerJoin("position", "position.fit_id", "fit.id")
    .select((row) => ["fit.engine_id as engineId", "fit.kind", row.fn.countAll<number>().as("positions")])
    .where("fit.engine_id", "in", engineIds)
    .where("position.retired_at", "is", null)
    .groupBy(["fit.id"])
    .execute();
  const due = new Map<string, { fits: number; boxes: number }>();
  for (const row of rows) {
    const sofar = due.get(row.engineId) ?? { fits: 0, boxes: 0 };
    due.set(row.engineId, {
      fits: sofar.fits + 1,
      boxes: sofar.boxes + row.positions * fitKind(row.kind).stations.length,
    });
  }
  return due;
}

async function countBoxesDone(buildIds: string[]): Promise<Map<string, number>> {
  const rows = await database()
    .selectFrom("reading")
    .select((row) => ["build_id as buildId", "stage", row.fn.countAll<number>().as("boxes")])
    .where("build_id", "in", buildIds)
    .where("repeat", "=", 1)
    .where("state", "!=", "withdrawn")
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
    .groupBy(["build_id", "stage"])
    .execute();
  return new Map(rows.map((row) => [`${row.buildId} ${row.stage}`, row.boxes]));
}

async function sumHours(buildIds: string[]): Promise<Map<string, number>> {
  const rows = await database()
    .selectFrom("run")
    .select((run) => ["build_id as buildId", run.fn.sum<number>("hours").as("hours")])
    .where("build_id", "in", buildIds)
    .groupBy("build_id")
    .execute();
  return new Map(rows.map((row) => [row.buildId, row.hours]));
}

async function listSigned(buildIds: string[]): Promise<Set<string>> {
  const rows = await database()
    .selectFrom("sheet_signature")
    .select(["build_id as buildId", "stage"])
    .where("build_id", "in", buildIds)
    .execute();
  return new Set(rows.map((row) => `${row.buildId} ${row.stage}`));
}

async function countSignOffs(buildIds: string[]): Promise<Map<string, number>> {
  const rows = await database()
    .selectFrom("sign_off")
    .select((row) => ["build_id as buildId", row.fn.countAll<number>().as("fits")])
    .where("build_id", "in", buildIds)
    .groupBy("build_id")
    .execute();
  return new Map(rows.map((row) => [row.buildId, row.fits]));
}
