import type { Insertable } from "kysely";
import { instant } from "#database/id";
import type { SignOffTable } from "#database/schema";
import { nextStep } from "~/engineering/next-step/next-step";
import type { NextStep } from "~/engineering/next-step/types";
import { formatLength } from "~/engineering/quantity/format";
import { picometres } from "~/engineering/quantity/length";
import { fitOfHistory } from "~/models/fit-history.server";
import { proposalColumns, rulesOfFit } from "~/models/proposal.server";
import { hashSignOff } from "~/models/sign-proposal.server";
import { type Bench, type DemoBuild, type DemoFit, fitOf, noteHistory } from "./bench";
import type { DemoOilName } from "./oils";
import { criticalAt } from "./wear-model";

/** What is known when the next step of a fit is signed. */
export interface ReviewInHand {
  build: DemoBuild;
  /** The viscosity that the build ran on, Pa·s. */
  viscosity: number;
  /** The oil of the next build, where it is another. */
  nextOil: DemoOilName | undefined;
  at: Date;
}

/** Proposes the next step of a fit by the product's own rules and signs it; the fit aims at what was signed. */
export function reviewFit(bench: Bench, fit: DemoFit, review: ReviewInHand): void {
  const { rows, shop, signer } = bench;
  const { build, at } = review;
  const coating = fit.iterations[0]?.coating ?? null;
  const history = { fit: fitOfHistory(fitOf(fit), { coating }), iterations: [...fit.iterations] };
  const answer = nextStep(history, rulesOfFit(shop.rules, fit.row));
  const proposalId = rows.idAt(at);
  rows.add("proposal", {
    id: proposalId,
    shop_id: shop.id,
    fit_id: fit.row.id,
    build_id: build.id,
    ...proposalColumns(answer, history),
    person_id: signer,
    proposed_at: instant(at),
  });
  const decision = decide(bench, fit, review, answer);
  const signedAt = new Date(at.getTime() + 4 * 60 * 1000);
  const row: Omit<Insertable<SignOffTable>, "content_hash"> = {
    id: rows.idAt(signedAt),
    shop_id: shop.id,
    proposal_id: proposalId,
    fit_id: fit.row.id,
    build_id: build.id,
    ...decision,
    person_id: signer,
    signed_at: instant(signedAt),
  };
  rows.add("sign_off", { ...row, content_hash: hashSignOff(row) });
  noteHistory(bench, signedAt, signer, {
    subjectKind: "sign_off",
    subjectId: row.id,
    what: `signed (${decision.decision}) the next step`,
    from: { proposed: answer.action, targetPm: picometres(answer.target) },
    to: { targetPm: decision.target_pm, reason: decision.reason },
  });
  fit.aim = { pm: decision.target_pm, signOffId: row.id };
}

type Signed = Pick<Insertable<SignOffTable>, "decision" | "target_pm" | "target_typed" | "reason">;

/** The crew chief accepts, but for the story of the engine and where the oil is to change. */
function decide(bench: Bench, fit: DemoFit, review: ReviewInHand, answer: NextStep): Signed {
  const { tooFar } = bench.spec;
  if (tooFar?.afterBuild === review.build.number && tooFar.fit === fit.spec.kind) {
    const target = criticalAt(fit.truth, review.viscosity, false) - tooFar.slopesPast * fit.truth.slope;
    const tenth = 2_540_000;
    const targetPm = Math.max(fit.row.least_pm, Math.round(picometres(target) / tenth) * tenth);
    const typed = `${formatLength(targetPm, "in", 4)} in`;
    return { decision: "change", target_pm: targetPm, target_typed: typed, reason: tooFar.reason };
  }
  if (review.nextOil && answer.action === "close") {
    return {
      decision: "decline",
      target_pm: picometres(answer.target - answer.step),
      target_typed: "",
      reason: `The next build goes to ${review.nextOil}; the clearance holds while the oil changes.`,
    };
  }
  return { decision: "accept", target_pm: picometres(answer.target), target_typed: "", reason: "" };
}
