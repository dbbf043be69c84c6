import { expectedSigns, learn } from "./lesson";
import type { Belief } from "./posterior";
import { costs, tenth } from "./rules";
import type { Situation } from "./situation";
import { damageChances, evenlyTried, type Truth, truthsOf } from "./truths";

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

const perMicron = costs.perTenth / (tenth * 1e6);

/** Later targets are thought of on a grid of half tenths, µm. */
const targetStep = 1.27;

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

function harm(distress: number, failure: number): number {
  return costs.distress * (distress - failure) + costs.failure * failure;
}

function staying(target: number, { best }: Truth): number {
  return perMicron * Math.abs(target - best);
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
