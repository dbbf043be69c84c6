import { expect, test } from "vitest";
import { gaugeStudy, type StudyResult } from "~/engineering/uncertainty/gauge-study";
import { rangeFactors } from "~/engineering/uncertainty/gauge-study-range";
import study from "./data/gauge-study.json";

const people = ["A", "B", "C"];
const readings = study.values.flatMap((byPart, person) =>
  byPart.flatMap((trials, part) =>
    trials.map((value, trial) => ({
      person: people[person]!,
      part: String(part + 1),
      trial: String(trial + 1),
      value,
    })),
  ),
);
const result = gaugeStudy(readings);

const deviations = ({ repeatability, reproducibility, gauge, partToPart, total }: StudyResult) => ({
  repeatability: repeatability.standardDeviation,
  reproducibility: reproducibility.standardDeviation,
  gauge: gauge.standardDeviation,
  partToPart: partToPart.standardDeviation,
  total: total.standardDeviation,
});

// AIAG, Measurement Systems Analysis, 4th ed., the worked study. Printed results of the average-and-range method, from
// memory: they carry rounded averages, so 0.02 %.
test("the worked study by averages and ranges", () => {
  const found = deviations(result.averageAndRange);
  const printed = {
    repeatability: 0.20188,
    reproducibility: 0.22963,
    gauge: 0.30575,
    partToPart: 1.10456,
    total: 1.1461,
  };
  for (const [what, value] of Object.entries(printed)) {
    expect(found[what as keyof typeof found] / value, what).toBeGreaterThan(0.9998);
    expect(found[what as keyof typeof found] / value, what).toBeLessThan(1.0002);
  }
  expect(result.averageAndRange.gauge.percentOfStudy).toBeCloseTo(26.68, 2);
  expect(result.averageAndRange.distinctCategories).toBe(5);
  expect(result.averageAndRange.verdict).toBe("conditional");
});

// The same data by analysis of variance: sums of squares, F's probability and components seen in a worked copy, to the
// figures printed there (both together from rounded components); the interaction is pooled, as its probability is over 0.25.
test("the worked study by analysis of variance", () => {
  const { table } = result.anova;
  expect(table.people).toEqual({ sumOfSquares: expect.closeTo(3.167262, 6), degreesOfFreedom: 2 });
  expect(table.parts).toEqual({ sumOfSquares: expect.closeTo(88.361934, 6), degreesOfFreedom: 9 });
  expect(table.interaction).toEqual({ sumOfSquares: expect.closeTo(0.358982, 6), degreesOfFreedom: 18 });
  expect(table.repeats).toEqual({ sumOfSquares: expect.closeTo(2.758933, 6), degreesOfFreedom: 60 });
  expect(table.interactionProbability).toBeCloseTo(0.9741, 4);
  expect(table.pooled).toBe(true);
  const found = deviations(result.anova);
  expect(found.repeatability).toBeCloseTo(0.199933, 6);
  expect(found.reproducibility).toBeCloseTo(0.226838, 6);
  expect(found.gauge).toBeCloseTo(0.302373, 5);
  expect(found.partToPart).toBeCloseTo(1.042327, 6);
  expect(found.total).toBeCloseTo(1.0853, 4);
  expect(result.anova.gauge.percentOfStudy).toBeCloseTo(27.86, 2);
  expect(result.anova.distinctCategories).toBe(4);
});

// K1 for 3 trials, K2 for 3 people, K3 for 10 parts, as AIAG's worked study has them.
test("the printed factors", () => {
  expect(rangeFactors.ofTrials(3)).toBe(0.5908);
  expect(rangeFactors.ofPeopleOrParts(3)).toBe(0.5231);
  expect(rangeFactors.ofPeopleOrParts(10)).toBe(0.3146);
});

// The range R of n normal values: E[R] = d2, E[R²] = d2*², by integrating their density; factors have four decimals.
test.each([2, 3, 4, 5, 7, 10, 15, 20])(
  "the factors for %d values follow from the normal distribution",
  (count) => {
    const { mean, meanSquare } = rangeMoments(count);
    if (count <= 10) expect(rangeFactors.ofTrials(count)).toBeCloseTo(1 / mean, 4);
    expect(rangeFactors.ofPeopleOrParts(count)).toBeCloseTo(1 / Math.sqrt(meanSquare), 4);
  },
);

/**
 * Moments of the range from its density, n (n − 1) ∫ φ(x) φ(x + r) (Φ(x + r) − Φ(x))^(n − 2) dx, by the trapezium rule;
 * its step leaves 2e-5, at ranges near nothing.
 */
function rangeMoments(count: number): { mean: number; meanSquare: number } {
  const step = 0.02;
  const half = 350;
  const at = (index: number) => (index - half) * step;
  const density = Array.from(
    { length: 2 * half + 1 },
    (_, i) => Math.exp(-(at(i) ** 2) / 2) / Math.sqrt(2 * Math.PI),
  );
  const below: number[] = [0];
  // Simpson's rule on each step: the distribution function to about 1e-9.
  for (let i = 1; i < density.length; i++) {
    const middle = Math.exp(-((at(i) - step / 2) ** 2) / 2) / Math.sqrt(2 * Math.PI);
    below.push(below[i - 1]! + (step / 6) * (density[i - 1]! + 4 * middle + density[i]!));
  }
  let mean = 0;
  let meanSquare = 0;
  for (let low = 0; low < density.length; low++) {
    for (let high = low + 1; high < density.length; high++) {
      const range = (high - low) * step;
      const between = (below[high]! - below[low]!) ** (count - 2);
      const weight = count * (count - 1) * density[low]! * density[high]! * between * step * step;
      mean += range * weight;
      meanSquare += range * range * weight;
    }
  }
  return { mean, meanSquare };
}
