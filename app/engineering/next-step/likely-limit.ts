import type { Belief } from "./posterior";
import { tenth } from "./rules";
import type { Situation } from "./situation";
import { bestClearance } from "./truths";
import type { Posterior } from "./types";

const micron = 1e-6;

/** The bands that are told: even chance, 7 in 10, 9 in 10. */
const shares = [0.5, 0.7, 0.9] as const;

/** The belief as people see it: the band in which the limit probably lies, in m. */
export function likelyLimit(belief: Belief, situation: Situation, wearSeen: boolean): Posterior {
  const { limits } = belief;
  const marginal = limits.map((_, i) => sumOver(belief, (j) => belief.weights[j * limits.length + i]!));
  const spacing = (limits[1]! - limits[0]!) * micron;
  const at = (share: number) => quantile(limits, marginal, share, spacing / micron) * micron;
  let slope = 0;
  let baseRate = 0;
  const bests: { value: number; weight: number }[] = [];
  belief.slopes.forEach((one, j) => {
    limits.forEach((limit, i) => {
      const cell = j * limits.length + i;
      const weight = belief.weights[cell]!;
      slope += weight * one;
      baseRate += weight * belief.baseRate[cell]!;
      bests.push({ value: bestClearance(limit, one, situation), weight });
    });
  });
  bests.sort((a, b) => a.value - b.value);
  return {
    median: at(0.5),
    bands: shares.map((share) => ({ share, from: at((1 - share) / 2), to: at((1 + share) / 2) })),
    density: limits.map((limit, i) => ({ clearance: limit * micron, density: marginal[i]! / spacing })),
    slope: slope * micron,
    baseRate: wearSeen ? baseRate * micron : null,
    best:
      quantile(
        bests.map(({ value }) => value),
        bests.map(({ weight }) => weight),
        0.5,
        0,
      ) * micron,
  };
}

/** Chance that the best clearance is wider than a target, and that it lies within a tenth of it; target in µm. */
export function chancesOfBest(belief: Belief, situation: Situation, target: number) {
  let wider = 0;
  let near = 0;
  belief.slopes.forEach((slope, j) => {
    belief.limits.forEach((limit, i) => {
      const weight = belief.weights[j * belief.limits.length + i]!;
      const best = bestClearance(limit, slope, situation);
      if (best > target) wider += weight;
      if (Math.abs(best - target) <= tenth / micron) near += weight;
    });
  });
  return { wider, near };
}

function sumOver({ slopes }: Belief, of: (slope: number) => number): number {
  return slopes.reduce((sum, _, j) => sum + of(j), 0);
}

/** The value below which a share of the weight lies; each weight is spread evenly over `width` around its value. */
function quantile(
  values: readonly number[],
  weights: readonly number[],
  share: number,
  width: number,
): number {
  let passed = 0;
  for (let i = 0; i < values.length; i++) {
    const weight = weights[i]!;
    if (passed + weight >= share && weight > 0) {
      return values[i]! + ((share - passed) / weight - 0.5) * width;
    }
    passed += weight;
  }
  return values.at(-1)!;
}
