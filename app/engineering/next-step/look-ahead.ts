import type { Belief } from "./posterior";
import { costs, tenth } from "./rules";
import type { Situation } from "./situation";
import { type LawTable, lawTable, rowOf } from "./wear-law";

/** What a target is expected to cost from here on, in rebuilds, and how likely it brings grade 3 or worse, or 4. */
export interface Prospect {
  target: number;
  expectedCost: number;
  distress: number;
  failure: number;
}

export interface Outlook {
  /** Expected cost of staying where the fit is, without another build. */
  settled: number;
  prospects: Prospect[];
}

/** What is thought possible: a limit with its slope, and all that follows from it. */
interface Truth {
  weight: number;
  limit: number;
  best: number;
  baseRate: number;
  baseRateDeviation: number;
  law: LawTable;
}

const perMicron = costs.perTenth / (tenth * 1e6);

/** Later targets are thought of on a grid of half tenths, µm. */
const targetStep = 1.27;

/** Truths of less weight than this share of the heaviest change nothing. */

/** How many truths are tried for what the next build would teach. */
export const dials3 = { tried: 16, negligible: 2e-3 };

/** All positions of a build share this, µm of limit: the oil is a little warmer or cooler from build to build. */
const buildToBuild = 0.5;

/**
 * One step of look-ahead: for each candidate target, what its build costs at once (a rebuild, the chance of distress
 * and failure) and, after it has taught what it teaches, what the better of staying there and moving on would cost.
 */
export function lookAhead(belief: Belief, situation: Situation, candidates: readonly number[]): Outlook {
  const truths = truthsOf(belief, situation);
  const tried = evenlyTried(truths);
  const later = laterTargets(truths, situation);
  const prospects = candidates.map((target): Prospect => {
    let distress = 0;
    let failure = 0;
    for (const truth of truths) {
      const [toDistress, toFailure] = damageChances(target, truth, situation);
      distress += truth.weight * toDistress;
      failure += truth.weight * toFailure;
    }
    const now = costs.rebuild + harm(distress, failure);
    return {
      target,
      distress,
      failure,
      expectedCost: now + afterwards(target, truths, tried, later, situation),
    };
  });
  const settled = truths.reduce((sum, truth) => sum + truth.weight * staying(situation.current, truth), 0);
  return { settled, prospects };
}

/** Above the limit by two slopes and 1.6 times the build scatter, not below the hard limit; µm. */
export function bestClearance(limit: number, slope: number, { scatter, hardLeast }: Situation): number {
  return Math.max(limit + 2 * slope + 1.6 * scatter, hardLeast);
}

function harm(distress: number, failure: number): number {
  return costs.distress * (distress - failure) + dials.failure * failure;
}
export const dials = { failure: 200 };

function staying(target: number, { best }: Truth): number {
  return perMicron * Math.abs(target - best);
}

/** Chance that any position comes down with grade 3 or worse, and with 4. */
function damageChances(target: number, { limit, law }: Truth, { positions }: Situation): [number, number] {
  const row = rowOf(target - limit);
  return [1 - (1 - law.distressed[row]!) ** positions, 1 - (1 - law.failed[row]!) ** positions];
}

function truthsOf(belief: Belief, situation: Situation): Truth[] {
  let heaviest = 0;
  for (const weight of belief.weights) heaviest = Math.max(heaviest, weight);
  const truths: Truth[] = [];
  let total = 0;
  belief.slopes.forEach((slope, j) => {
    const law = lawTable(slope, Math.hypot(situation.scatter, buildToBuild));
    belief.limits.forEach((limit, i) => {
      const at = j * belief.limits.length + i;
      const weight = belief.weights[at]!;
      if (weight < dials3.negligible * heaviest) return;
      total += weight;
      const best = bestClearance(limit, slope, situation);
      const baseRate = belief.baseRate[at]!;
      truths.push({ weight, limit, best, baseRate, baseRateDeviation: belief.baseRateDeviation[at]!, law });
    });
  });
  for (const truth of truths) truth.weight /= total;
  return truths;
}

/** Evenly through the belief, in order of the best clearance. */
function evenlyTried(truths: readonly Truth[]): number[] {
  const order = truths.map((_, index) => index);
  order.sort((a, b) => truths[a]!.best - truths[b]!.best || truths[a]!.limit - truths[b]!.limit);
  const tried: number[] = [];
  let passed = 0;
  for (const index of order) {
    passed += truths[index]!.weight;
    while (tried.length < dials3.tried && passed >= (tried.length + 0.5) / dials3.tried) tried.push(index);
  }
  return tried;
}

interface LaterTargets {
  targets: number[];
  /** By target, by truth: what getting there and staying there costs. */
  costs: Float64Array[];
}

function laterTargets(truths: readonly Truth[], situation: Situation): LaterTargets {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (const { best } of truths) {
    least = Math.min(least, best);
    most = Math.max(most, best);
  }
  const count = Math.max(1, Math.ceil((Math.min(most + 4, situation.hardMost) - least) / targetStep) + 1);
  const targets = Array.from({ length: count }, (_, index) => least + index * targetStep);
  return {
    targets,
    costs: targets.map((target) =>
      Float64Array.from(truths, (truth) => {
        return staying(target, truth) + harm(...damageChances(target, truth, situation));
      }),
    ),
  };
}

/** What a build at one target would show under each truth. */
interface Signs {
  row: Int32Array;
  wear: Float64Array;
  precision: Float64Array;
  logPrecision: Float64Array;
}

function expectedSigns(target: number, truths: readonly Truth[], situation: Situation): Signs {
  const size = truths.length;
  const signs: Signs = {
    row: new Int32Array(size),
    wear: new Float64Array(size),
    precision: new Float64Array(size),
    logPrecision: new Float64Array(size),
  };
  const gauges = situation.wearUncertainty ** 2 / situation.positions;
  for (let at = 0; at < size; at++) {
    const { limit, law, baseRate, baseRateDeviation } = truths[at]!;
    const row = rowOf(target - limit);
    const exposure = situation.hours * law.rise[row]!;
    signs.row[at] = row;
    signs.wear[at] = baseRate * exposure;
    signs.precision[at] = 1 / (gauges + (baseRateDeviation * exposure) ** 2);
    signs.logPrecision[at] = Math.log(signs.precision[at]!);
  }
  return signs;
}

/** Expected cost after a build at the target has taught what it teaches: of staying, or of moving on once. */
function afterwards(
  target: number,
  truths: readonly Truth[],
  tried: readonly number[],
  later: LaterTargets,
  situation: Situation,
): number {
  const signs = expectedSigns(target, truths, situation);
  const stay = Float64Array.from(truths, (truth) => staying(target, truth));
  const learned = new Float64Array(truths.length);
  let sum = 0;
  for (const truth of tried) {
    const { total, best } = learn(truth, truths, signs, situation.positions, learned);
    let least = dot(learned, stay);
    const middle = Math.round((best - later.targets[0]!) / targetStep);
    const last = Math.min(middle + 4, later.targets.length - 1);
    for (let index = Math.max(0, middle - 1); index <= last; index++) {
      const rebuilds = costs.rebuild * rebuildsBetween(target, later.targets[index]!, situation);
      least = Math.min(least, dot(learned, later.costs[index]!) + rebuilds * total);
    }
    sum += least / total;
  }
  return sum / tried.length;
}

/** Closing goes by the largest step at most; opening goes at once. */
function rebuildsBetween(from: number, to: number, { largestStep }: Situation): number {
  return to < from ? Math.ceil((from - to) / largestStep - 1e-6) : 1;
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let at = 0; at < a.length; at++) sum += a[at]! * b[at]!;
  return sum;
}

/** The weights of all truths after one of them has shown its signs (not normalised), and the best clearance then. */
function learn(
  shown: number,
  truths: readonly Truth[],
  { row, wear, precision, logPrecision }: Signs,
  positions: number,
  learned: Float64Array,
): { total: number; best: number } {
  const { reported } = truths[shown]!.law;
  const start = 4 * row[shown]!;
  const [g1, g2, g3, g4] = [0, 1, 2, 3].map((grade) => positions * reported[start + grade]!) as Grades;
  const worn = wear[shown]!;
  let highest = Number.NEGATIVE_INFINITY;
  for (let at = 0; at < truths.length; at++) {
    const log = truths[at]!.law.logReported;
    const cell = 4 * row[at]!;
    const byGrade = g1 * log[cell]! + g2 * log[cell + 1]! + g3 * log[cell + 2]! + g4 * log[cell + 3]!;
    const value = byGrade + 0.5 * (logPrecision[at]! - (worn - wear[at]!) ** 2 * precision[at]!);
    learned[at] = value;
    if (value > highest) highest = value;
  }
  let total = 0;
  let best = 0;
  for (let at = 0; at < truths.length; at++) {
    const weight = truths[at]!.weight * Math.exp(learned[at]! - highest);
    learned[at] = weight;
    total += weight;
    best += weight * truths[at]!.best;
  }
  return { total, best: best / total };
}

type Grades = [number, number, number, number];
