import { database } from "#database/connection";
import type { Fit } from "./fit.server";
import type { Scope } from "./scope";

/**
 * Whether anything that a fit's proposal is made from was written after an instant: readings, findings and runs of the
 * builds up to it, the fit itself, the shop's rules. All of them are rows that are only ever added, so that looking for
 * a younger one is enough, and much less than working the history out again.
 */
export async function hasChangedSince(
  scope: Scope,
  fit: Pick<Fit, "id" | "engine_id">,
  buildNumber: number,
  since: string,
): Promise<boolean> {
  const younger = await Promise.all([
    database()
      .selectFrom("reading")
      .innerJoin("build", "build.id", "reading.build_id")
      .select("reading.id")
      .where("reading.fit_id", "=", fit.id)
      .where("reading.taken_at", ">", since)
      .where("build.number", "<=", buildNumber)
      .limit(1)
      .execute(),
    database()
      .selectFrom("finding")
      .innerJoin("build", "build.id", "finding.build_id")
      .select("finding.id")
      .where("finding.fit_id", "=", fit.id)
      .where("finding.found_at", ">", since)
      .where("build.number", "<=", buildNumber)
      .limit(1)
      .execute(),
    database()
      .selectFrom("run")
      .innerJoin("build", "build.id", "run.build_id")
      .select("run.id")
      .where("build.engine_id", "=", fit.engine_id)
      .where("build.number", "<=", buildNumber)
      .where("run.created_at", ">", since)
      .limit(1)
      .execute(),
    database()
      .selectFrom("history")
      .select("id")
      .where("subject_id", "in", [fit.id, scope.shopId])
      .where("happened_at", ">", since)
      .limit(1)
      .execute(),
  ]);
  return younger.some((rows) => rows.length > 0);
}
