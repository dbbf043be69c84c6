import { createHash } from "node:crypto";
import type { Insertable } from "kysely";
import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { Decision, SignOffTable } from "#database/schema";
import { nextStep } from "~/engineering/next-step/next-step";
import type { History, NextStep, Rules } from "~/engineering/next-step/types";
import { metres, picometres } from "~/engineering/quantity/length";
import type { Quantity } from "~/engineering/quantity/parse";
import { type Build, listBuilds } from "./build.server";
import type { Fit } from "./fit.server";
import { fitHistory, hashHistory } from "./fit-history.server";
import { recordHistory } from "./history.server";
import { conflict, invalid, notFound } from "./refusal";
import type { Scope } from "./scope";
import { findShopRules, type ShopRules } from "./shop.server";

/** What the crew chief decided on a proposal. */
export interface SignOff {
  decision: Decision;
  targetPm: number;
  reason: string;
  personName: string;
  signedAt: string;
}

/** A proposal as it was worked out and stored, with what it was made from. */
export interface StoredProposal {
  id: string;
  buildId: string;
  buildNumber: number;
  /** How many times it was worked out for this build; a sign-off names the one it saw. */
  version: number;
  proposedAt: string;
  answer: NextStep;
  history: History;
  /** True where readings, runs or findings have changed since it was worked out. */
  stale: boolean;
  signOff: SignOff | undefined;
}

/** Which build a proposal is for. */
type BuildOfProposal = Pick<Build, "id" | "number">;

/**
 * The proposal for a fit after the teardown of a build. The first call works it out and stores it with its
 * evidence; later ones give the stored one, and say whether the evidence has changed since.
 */
export async function proposalFor(scope: Scope, fit: Fit, build: BuildOfProposal): Promise<StoredProposal> {
  const history = await fitHistory(scope, fit, build.number);
  const stored = await findStored(scope, fit, build, history);
  return stored ?? workOut(scope, fit, build, history);
}

/** Works the proposal out again from the evidence as it stands. @throws Refusal `conflict` where it is signed */
export async function recomputeProposal(
  scope: Scope,
  fit: Fit,
  build: BuildOfProposal,
): Promise<StoredProposal> {
  const history = await fitHistory(scope, fit, build.number);
  const stored = await findStored(scope, fit, build, history);
  if (stored?.signOff) throw signedAlready(stored.signOff);
  if (stored && !stored.stale) return stored;
  return workOut(scope, fit, build, history);
}

export interface NewSignOff {
  decision: Decision;
  /** The target of a changed step. */
  target?: Quantity | undefined;
  reason?: string | undefined;
  /** The version of the proposal that the person saw. */
  version: number;
}

/**
 * The crew chief's decision: accept the proposal, change its target with a reason, or decline it with a reason
 * (the fit then holds its target). It is written once and the next build starts with it.
 * @throws Refusal `conflict` where it is signed, stale, or not the version the person saw; `invalid` where the target
 * leaves the hard limits or a reason is missing
 */
export async function signProposal(
  scope: Scope,
  fit: Fit,
  build: BuildOfProposal,
  signOff: NewSignOff,
): Promise<SignOff> {
  const proposal = await proposalFor(scope, fit, build);
  if (proposal.signOff) throw signedAlready(proposal.signOff);
  if (proposal.version !== signOff.version) {
    throw conflict(
      "lost-update",
      "The proposal was worked out again while you were looking. Read it again, then sign.",
    );
  }
  if (proposal.stale) {
    throw conflict(
      "stale",
      "The evidence has changed since this was proposed. Work it out again, then sign.",
    );
  }
  const builds = await listBuilds(scope, fit.engine_id);
  if (builds[0]!.number > proposal.buildNumber) {
    throw conflict("next-build-started", `Build ${builds[0]!.number} has already started with its targets.`);
  }
  const targetPm = signedTarget(fit, proposal, signOff);
  const reason = signOff.reason?.trim() ?? "";
  if (signOff.decision !== "accept" && reason === "") {
    throw invalid({
      path: "reason",
      code: "reason-missing",
      message: "Say why: a change or a refusal needs its reason.",
    });
  }
  await database()
    .transaction()
    .execute(async (transaction) => {
      const id = newId();
      const row = {
        id,
        shop_id: scope.shopId,
        proposal_id: proposal.id,
        fit_id: fit.id,
        build_id: proposal.buildId,
        decision: signOff.decision,
        target_pm: targetPm,
        target_typed: signOff.target?.typed ?? "",
        reason,
        person_id: scope.personId,
        signed_at: instant(),
      };
      await transaction
        .insertInto("sign_off")
        .values({ ...row, content_hash: hashSignOff(row) })
        .execute();
      await recordHistory(transaction, scope, {
        engineId: fit.engine_id,
        subjectKind: "sign_off",
        subjectId: id,
        what: `signed (${signOff.decision}) the next step`,
        from: { proposed: proposal.answer.action, targetPm: picometres(proposal.answer.target) },
        to: { targetPm, reason },
      });
    });
  return (await findSignOff(scope, proposal.id)) as SignOff;
}

/** The hash that is kept with a sign-off, of all that was signed. */
export function hashSignOff(row: Omit<Insertable<SignOffTable>, "content_hash">): string {
  return createHash("sha256").update(JSON.stringify(row)).digest("hex");
}

function signedTarget(fit: Fit, proposal: StoredProposal, signOff: NewSignOff): number {
  const held = picometres(proposal.answer.target - proposal.answer.step);
  if (signOff.decision === "accept") return picometres(proposal.answer.target);
  if (signOff.decision === "decline") return held;
  const target = signOff.target?.picometres;
  if (target === undefined) {
    throw invalid({
      path: "target",
      code: "target-missing",
      message: "Type the target that the next build shall have.",
    });
  }
  if (target < fit.least_pm || target > fit.most_pm) {
    throw invalid({
      path: "target",
      code: "outside-hard-limits",
      message: `The target leaves the fit's hard limits, ${fit.least_typed} to ${fit.most_typed} (${fit.limits_source}).`,
    });
  }
  return target;
}

function signedAlready(signOff: SignOff) {
  return conflict("already-signed", `${signOff.personName} has signed this already (${signOff.decision}).`);
}

/** The latest build of an engine that a next step can follow from. @throws Refusal `not-found` */
export async function latestTornDown(scope: Scope, engineId: string) {
  const build = (await listBuilds(scope, engineId)).find(
    (candidate) => candidate.state === "torn-down" || candidate.state === "reviewed",
  );
  if (!build) throw notFound("proposal: no build of this engine is torn down yet");
  return build;
}

async function findStored(
  scope: Scope,
  fit: Fit,
  build: BuildOfProposal,
  history: History,
): Promise<StoredProposal | undefined> {
  const rows = await database()
    .selectFrom("proposal")
    .selectAll()
    .where("fit_id", "=", fit.id)
    .where("build_id", "=", build.id)
    .where("shop_id", "=", scope.shopId)
    .orderBy("id")
    .execute();
  const latest = rows.at(-1);
  if (!latest) return undefined;
  const signOff = await findSignOff(scope, latest.id);
  return {
    id: latest.id,
    buildId: build.id,
    buildNumber: build.number,
    version: rows.length,
    proposedAt: latest.proposed_at,
    answer: JSON.parse(latest.answer_json) as NextStep,
    history: JSON.parse(latest.history_json) as History,
    stale: !signOff && latest.history_hash !== hashHistory(history),
    signOff,
  };
}

async function workOut(
  scope: Scope,
  fit: Fit,
  build: BuildOfProposal,
  history: History,
): Promise<StoredProposal> {
  const answer = nextStep(history, await rulesFor(scope, fit));
  await database()
    .insertInto("proposal")
    .values({
      id: newId(),
      shop_id: scope.shopId,
      fit_id: fit.id,
      build_id: build.id,
      ...proposalColumns(answer, history),
      person_id: scope.personId,
      proposed_at: instant(),
    })
    .execute();
  return (await findStored(scope, fit, build, history)) as StoredProposal;
}

/** A proposal for the database: what is proposed, and the evidence it was made from. */
export function proposalColumns(answer: NextStep, history: History) {
  return {
    action: answer.action,
    subject: answer.subject,
    step_pm: picometres(answer.step),
    target_pm: picometres(answer.target),
    answer_json: JSON.stringify(answer),
    history_json: JSON.stringify(history),
    history_hash: hashHistory(history),
  };
}

/** The shop's rules for one of its fits, as the next step takes them. */
export async function rulesFor(scope: Scope, fit: Pick<Fit, "usual_pm">): Promise<Rules> {
  return rulesOfFit(await findShopRules(scope), fit);
}

/** The same from the shop's rules as they stand. */
export function rulesOfFit(shop: ShopRules, fit: Pick<Fit, "usual_pm">): Rules {
  return {
    usual: metres(fit.usual_pm),
    largestStep: metres(shop.largest_step_pm),
    leastHours: shop.least_hours,
    stopGrade: shop.stop_grade,
    baselineRuns: shop.baseline_runs,
    wearRateRise: shop.wear_rate_rise,
  };
}

async function findSignOff(scope: Scope, proposalId: string): Promise<SignOff | undefined> {
  return database()
    .selectFrom("sign_off")
    .innerJoin("person", "person.id", "sign_off.person_id")
    .select([
      "sign_off.decision",
      "sign_off.target_pm as targetPm",
      "sign_off.reason",
      "person.name as personName",
      "sign_off.signed_at as signedAt",
    ])
    .where("sign_off.proposal_id", "=", proposalId)
    .where("sign_off.shop_id", "=", scope.shopId)
    .executeTakeFirst();
}

/** What was proposed and decided for a fit at each build, oldest first. */
export async function listDecisions(scope: Scope, fitId: string) {
  const rows = await database()
    .selectFrom("proposal")
    .innerJoin("build", "build.id", "proposal.build_id")
    .leftJoin("sign_off", "sign_off.proposal_id", "proposal.id")
    .leftJoin("person", "person.id", "sign_off.person_id")
    .select([
      "build.number",
      "proposal.id",
      "proposal.action",
      "proposal.subject",
      "proposal.step_pm as stepPm",
      "proposal.target_pm as proposedPm",
      "sign_off.decision",
      "sign_off.target_pm as signedPm",
      "sign_off.reason",
      "sign_off.signed_at as signedAt",
      "person.name as personName",
    ])
    .where("proposal.fit_id", "=", fitId)
    .where("proposal.shop_id", "=", scope.shopId)
    .orderBy("build.number")
    .orderBy("proposal.id")
    .execute();
  // Of a build that was worked out several times the last one counts.
  return rows.filter((row, index) => rows[index + 1]?.number !== row.number);
}

export type PastDecision = Awaited<ReturnType<typeof listDecisions>>[number];
