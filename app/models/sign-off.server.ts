import { database } from "#database/connection";
import type { Decision } from "#database/schema";
import { conflict } from "./refusal";
import type { Scope } from "./scope";

/** What the crew chief decided on a proposal. */
export interface SignOff {
  decision: Decision;
  targetPm: number;
  reason: string;
  personName: string;
  signedAt: string;
}

/** A decision is made once: said to whoever comes second. */
export function signedAlready(signOff: SignOff) {
  return conflict("already-signed", `${signOff.personName} has signed this already (${signOff.decision}).`);
}

/** The decision on a proposal, where it is signed. */
export async function findSignOff(scope: Scope, proposalId: string): Promise<SignOff | undefined> {
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
