import { database } from "#database/connection";
import { listBuilds } from "./build.server";
import type { Scope } from "./scope";

/** An engine's builds as rungs of its ladder, newest first: hours, oil, worst grade, events. */
export async function listRungs(scope: Scope, engineId: string) {
  const [builds, runs, grades] = await Promise.all([
    listBuilds(scope, engineId),
    database()
      .selectFrom("run")
      .innerJoin("build", "build.id", "run.build_id")
      .innerJoin("oil", "oil.id", "run.oil_id")
      .select([
        "run.build_id as buildId",
        "run.hours",
        "run.events_json as eventsJson",
        "oil.grade",
        "oil.kv100",
      ])
      .where("build.engine_id", "=", engineId)
      .where("run.shop_id", "=", scope.shopId)
      .orderBy("run.started_at")
      .execute(),
    database()
      .selectFrom("finding")
      .innerJoin("build", "build.id", "finding.build_id")
      .select((finding) => ["finding.build_id as buildId", finding.fn.max("finding.grade").as("worst")])
      .where("build.engine_id", "=", engineId)
      .where("finding.shop_id", "=", scope.shopId)
      .where((finding) =>
        finding.not(
          finding.exists(
            finding
              .selectFrom("finding as later")
              .select("later.id")
              .whereRef("later.supersedes_id", "=", "finding.id"),
          ),
        ),
      )
      .groupBy("finding.build_id")
      .execute(),
  ]);
  return builds.map((build) => {
    const ofBuild = runs.filter((run) => run.buildId === build.id);
    return {
      id: build.id,
      build: build.number,
      state: build.state,
      hours: ofBuild.reduce((sum, run) => sum + run.hours, 0),
      oil: ofBuild.at(-1)?.grade,
      kv100: ofBuild.at(-1)?.kv100,
      grade: grades.find((row) => row.buildId === build.id)?.worst,
      events: [...new Set(ofBuild.flatMap((run) => JSON.parse(run.eventsJson) as string[]))],
    };
  });
}
