import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import { type Build, moveBuild } from "./build.server";
import { recordHistory } from "./history.server";
import { conflict, invalid } from "./refusal";
import type { Scope } from "./scope";

/** A dyno pull, session or race. Speeds in rpm, pressures in Pa, the oil's temperature in °C. */
export interface NewRun {
  kind: string;
  startedAt: Date;
  hours: number;
  laps?: number | undefined;
  starts?: number | undefined;
  topSpeedRpm?: number | undefined;
  oilId: string;
  oilTemperatureC?: number | undefined;
  pressureIdlePa?: number | undefined;
  pressureAtSpeedPa?: number | undefined;
  pressureAtSpeedRpm?: number | undefined;
  events: string[];
  note: string;
}

/** The runs of a build in the order they were run. */
export async function listRuns(scope: Scope, buildId: string) {
  const rows = await database()
    .selectFrom("run")
    .innerJoin("oil", "oil.id", "run.oil_id")
    .innerJoin("person", "person.id", "run.person_id")
    .selectAll("run")
    .select(["oil.name as oilName", "oil.grade as oilGrade", "person.name as personName"])
    .where("run.build_id", "=", buildId)
    .where("run.shop_id", "=", scope.shopId)
    .orderBy("run.started_at")
    .execute();
  return rows.map(({ events_json, ...run }) => ({ ...run, events: JSON.parse(events_json) as string[] }));
}

export type Run = Awaited<ReturnType<typeof listRuns>>[number];

/** Writes a run down; the first run of an assembled build sets it running. @throws Refusal */
export async function insertRun(scope: Scope, build: Build, run: NewRun): Promise<string> {
  if (build.state === "measuring") {
    throw conflict(
      "not-assembled",
      `Build ${build.number} is not assembled yet: sign its sheet before it runs.`,
    );
  }
  if (build.state !== "assembled" && build.state !== "running") {
    throw conflict("torn-down", `Build ${build.number} is torn down; its run log is closed.`);
  }
  const oil = await database()
    .selectFrom("oil")
    .select("id")
    .where("id", "=", run.oilId)
    .where("shop_id", "=", scope.shopId)
    .executeTakeFirst();
  if (!oil)
    throw invalid({ path: "oil", code: "unknown-oil", message: "The shop has no such oil; add it first." });
  const id = newId();
  await database()
    .transaction()
    .execute(async (transaction) => {
      await transaction
        .insertInto("run")
        .values({
          id,
          shop_id: scope.shopId,
          build_id: build.id,
          kind: run.kind,
          started_at: instant(run.startedAt),
          hours: run.hours,
          laps: run.laps ?? null,
          starts: run.starts ?? null,
          top_speed_rpm: run.topSpeedRpm ?? null,
          oil_id: run.oilId,
          oil_temperature_c: run.oilTemperatureC ?? null,
          pressure_idle_pa: run.pressureIdlePa ?? null,
          pressure_at_speed_pa: run.pressureAtSpeedPa ?? null,
          pressure_at_speed_rpm: run.pressureAtSpeedRpm ?? null,
          events_json: JSON.stringify(run.events),
          note: run.note,
          person_id: scope.personId,
          created_at: instant(),
        })
        .execute();
      if (build.state === "assembled") await moveBuild(transaction, scope, build, "running", build.version);
      await recordHistory(transaction, scope, {
        engineId: build.engine_id,
        subjectKind: "run",
        subjectId: id,
        what: `logged a ${run.kind} run of ${run.hours} h`,
      });
    });
  return id;
}
