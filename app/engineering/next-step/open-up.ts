import { type Choosing, cheapestTarget, stepsBetween } from "./choose-step";
import type { Detriment } from "./detriment";
import { isClean } from "./judged-build";
import type { WeighedBuild } from "./likeness";
import type { Prospect } from "./look-ahead";
import type { Said } from "./words";

export interface Opened {
  action: "open" | "find-cause";
  target: number;
  reasons: Said[];
  considered: Prospect[];
}

/**
 * Opens a fit that went too far: to the last clearance known good; or, where the bracket is wide and the damage mild,
 * somewhere from half-way up to it; or, where nothing is known good, wider by up to two of the largest steps.
 */
export function openUp(
  builds: readonly WeighedBuild[],
  { reasons, severe }: Detriment,
  choosing: Choosing,
): Opened {
  const { current, margins } = choosing;
  const bad = Math.max(current, margins.bracket.knownBad ?? 0);
  const good = lastKnownGood(builds, bad);
  const targets =
    good === null ? widerTargets(bad, choosing, severe) : towards(good, bad, margins.leastStep, severe);
  const chosen = cheapestTarget(targets, choosing);
  if (!chosen) {
    return {
      action: "find-cause",
      target: current,
      reasons: [...reasons, { code: "no-room-to-open", values: { target: current } }],
      considered: [],
    };
  }
  const { target, considered } = chosen;
  const where: Said =
    good === null
      ? { code: "open-nothing-known-good", values: { target } }
      : Math.abs(target - good) < 1e-9
        ? { code: "open-to-known-good", values: { target } }
        : { code: "open-half-way", values: { target, good, bad } };
  return { action: "open", target, reasons: [...reasons, where], considered };
}

/** The closest clean target wider than the one that went too far, on the present oil and coating. */
function lastKnownGood(builds: readonly WeighedBuild[], bad: number): number | null {
  const good = builds
    .filter((build) => build.weight > 0 && build.like && isClean(build))
    .map(({ iteration }) => iteration.target)
    .filter((target) => target > bad + 1e-9);
  return good.length > 0 ? Math.min(...good) : null;
}

function towards(good: number, bad: number, leastStep: number, severe: boolean): number[] {
  const gap = good - bad;
  if (severe || gap < 2 * leastStep) return [good];
  return stepsBetween(Math.max(leastStep, gap / 2), gap).map((step) => bad + step);
}

function widerTargets(bad: number, { margins, history }: Choosing, severe: boolean): number[] {
  const { largestStep, usual } = margins.rules;
  const most = history.fit.hardLimits?.most ?? Number.POSITIVE_INFINITY;
  const least = Math.max(margins.leastStep, severe ? largestStep : largestStep / 2);
  const reach = Math.max(least, Math.min(Math.max(2 * largestStep, usual - bad), most - bad));
  return stepsBetween(least, reach).map((step) => bad + step);
}
