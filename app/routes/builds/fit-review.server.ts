import { buildColumns } from "~/engineering/next-step/build-columns";
import { likelyLimit } from "~/engineering/next-step/likely-band";
import type { Iteration, NextStep } from "~/engineering/next-step/types";
import { inUnits } from "~/engineering/next-step/words";
import { clearanceText, dayText, type PageUnits } from "~/engineering/quantity/figures";
import { metres, picometres } from "~/engineering/quantity/length";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { wearOfClearances } from "~/engineering/wear/wear-of-clearances";
import type { Fit } from "~/models/fit.server";
import type { StoredProposal } from "~/models/proposal.server";
import type { PastDecision } from "~/models/sign-off.server";
import { pastDecisions } from "~/routes/engines/past-decisions";

/** A proposal as the review page shows it: its headline, reasons and cautions in the page's units, drawings as numbers. */
export function fitReview(fit: Fit, proposal: StoredProposal, decisions: PastDecision[], units: PageUnits) {
  const { answer, history, signOff } = proposal;
  const build = history.iterations.at(-1);
  return {
    id: fit.id,
    name: fitKind(fit.kind).name,
    units,
    limits: fit.limits_source,
    version: proposal.version,
    day: dayText(proposal.proposedAt),
    stale: proposal.stale,
    headline: headline(answer, units),
    reasons: answer.reasons.map((reason) => inUnits(reason, units)),
    cautions: answer.cautions.map((caution) => inUnits(caution, units)),
    wouldChange: answer.wouldChange,
    cannotSee: answer.cannotSee,
    action: answer.action,
    confidence: answer.confidence,
    measured: build?.positions.filter((position) => position.assembled && position.tornDown).length ?? 0,
    positions: fit.positions.length,
    uncertainty: clearanceText(picometres(answer.evidence.uncertainty), units),
    signOff: signOff && {
      decision: signOff.decision,
      target: clearanceText(signOff.targetPm, units),
      reason: signOff.reason,
      by: signOff.personName,
      day: dayText(signOff.signedAt),
    },
    strip: build && {
      window: windowAround(fit, build.target),
      limits: { least: metres(fit.least_pm), most: metres(fit.most_pm) },
      positions: build.positions.map((position) => ({
        number: position.position,
        assembled: position.assembled?.clearance,
        tornDown: position.tornDown?.clearance,
      })),
      likelyLimit: likelyLimit(answer),
      step: answer.step === 0 ? undefined : { from: answer.target - answer.step, to: answer.target },
    },
    builds: buildColumns(history.iterations, metres(fit.tolerance_pm)),
    wear: build ? wearOfClearances(beforeAfter(build), build.hours) : [],
    decisions: pastDecisions(
      decisions.filter((decision) => decision.number < proposal.buildNumber),
      history.iterations,
      units,
    ),
  };
}

export type FitReviewData = ReturnType<typeof fitReview>;

function windowAround(fit: Fit, aim: number) {
  const tolerance = metres(fit.tolerance_pm);
  return { least: aim - tolerance, aim, most: aim + tolerance };
}

function beforeAfter(build: Iteration) {
  return build.positions.flatMap(({ position, assembled, tornDown, uncertainty }) =>
    assembled && tornDown && uncertainty
      ? [{ position, assembled: assembled.clearance, tornDown: tornDown.clearance, uncertainty }]
      : [],
  );
}

const verbs: Record<NextStep["action"], string> = {
  close: "Close",
  open: "Open",
  hold: "Hold",
  settled: "Settled",
  "measure-again": "Measure again",
  "find-cause": "Find the cause first",
};

/** The proposal in a line: "Close by .00010 to .00210 in". */
function headline(answer: NextStep, units: PageUnits) {
  const target = clearanceText(picometres(answer.target), units);
  const step = clearanceText(picometres(Math.abs(answer.step)), units);
  return {
    verb: verbs[answer.action],
    step: answer.step === 0 ? "" : step,
    target,
    oil: answer.subject === "oil",
  };
}
