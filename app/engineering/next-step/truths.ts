import type { Belief } from "./posterior";
import type { Situation } from "./situation";
import { type LawTable, lawTable, rowOf } from "./wear-law";

/** What is thought possible: a limit with its slope, and all that follows from it. */
export interface Truth {
  weight: number;
  limit: number;
  best: number;
  baseRate: number;
  baseRateDeviation: number;
  law: LawTable;
}

/** Truths of less weight than this share of the heaviest change nothing. */
const negligible = 2e-3;

/** How many truths are tried for what the next build would teach. */
const truthsTried = 16;

/** All positions of a build share this, µm of limit: the oil is a little warmer or cooler from build to build. */
const buildToBuild = 0.5;

/** Above the limit by two slopes and 1.6 times the build scatter, not below the hard limit; µm. */
export function bestClearance(limit: number, slope: number, { scatter, hardLeast }: Situation): number {
  return Math.max(limit + 2 * slope + 1.6 * scatter, hardLeast);
}

/** Every truth of some weight in the belief; their weights add up to 1. */
export function truthsOf(belief: Belief, situation: Situation): Truth[] {
  let heaviest = 0;
  for (const weight of belief.weights) heaviest = Math.max(heaviest, weight);
  const truths: Truth[] = [];
  let total = 0;
  belief.slopes.forEach((slope, j) => {
    const law = lawTable(slope, Math.hypot(situation.scatter, buildToBuild));
    belief.limits.forEach((limit, i) => {
      const at = j * belief.limits.length + i;
      const weight = belief.weights[at]!;
      if (weight < negligible * heaviest) return;
      total += weight;
      const best = bestClearance(limit, slope, situation);
      const baseRate = belief.baseRate[at]!;
      truths.push({ weight, limit, best, baseRate, baseRateDeviation: belief.baseRateDeviation[at]!, law });
    });
  });
  for (const truth of truths) truth.weight /= total;
  return truths;
}

/** Indices evenly through the belief, in order of the best clearance. */
export function evenlyTried(truths: readonly Truth[]): number[] {
  const order = truths.map((_, index) => index);
  order.sort((a, b) => truths[a]!.best - truths[b]!.best || truths[a]!.limit - truths[b]!.limit);
  const tried: number[] = [];
  let passed = 0;
  for (const index of order) {
    passed += truths[index]!.weight;
    while (tried.length < truthsTried && passed >= (tried.length + 0.5) / truthsTried) tried.push(index);
  }
  return tried;
}

/** Chance that any position comes down with grade 3 or worse, and with 4. */
export function damageChances(
  target: number,
  { limit, law }: Truth,
  { positions }: Situation,
): [number, number] {
  const row = rowOf(target - limit);
  return [1 - (1 - law.distressed[row]!) ** positions, 1 - (1 - law.failed[row]!) ** positions];
}
