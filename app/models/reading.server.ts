import { SqliteError } from "better-sqlite3";
import { type DatabaseTransaction, database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { Axis, Feature, Plane, ReadingState, Stage } from "#database/schema";
import type { Quantity } from "~/engineering/quantity/parse";
import type { Build } from "./build.server";
import { recordHistory } from "./history.server";
import { conflict, notFound } from "./refusal";
import type { Scope } from "./scope";

/** One box of a sheet: where on which part, and which repeat. */
export interface Box {
  stage: Stage;
  fitId: string;
  positionId: string;
  feature: Feature;
  plane: Plane;
  axis: Axis;
  repeat: number;
}

/** A warning about a slip that the person has seen, kept with the reading. */
export interface ReadingWarning {
  code: string;
  message: string;
}

/** What goes into a box: a measured value, or that it was not measured, or nothing again. */
export interface NewReading {
  box: Box;
  state: ReadingState;
  value?: Quantity | undefined;
  reason?: string | undefined;
  temperatureC?: number | undefined;
  gaugeId?: string | undefined;
  warnings: ReadingWarning[];
  /** The reading this takes the place of, as the person saw it; undefined for whatever stands there now. */
  supersedes?: string | null | undefined;
}

const columns = [
  "reading.id",
  "reading.fit_id as fitId",
  "reading.position_id as positionId",
  "reading.stage",
  "reading.feature",
  "reading.plane",
  "reading.axis",
  "reading.repeat",
  "reading.state",
  "reading.value_pm as valuePm",
  "reading.typed",
  "reading.unit",
  "reading.decimals",
  "reading.reason",
  "reading.temperature_c as temperatureC",
  "reading.gauge_id as gaugeId",
  "reading.warnings_json as warningsJson",
  "reading.supersedes_id as supersedesId",
  "reading.taken_at as takenAt",
  "reading.person_id as personId",
] as const;

/** Every reading of a build ever taken, oldest first; those superseded are marked. */
export async function listReadings(scope: Scope, buildId: string, stage?: Stage) {
  const rows = await database()
    .selectFrom("reading")
    .innerJoin("position", "position.id", "reading.position_id")
    .select([...columns, "position.number as position"])
    .where("reading.build_id", "=", buildId)
    .where("reading.shop_id", "=", scope.shopId)
    .$if(stage !== undefined, (query) => query.where("reading.stage", "=", stage as Stage))
    .orderBy("reading.id")
    .execute();
  const superseded = new Set(rows.map((row) => row.supersedesId));
  return rows.map((row) => ({ ...row, superseded: superseded.has(row.id) }));
}

/** The readings that stand: the last of each box, those withdrawn left out. */
export async function listStandingReadings(scope: Scope, buildId: string, stage?: Stage) {
  const all = await listReadings(scope, buildId, stage);
  return all.filter((reading) => !reading.superseded && reading.state !== "withdrawn");
}

export type StandingReading = Awaited<ReturnType<typeof listStandingReadings>>[number];

/**
 * Writes one reading down; what stood in its box stays in the record as superseded.
 * @returns the new reading's id
 * @throws Refusal `conflict` where the sheet is signed, or someone else has filled the box meanwhile
 */
export async function insertReading(scope: Scope, build: Build, reading: NewReading): Promise<string> {
  return database()
    .transaction()
    .execute((transaction) => writeReading(transaction, scope, build, reading));
}

async function writeReading(
  transaction: DatabaseTransaction,
  scope: Scope,
  build: Build,
  reading: NewReading,
): Promise<string> {
  if (reading.box.stage === "teardown" && build.state !== "torn-down") {
    throw conflict(
      "not-torn-down",
      `Build ${build.number} is not torn down; its teardown sheet takes no readings.`,
    );
  }
  await refuseForeignPosition(transaction, build, reading.box);
  const standing = await findStanding(transaction, build.id, reading.box);
  const supersedes = reading.supersedes === undefined ? (standing?.id ?? null) : reading.supersedes;
  if (supersedes !== (standing?.id ?? null)) {
    // The answer to a first try may have been lost on its way: the same value sent again is there already.
    if (standing && isSameEntry(standing, scope, reading)) return standing.id;
    throw filledMeanwhile(standing?.typed);
  }
  const id = newId();
  try {
    await transaction
      .insertInto("reading")
      .values({
        id,
        shop_id: scope.shopId,
        build_id: build.id,
        fit_id: reading.box.fitId,
        position_id: reading.box.positionId,
        stage: reading.box.stage,
        feature: reading.box.feature,
        plane: reading.box.plane,
        axis: reading.box.axis,
        repeat: reading.box.repeat,
        state: reading.state,
        value_pm: reading.value?.picometres ?? null,
        typed: reading.value?.typed ?? "",
        unit: reading.value?.unit ?? null,
        decimals: reading.value?.decimals ?? null,
        reason: reading.reason ?? null,
        temperature_c: reading.temperatureC ?? null,
        gauge_id: reading.gaugeId ?? null,
        warnings_json: JSON.stringify(reading.warnings),
        supersedes_id: supersedes,
        person_id: scope.personId,
        taken_at: instant(),
      })
      .execute();
  } catch (error) {
    throw asConflict(error);
  }
  await recordHistory(transaction, scope, {
    engineId: build.engine_id,
    subjectKind: "reading",
    subjectId: id,
    what: standing ? "corrected a reading" : "took a reading",
    from: standing?.typed,
    to: reading.value?.typed ?? reading.state,
  });
  return id;
}

async function refuseForeignPosition(
  transaction: DatabaseTransaction,
  build: Build,
  box: Box,
): Promise<void> {
  const position = await transaction
    .selectFrom("position")
    .innerJoin("fit", "fit.id", "position.fit_id")
    .select("position.retired_at")
    .where("position.id", "=", box.positionId)
    .where("fit.id", "=", box.fitId)
    .where("fit.engine_id", "=", build.engine_id)
    .executeTakeFirst();
  if (!position) throw notFound("position on this engine");
  if (position.retired_at) {
    throw conflict("position-retired", "This position was taken out of use; nothing can be measured at it.");
  }
}

async function findStanding(transaction: DatabaseTransaction, buildId: string, box: Box) {
  const rows = await transaction
    .selectFrom("reading")
    .select(["id", "typed", "unit", "state", "person_id", "supersedes_id"])
    .where("build_id", "=", buildId)
    .where("stage", "=", box.stage)
    .where("position_id", "=", box.positionId)
    .where("feature", "=", box.feature)
    .where("plane", "=", box.plane)
    .where("axis", "=", box.axis)
    .where("repeat", "=", box.repeat)
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
    .execute();
  return rows[0];
}

function isSameEntry(
  standing: NonNullable<Awaited<ReturnType<typeof findStanding>>>,
  scope: Scope,
  reading: NewReading,
): boolean {
  return (
    standing.person_id === scope.personId &&
    standing.supersedes_id === reading.supersedes &&
    standing.state === reading.state &&
    standing.typed === (reading.value?.typed ?? "") &&
    standing.unit === (reading.value?.unit ?? null)
  );
}

function filledMeanwhile(typed: string | undefined) {
  const what = typed ? `it says ${typed} now` : "it is empty now";
  return conflict(
    "box-filled",
    `Someone else has changed this box meanwhile: ${what}. Look again before you overwrite it.`,
  );
}

function asConflict(error: unknown): unknown {
  if (!(error instanceof SqliteError)) return error;
  if (error.message.includes("the sheet is signed")) {
    return conflict("sheet-signed", "The sheet is signed and frozen; this reading was not written.");
  }
  if (error.code === "SQLITE_CONSTRAINT_UNIQUE") return filledMeanwhile(undefined);
  return error;
}

/** How many boxes of a build hold something, by `fitId stage`; repeats count with their first. */
export async function countStanding(scope: Scope, buildId: string): Promise<Map<string, number>> {
  const standing = await listStandingReadings(scope, buildId);
  const counts = new Map<string, number>();
  for (const reading of standing) {
    if (reading.repeat !== 1) continue;
    const key = `${reading.fitId} ${reading.stage}`;
    counts.set(key, (counts.get(key) ?? 0) + 1);
  }
  return counts;
}
