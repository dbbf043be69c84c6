import { createHash } from "node:crypto";
import { type DatabaseTransaction, database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { BuildState, Stage } from "#database/schema";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { type Build, moveBuild } from "./build.server";
import { type Finding, listFindings } from "./finding.server";
import { listFits } from "./fit.server";
import { recordHistory } from "./history.server";
import { countStanding, listStandingReadings, type StandingReading } from "./reading.server";
import { conflict } from "./refusal";
import type { Scope } from "./scope";

/** How far a sheet is: per fit of the engine, the boxes it has and those that hold something. */
export async function sheetProgress(scope: Scope, build: Build, stage: Stage) {
  const [fits, counts] = await Promise.all([
    listFits(scope, build.engine_id),
    countStanding(scope, build.id),
  ]);
  return fits.map((fit) => ({
    id: fit.id,
    name: fitKind(fit.kind).name,
    due: fit.positions.length * fitKind(fit.kind).stations.length,
    done: counts.get(`${fit.id} ${stage}`) ?? 0,
  }));
}

/** Boxes of a sheet that nobody has filled or marked. */
export function blankBoxes(progress: Awaited<ReturnType<typeof sheetProgress>>): number {
  return progress.reduce((sum, fit) => sum + Math.max(0, fit.due - fit.done), 0);
}

/** Who signed a build's sheets, and when. */
export function listSignatures(scope: Scope, buildId: string) {
  return database()
    .selectFrom("sheet_signature")
    .innerJoin("person", "person.id", "sheet_signature.person_id")
    .select([
      "sheet_signature.stage",
      "sheet_signature.signed_at as signedAt",
      "sheet_signature.content_hash as contentHash",
      "person.name as personName",
    ])
    .where("sheet_signature.build_id", "=", buildId)
    .where("sheet_signature.shop_id", "=", scope.shopId)
    .execute();
}

/**
 * Takes a build one step round the loop, signing what the step closes:
 * assembling signs and freezes the assembly sheet, reviewing the teardown sheet where its builder has not.
 * @throws Refusal `conflict` where the step is not allowed, with why
 */
export async function takeBuildFurther(
  scope: Scope,
  build: Build,
  to: BuildState,
  version: number,
): Promise<void> {
  const stage = to === "assembled" ? "assembly" : to === "reviewed" ? "teardown" : undefined;
  const content = stage && (await signedContent(scope, build, stage));
  if (stage === "assembly" && content?.readings.length === 0) {
    throw conflict("nothing-measured", "Nothing is measured yet: an empty sheet cannot be signed.");
  }
  await database()
    .transaction()
    .execute(async (transaction) => {
      await moveBuild(transaction, scope, build, to, version);
      if (content && stage) await insertSignature(transaction, scope, build, stage, content);
    });
}

/**
 * Signs the teardown sheet: its readings and findings are frozen and the build waits for its crew chief.
 * @throws Refusal `conflict` where the build is not torn down, is signed already, or nothing is measured
 */
export async function signTeardown(scope: Scope, build: Build): Promise<void> {
  if (build.state !== "torn-down") {
    throw conflict(
      "not-torn-down",
      `Build ${build.number} is not torn down; there is no teardown sheet to sign.`,
    );
  }
  const content = await signedContent(scope, build, "teardown");
  if (content.readings.length === 0 && content.findings.length === 0) {
    throw conflict(
      "nothing-measured",
      "Nothing is measured and nothing found yet: an empty sheet cannot be signed.",
    );
  }
  await database()
    .transaction()
    .execute(async (transaction) => {
      const signed = await transaction
        .selectFrom("sheet_signature")
        .select("id")
        .where("build_id", "=", build.id)
        .where("stage", "=", "teardown")
        .executeTakeFirst();
      if (signed) throw conflict("already-signed", "The teardown sheet is signed already.");
      await insertSignature(transaction, scope, build, "teardown", content);
    });
}

async function signedContent(scope: Scope, build: Build, stage: Stage) {
  const readings = await listStandingReadings(scope, build.id, stage);
  const findings = stage === "teardown" ? await listFindings(scope, build.id) : [];
  return sheetContent(build.id, stage, readings, findings);
}

/** What a signature stands for: the ids of append-only rows would do, their values make it checkable by eye. */
export function sheetContent(
  buildId: string,
  stage: Stage,
  readings: readonly Pick<StandingReading, "id" | "state" | "valuePm" | "typed">[],
  findings: readonly Pick<Finding, "id" | "grade" | "damage">[],
) {
  return {
    build: buildId,
    stage,
    readings: readings.map((reading) => [reading.id, reading.state, reading.valuePm, reading.typed]),
    findings: findings.map((finding) => [finding.id, finding.grade, finding.damage]),
  };
}

/** The hash that is kept with a signature: another hash says that the sheet is not the one that was signed. */
export function hashSheet(content: ReturnType<typeof sheetContent>): string {
  return createHash("sha256").update(JSON.stringify(content)).digest("hex");
}

async function insertSignature(
  transaction: DatabaseTransaction,
  scope: Scope,
  build: Build,
  stage: Stage,
  content: Awaited<ReturnType<typeof signedContent>>,
): Promise<void> {
  await transaction
    .insertInto("sheet_signature")
    .values({
      id: newId(),
      shop_id: scope.shopId,
      build_id: build.id,
      stage,
      content_hash: hashSheet(content),
      person_id: scope.personId,
      signed_at: instant(),
    })
    .onConflict((conflicting) => conflicting.columns(["build_id", "stage"]).doNothing())
    .execute();
  await recordHistory(transaction, scope, {
    engineId: build.engine_id,
    subjectKind: "build",
    subjectId: build.id,
    what: `signed the ${stage} sheet of build ${build.number}`,
    to: { readings: content.readings.length, findings: content.findings.length },
  });
}
