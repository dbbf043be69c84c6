import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import { nextStep } from "~/engineering/next-step/next-step";
import type { History, NextStep, Rules } from "~/engineering/next-step/types";
import { metres, picometres } from "~/engineering/quantity/length";
import { type Build, listBuilds } from "./build.server";
import { hasChangedSince } from "./evidence-change.server";
import type { Fit } from "./fit.server";
import { fitHistory, hashHistory } from "./fit-history.server";
import { notFound } from "./refusal";
import type { Scope } from "./scope";
import { findShopRules, type ShopRules } from "./shop.server";
import { findSignOff, type SignOff, signedAlready } from "./sign-off.server";

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
  return (await findStored(scope, fit, build)) ?? workOut(scope, fit, build);
}

/** The latest proposal of a fit that was ever worked out, whichever build it was for. */
export async function findLatestProposal(scope: Scope, fit: Fit): Promise<StoredProposal | undefined> {
  const build = await database()
    .selectFrom("proposal")
    .innerJoin("build", "build.id", "proposal.build_id")
    .select(["build.id", "build.number"])
    .where("proposal.fit_id", "=", fit.id)
    .where("proposal.shop_id", "=", scope.shopId)
    .orderBy("build.number", "desc")
    .executeTakeFirst();
  return build && findStored(scope, fit, build);
}

/** Works the proposal out again from the evidence as it stands. @throws Refusal `conflict` where it is signed */
export async function recomputeProposal(
  scope: Scope,
  fit: Fit,
  build: BuildOfProposal,
): Promise<StoredProposal> {
  const stored = await findStored(scope, fit, build);
  if (stored?.signOff) throw signedAlready(stored.signOff);
  if (stored && !stored.stale) return stored;
  return workOut(scope, fit, build);
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
    stale: !signOff && (await hasChangedSince(scope, fit, build.number, latest.proposed_at)),
    signOff,
  };
}

async function workOut(scope: Scope, fit: Fit, build: BuildOfProposal): Promise<StoredProposal> {
  const history = await fitHistory(scope, fit, build.number);
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
  return (await findStored(scope, fit, build)) as StoredProposal;
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
