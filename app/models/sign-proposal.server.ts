import { createHash } from "node:crypto";
import type { Insertable } from "kysely";
import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { Decision, SignOffTable } from "#database/schema";
import { picometres } from "~/engineering/quantity/length";
import type { Quantity } from "~/engineering/quantity/parse";
import { type Build, listBuilds } from "./build.server";
import type { Fit } from "./fit.server";
import { fitHistory, hashHistory } from "./fit-history.server";
import { recordHistory } from "./history.server";
import { proposalFor, type StoredProposal } from "./proposal.server";
import { conflict, invalid } from "./refusal";
import type { Scope } from "./scope";
import { findSignOff, type SignOff, signedAlready } from "./sign-off.server";

/** A decision to write down. */
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
  build: Pick<Build, "id" | "number">,
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
  // Down to the last reading: a proposal is signed for the evidence it was made from and for no other.
  if (
    proposal.stale ||
    hashHistory(proposal.history) !== hashHistory(await fitHistory(scope, fit, build.number))
  ) {
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
