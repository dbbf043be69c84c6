import { baselineRate } from "./baseline";
import { bracketOf } from "./bracket";
import { judgeCause } from "./cause";
import { cautionsOf } from "./cautions";
import { checkHistory } from "./check-history";
import { type Choosing, chooseStep } from "./choose-step";
import { judgeData, uncertaintyAtTarget } from "./data";
import { judgeDetriment } from "./detriment";
import { evidenceOf } from "./evidence";
import { isClean, isDistressed, judgeBuilds } from "./judged-build";
import { chancesOfBest, likelyLimit } from "./likely-limit";
import { type WeighedBuild, weighBuilds } from "./likeness";
import type { Prospect } from "./look-ahead";
import { oilNext, oilWasChanged } from "./one-at-a-time";
import { openUp } from "./open-up";
import { cannotSee, wouldChange } from "./outlook-words";
import { believe } from "./posterior";
import { readingDeviation, usualScatter } from "./readings";
import { type CompleteRules, completeRules, tenth } from "./rules";
import { buildScatter, signsOf } from "./signs";
import type { Situation } from "./situation";
import type { Action, History, NextStep, Rules, Units } from "./types";
import type { Said } from "./words";
import { inSentence } from "./words";

const micron = 1e-6;

/** What was decided, before it is put into words. */
interface Decision {
  action: Action;
  target: number;
  subject?: NextStep["subject"];
  reasons: Said[];
  considered: Prospect[];
}

/**
 * What the next build of a fit should aim at, and why. Pure and deterministic. It looks at the data first, then at
 * causes other than the clearance, at detriment, at the margins, and only then chooses a step: the one of least
 * expected cost by a posterior over the hidden limit, within what all of these allow.
 * It is advice to a qualified builder, and valid for nothing that it lists under `cannotSee`.
 * @param rules the shop's; what is not given takes the defaults in `rules.ts`
 * @param units of the sentences; the numbers beside them are SI
 * @throws EngineeringError where a target, a limit or a rule cannot be
 */
export function nextStep(history: History, rules: Rules = {}, units: Units = "inch"): NextStep {
  checkHistory(history, rules);
  const complete = completeRules(history, rules);
  const builds = weighBuilds(judgeBuilds(history, complete), history.fit);
  const choosing = choosingOf(history, builds, complete);
  const decision = decide(builds, choosing);

  const current = builds.at(-1)?.iteration.target ?? complete.usual;
  const { action, target, subject = "clearance", considered } = decision;
  const answer = { action, subject, step: Math.round((target - current) * 1e12) / 1e12, target };
  const counted = builds.some(({ weight }) => weight > 0);
  const wearSeen = builds.some(
    ({ weight, positions }) => weight > 0 && positions.some(({ wear }) => wear !== null),
  );
  const posterior = counted ? likelyLimit(choosing.belief, choosing.situation, wearSeen) : null;
  const say = (said: Said) => inSentence(said, units);
  return {
    ...answer,
    // Sums over the grid come out a rounding error over one.
    confidence: Math.min(1, Math.max(0, confidenceOf(decision, choosing))),
    reasons: [...decision.reasons, ...supporting(decision, builds, posterior)].map(say),
    cautions: cautionsOf(builds, decision, complete).map(say),
    wouldChange: wouldChange(answer, complete, units),
    cannotSee: [...cannotSee],
    evidence: evidenceOf(builds, {
      bracket: choosing.margins.bracket,
      buildScatter: choosing.situation.scatter * micron,
      baselineRate: baselineRate(builds),
      posterior,
      considered,
    }),
  };
}

/** The order of judgement: data, cause, detriment, what was promised, one thing at a time, then the step. */
function decide(builds: readonly WeighedBuild[], choosing: Choosing): Decision {
  const last = builds.at(-1);
  const { rules } = choosing.margins;
  if (!last) {
    return {
      action: "hold",
      target: rules.usual,
      reasons: [{ code: "start-at-usual", values: { usual: rules.usual } }],
      considered: [],
    };
  }
  // The eye needs no gauge: distress that clearance may explain opens the fit, however poor the readings are.
  const guard = isDistressed(last) ? null : (judgeData(builds, rules) ?? judgeCause(last));
  if (guard) return { action: guard.action, target: guard.target, reasons: [guard.reason], considered: [] };

  const detriment = judgeDetriment(builds, rules);
  if (detriment) return openUp(builds, detriment, choosing);

  const holding = coatingNotProven(builds, choosing) ?? oneThingAtATime(builds, rules);
  if (holding) return holding;

  const chosen = chooseStep(choosing);
  const thinner = chosen.action === "settled" ? oilNext(builds) : null;
  return thinner ? { ...chosen, subject: "oil", reasons: [...chosen.reasons, thinner] } : chosen;
}

function choosingOf(history: History, builds: readonly WeighedBuild[], rules: CompleteRules): Choosing {
  const last = builds.at(-1);
  const scatter = buildScatter(builds);
  const reading = last && last.positions.length > 0 ? readingDeviation(last) : usualScatter;
  const hours = builds.flatMap(({ iteration }) => (iteration.hours ? [iteration.hours] : []));
  const limits = history.fit.hardLimits;
  const situation: Situation = {
    current: (last?.iteration.target ?? rules.usual) / micron,
    positions: Math.max(1, last?.positions.length ?? history.fit.positions ?? 1),
    scatter: scatter / micron,
    wearUncertainty: (Math.SQRT2 * reading) / micron,
    hours: hours.length > 0 ? hours.reduce((sum, one) => sum + one, 0) / hours.length : rules.leastHours,
    largestStep: rules.largestStep / micron,
    hardLeast: (limits?.least ?? 0) / micron,
    hardMost: (limits?.most ?? Number.POSITIVE_INFINITY) / micron,
  };
  const twiceRead = reading / Math.SQRT2;
  const known = (scatter * twiceRead) / Math.hypot(scatter, twiceRead);
  const deviation = Math.hypot(known / micron, 0.4);
  return {
    history,
    belief: believe(signsOf(builds, scatter), rules.usual / micron, deviation),
    situation,
    margins: {
      bracket: bracketOf(builds),
      leastStep: Math.max(last ? uncertaintyAtTarget(builds) : 0, tenth / 2),
      rules,
    },
    current: last?.iteration.target ?? rules.usual,
    marked: last !== undefined && isMarked(last, builds),
    mayStay: last !== undefined && last.weight > 0 && isClean(last),
  };
}

/** Marked in several positions; after a single build already in one, since nothing yet says that it was misgraded. */
function isMarked({ marked, positions }: WeighedBuild, builds: readonly WeighedBuild[]): boolean {
  const counted = builds.filter(({ weight }) => weight > 0).length;
  return marked >= (counted < 2 ? 1 : Math.max(2, positions.length / 4));
}

/** A new coating runs at the usual clearance first, as many clean builds as the rules ask. */
function coatingNotProven(builds: readonly WeighedBuild[], { history, margins }: Choosing): Decision | null {
  const { usual, baselineRuns } = margins.rules;
  const startsNew = history.fit.coating?.isNew || builds.some(({ why }) => why === "other-coating");
  if (!history.fit.coating || !startsNew) return null;
  const clean = builds.filter(
    (build) => build.weight > 0 && isClean(build) && build.iteration.target > usual - tenth / 2,
  ).length;
  if (clean >= baselineRuns) return null;
  const current = builds.at(-1)!.iteration.target;
  const action = Math.abs(usual - current) < 1e-9 ? "hold" : usual > current ? "open" : "close";
  return {
    action,
    target: usual,
    reasons: [{ code: "new-coating-first", values: { usual, clean, runs: baselineRuns } }],
    considered: [],
  };
}

/** The clearance holds after a change of oil, and after oil that ran too hot. */
function oneThingAtATime(builds: readonly WeighedBuild[], rules: CompleteRules): Decision | null {
  const { iteration } = builds.at(-1)!;
  const hold = (reason: Said): Decision => ({
    action: "hold",
    target: iteration.target,
    reasons: [reason],
    considered: [],
  });
  const changed = rules.moveOilAndClearance ? null : oilWasChanged(builds);
  if (changed) return hold({ code: "oil-changed", values: changed });
  return iteration.events.includes("over-temperature")
    ? hold({ code: "over-temperature", values: { build: iteration.build } })
    : null;
}

/** What the evidence says in numbers, where it was the evidence that chose. */
function supporting(
  { action, considered }: Decision,
  builds: readonly WeighedBuild[],
  posterior: NextStep["evidence"]["posterior"],
): Said[] {
  if (!posterior || (considered.length === 0 && action !== "settled")) return [];
  const band = posterior.bands[1]!;
  const clean = builds.filter((build) => build.weight > 0 && build.like && isClean(build));
  const closest = Math.min(...clean.map(({ iteration }) => iteration.target));
  return [
    { code: "limit-band", values: { share: "7 in 10", from: band.from, to: band.to } },
    ...(clean.length > 0
      ? [{ code: "clean-builds" as const, values: { count: clean.length, closest } }]
      : []),
  ];
}

function confidenceOf({ action, target, considered }: Decision, { belief, situation }: Choosing): number {
  const { near } = chancesOfBest(belief, situation, target / micron);
  switch (action) {
    case "close": {
      const prospect = considered.find((one) => Math.abs(one.target * micron - target) < 1e-9);
      return prospect ? 1 - prospect.distress : near;
    }
    case "open":
      return chancesOfBest(belief, situation, situation.current).wider;
    case "settled":
      return near;
    case "hold":
      return considered.length > 0 ? near : 0;
    default:
      return 0;
  }
}
