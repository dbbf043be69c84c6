import type { History, Rules } from "./types";

/** One tenth of the trade, 0.0001 in, in m. */
export const tenth = 2.54e-6;

/** The shop's rules with every gap filled. */
export interface CompleteRules extends Required<Rules> {}

/**
 * The shop's rules with the defaults where it has none (common practice, no source, but for `lambdaFloor`: below 1 the
 * faces touch, boundary lubrication).
 */
export function completeRules(history: History, rules: Rules): CompleteRules {
  const first = history.iterations.find(({ target }) => target > 0);
  return {
    usual: rules.usual ?? first?.target ?? usualByRuleOfThumb(history.fit.nominal),
    largestStep: rules.largestStep ?? 2 * tenth,
    leastHours: rules.leastHours ?? 2,
    stopGrade: rules.stopGrade ?? 3,
    wearRateRise: rules.wearRateRise ?? 2,
    lambdaFloor: rules.lambdaFloor ?? 1,
    baselineRuns: rules.baselineRuns ?? 1,
    moveOilAndClearance: rules.moveOilAndClearance ?? false,
  };
}

/** 0.001 in per inch of journal and 0.0005 in more (common practice for shells). */
function usualByRuleOfThumb(nominal: number): number {
  return nominal * 0.001 + 5 * tenth;
}

/**
 * What going wrong costs, in rebuilds, as a shop would put it. Every tenth away from the best clearance costs power or
 * life for as long as the fit stays there. A failed engine costs a shop some 50; it is weighed four times that,
 * because the belief about how steep the limit is may be wrong just where failure is decided, and people stand near.
 */
export const costs = { rebuild: 1, distress: 10, failure: 200, perTenth: 5 } as const;
