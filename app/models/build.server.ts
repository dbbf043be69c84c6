import { type DatabaseTransaction, database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { BuildState } from "#database/schema";
import { findEngine } from "./engine.server";
import { type Fit, listFits } from "./fit.server";
import { recordHistory } from "./history.server";
import { conflict, invalid, notFound } from "./refusal";
import type { Scope } from "./scope";
import { isVisible } from "./visible-engines.server";

/** One build of an engine this person may see. @throws Refusal `not-found` */
export async function findBuild(scope: Scope, id: string) {
  const build = await database()
    .selectFrom("build")
    .innerJoin("engine", "engine.id", "build.engine_id")
    .leftJoin("oil", "oil.id", "build.oil_id")
    .selectAll("build")
    .select(["engine.name as engineName", "oil.name as oilName"])
    .where("build.id", "=", id)
    .where(isVisible(scope))
    .executeTakeFirst();
  if (!build) throw notFound("build");
  return build;
}

export type Build = Awaited<ReturnType<typeof findBuild>>;

/** The builds of an engine, newest first. */
export function listBuilds(scope: Scope, engineId: string) {
  return database()
    .selectFrom("build")
    .select(["id", "number", "state", "note", "created_at as createdAt", "version"])
    .where("engine_id", "=", engineId)
    .where("shop_id", "=", scope.shopId)
    .orderBy("number", "desc")
    .execute();
}

/** The targets of a build, per fit. */
export function listTargets(scope: Scope, buildId: string) {
  return database()
    .selectFrom("target")
    .select(["fit_id as fitId", "least_pm", "aim_pm", "most_pm", "coating", "sign_off_id as signOffId"])
    .where("build_id", "=", buildId)
    .where("shop_id", "=", scope.shopId)
    .execute();
}

export type Target = Awaited<ReturnType<typeof listTargets>>[number];

/**
 * Starts the next build of an engine: each fit aims at what the crew chief signed last,
 * or where nothing was signed at what the build before aimed at, or at the usual clearance.
 * @throws Refusal `conflict` while the build before is not torn down
 */
export async function insertBuild(
  scope: Scope,
  engineId: string,
  build: { oilId?: string | undefined; note: string },
): Promise<string> {
  const engine = await findEngine(scope, engineId);
  const fits = await listFits(scope, engineId);
  await refuseForeignOil(scope, build.oilId);
  const id = newId();
  await database()
    .transaction()
    .execute(async (transaction) => {
      const last = await transaction
        .selectFrom("build")
        .select(["id", "number", "state"])
        .where("engine_id", "=", engineId)
        .orderBy("number", "desc")
        .executeTakeFirst();
      if (last && last.state !== "torn-down" && last.state !== "reviewed") {
        throw conflict(
          "build-in-hand",
          `Build ${last.number} of ${engine.name} is still ${last.state}; tear it down before the next is started.`,
        );
      }
      await transaction
        .insertInto("build")
        .values({
          id,
          shop_id: scope.shopId,
          engine_id: engineId,
          number: (last?.number ?? 0) + 1,
          state: "measuring",
          oil_id: build.oilId ?? null,
          note: build.note,
          created_at: instant(),
          created_by: scope.personId,
          torn_down_at: null,
          version: 1,
        })
        .execute();
      const aims = await nextAims(transaction, fits, last?.id);
      await transaction
        .insertInto("target")
        .values(
          fits.map((fit, index) => ({
            id: newId(),
            shop_id: scope.shopId,
            build_id: id,
            fit_id: fit.id,
            ...windowAround(aims[index]!.aim, fit),
            coating: fit.coating,
            sign_off_id: aims[index]!.signOffId,
            created_at: instant(),
          })),
        )
        .execute();
      await recordHistory(transaction, scope, {
        engineId,
        subjectKind: "build",
        subjectId: id,
        what: `started build ${(last?.number ?? 0) + 1}`,
      });
    });
  return id;
}

async function nextAims(transaction: DatabaseTransaction, fits: Fit[], lastBuildId: string | undefined) {
  if (!lastBuildId) return fits.map((fit) => ({ aim: fit.usual_pm, signOffId: null }));
  const signed = await transaction
    .selectFrom("sign_off")
    .select(["id", "fit_id", "target_pm"])
    .where("build_id", "=", lastBuildId)
    .execute();
  const before = await transaction
    .selectFrom("target")
    .select(["fit_id", "aim_pm"])
    .where("build_id", "=", lastBuildId)
    .execute();
  return fits.map((fit) => {
    const signOff = signed.find((row) => row.fit_id === fit.id);
    if (signOff) return { aim: signOff.target_pm, signOffId: signOff.id };
    return { aim: before.find((row) => row.fit_id === fit.id)?.aim_pm ?? fit.usual_pm, signOffId: null };
  });
}

/** The target window: the aim with the fit's tolerance either side, cut off at the hard limits, which are never left. */
export function windowAround(aim: number, fit: Pick<Fit, "least_pm" | "most_pm" | "tolerance_pm">) {
  return {
    least_pm: Math.min(aim, Math.max(fit.least_pm, aim - fit.tolerance_pm)),
    aim_pm: aim,
    most_pm: Math.max(aim, Math.min(fit.most_pm, aim + fit.tolerance_pm)),
  };
}

async function refuseForeignOil(scope: Scope, oilId: string | undefined): Promise<void> {
  if (!oilId) return;
  const oil = await database()
    .selectFrom("oil")
    .select("id")
    .where("id", "=", oilId)
    .where("shop_id", "=", scope.shopId)
    .executeTakeFirst();
  if (!oil) throw invalid({ path: "oil", code: "unknown-oil", message: "The shop has no such oil." });
}

const nextStates: Record<BuildState, readonly BuildState[]> = {
  measuring: ["assembled"],
  assembled: ["running", "torn-down"],
  running: ["torn-down"],
  "torn-down": ["reviewed"],
  reviewed: [],
};

const stateWords: Record<BuildState, string> = {
  measuring: "being measured",
  assembled: "assembled",
  running: "running",
  "torn-down": "torn down",
  reviewed: "reviewed",
};

const moveWords: Record<BuildState, string> = {
  measuring: "started",
  assembled: "assembled",
  running: "ran",
  "torn-down": "tore down",
  reviewed: "closed the review of",
};

/** A step round the loop as the history says it: "tore down build 7". */
export function moveInWords(build: number, to: BuildState): string {
  return `${moveWords[to]} build ${build}`;
}

/** Whether a build may go from one state to another. */
export function mayGo(from: BuildState, to: BuildState): boolean {
  return nextStates[from].includes(to);
}

/**
 * Takes a build one step round the loop, inside the caller's transaction.
 * @throws Refusal `conflict` where the step is not allowed or the build has changed since `version`
 */
export async function moveBuild(
  transaction: DatabaseTransaction,
  scope: Scope,
  build: Pick<Build, "id" | "engine_id" | "number" | "state" | "version">,
  to: BuildState,
  version: number,
): Promise<void> {
  if (build.version !== version) {
    throw conflict(
      "lost-update",
      "Someone has taken this build further while you were looking. Load it again.",
    );
  }
  if (!mayGo(build.state, to)) {
    throw conflict(
      "step-not-allowed",
      `Build ${build.number} is ${stateWords[build.state]}; it cannot be ${stateWords[to]} next.`,
    );
  }
  const result = await transaction
    .updateTable("build")
    .set({
      state: to,
      version: version + 1,
      ...(to === "torn-down" ? { torn_down_at: instant() } : {}),
    })
    .where("id", "=", build.id)
    .where("version", "=", version)
    .executeTakeFirst();
  if (result.numUpdatedRows === 0n)
    throw conflict("lost-update", "Someone has just taken this build further.");
  await recordHistory(transaction, scope, {
    engineId: build.engine_id,
    subjectKind: "build",
    subjectId: build.id,
    what: moveInWords(build.number, to),
    from: build.state,
    to,
  });
}
