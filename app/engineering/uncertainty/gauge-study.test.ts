import { expect, test } from "vitest";
import { gaugeStudy } from "./gauge-study";
import type { StudyReading } from "./gauge-study-table";

/** A study whose readings are made of what parts, people, both together and trials add. */
function study(
  make: (part: number, person: number, trial: number) => number,
  [parts, people, trials] = [5, 2, 3],
): StudyReading[] {
  const readings: StudyReading[] = [];
  for (let part = 0; part < parts!; part++)
    for (let person = 0; person < people!; person++)
      for (let trial = 0; trial < trials!; trial++)
        readings.push({
          part: `part ${part}`,
          person: `person ${person}`,
          trial: `${trial}`,
          value: make(part, person, trial),
        });
  return readings;
}

const refused = (code: string, field?: string) => expect.objectContaining({ code, ...(field && { field }) });

test("people who differ by a constant show as reproducibility, and as nothing else", () => {
  // Two people 1 apart have a standard deviation of 1/√2; parts 0, 1, 2, 3, 4 of √2.5.
  const { anova, averageAndRange } = gaugeStudy(study((part, person) => part + person));
  expect(anova.repeatability.standardDeviation).toBe(0);
  expect(anova.reproducibility.standardDeviation).toBeCloseTo(Math.SQRT1_2, 12);
  expect(anova.partToPart.standardDeviation).toBeCloseTo(Math.sqrt(2.5), 12);
  expect(averageAndRange.repeatability.standardDeviation).toBe(0);
  // A range of 1 between two people times K2, which is 1/√2 to four decimals.
  expect(averageAndRange.reproducibility.standardDeviation).toBeCloseTo(Math.SQRT1_2, 4);
});

test("people who read some parts differently keep their interaction", () => {
  const noise = [0.01, -0.01, 0.0];
  const { anova } = gaugeStudy(
    study((part, person, trial) => part + (person === 1 && part % 2 ? 0.5 : 0) + noise[trial]!),
  );
  expect(anova.table.pooled).toBe(false);
  expect(anova.table.interactionProbability).toBeLessThan(1e-6);
  expect(anova.repeatability.standardDeviation).toBeCloseTo(0.01, 12);
  expect(anova.reproducibility.standardDeviation).toBeGreaterThan(0.1);
});

test("variances add up, percentages are of the total, and six deviations of the tolerance", () => {
  const noise = [0.02, -0.01, 0.03, -0.03, 0.01, 0];
  const { anova, averageAndRange } = gaugeStudy(
    study((part, person, trial) => part + 0.1 * person + noise[(part * 7 + person * 3 + trial * 5) % 6]!),
    2,
  );
  for (const result of [anova, averageAndRange]) {
    const { repeatability: ev, reproducibility: av, gauge, partToPart: pv, total } = result;
    expect(Math.hypot(ev.standardDeviation, av.standardDeviation)).toBeCloseTo(gauge.standardDeviation, 12);
    expect(Math.hypot(gauge.standardDeviation, pv.standardDeviation)).toBeCloseTo(
      total.standardDeviation,
      12,
    );
    expect(gauge.percentOfStudy).toBeCloseTo((100 * gauge.standardDeviation) / total.standardDeviation, 12);
    expect(gauge.percentOfTolerance).toBeCloseTo((100 * 6 * gauge.standardDeviation) / 2, 12);
    expect(total.percentOfStudy).toBe(100);
  }
});

test("without a tolerance there is no share of one", () => {
  expect(gaugeStudy(study((part, person) => part + person)).anova.gauge.percentOfTolerance).toBeUndefined();
});

test("a gauge with no scatter at all has no number of categories, and one that sees only itself has none", () => {
  expect(gaugeStudy(study((part) => part)).anova.distinctCategories).toBeNull();
  const onlyNoise = gaugeStudy(study((_part, _person, trial) => trial)).anova;
  expect(onlyNoise.distinctCategories).toBe(0);
  expect(onlyNoise.verdict).toBe("not-good-enough");
});

test("one person alone gives the repeats and says what it does not see", () => {
  const { anova, averageAndRange, cautions } = gaugeStudy(
    study((part, _person, trial) => part + 0.1 * trial, [5, 1, 2]),
  );
  expect(anova.reproducibility.standardDeviation).toBe(0);
  expect(averageAndRange.reproducibility.standardDeviation).toBe(0);
  // Two readings 0.1 apart: a standard deviation of 0.1/√2; by their range, 0.1 × 0.8862.
  expect(anova.repeatability.standardDeviation).toBeCloseTo(0.1 * Math.SQRT1_2, 12);
  expect(averageAndRange.repeatability.standardDeviation).toBeCloseTo(0.08862, 12);
  expect(anova.table.interactionProbability).toBeUndefined();
  expect(cautions).toHaveLength(1);
});

test("the order of the readings does not matter", () => {
  const readings = study((part, person, trial) => part + 0.2 * person + 0.05 * ((part + trial) % 2));
  const one = gaugeStudy(readings).anova;
  const other = gaugeStudy([...readings].reverse()).anova;
  expect(other.gauge.standardDeviation).toBeCloseTo(one.gauge.standardDeviation, 12);
  expect(other.partToPart.standardDeviation).toBeCloseTo(one.partToPart.standardDeviation, 12);
});

test("a study that cannot be reckoned with is refused with what is wrong", () => {
  const sound = study((part, person) => part + person);
  expect(() => gaugeStudy(sound.slice(1))).toThrow(refused("incomplete", "readings"));
  expect(() => gaugeStudy([...sound, sound[0]!])).toThrow(refused("repeated", "readings[30]"));
  expect(() => gaugeStudy([])).toThrow(refused("outside-range"));
  expect(() => gaugeStudy(study((part) => part, [1, 2, 3]))).toThrow(refused("outside-range", "part"));
  expect(() => gaugeStudy(study((part) => part, [5, 2, 1]))).toThrow(refused("outside-range", "trial"));
  expect(() => gaugeStudy(study((part) => part, [21, 2, 2]))).toThrow(refused("outside-range", "part"));
  expect(() => gaugeStudy(study(() => 1))).toThrow(refused("no-variation"));
  expect(() => gaugeStudy(study(() => Number.NaN))).toThrow(refused("not-a-number", "readings[0].value"));
  for (const tolerance of [0, -1, Number.NaN, Number.POSITIVE_INFINITY])
    expect(() => gaugeStudy(sound, tolerance)).toThrow(refused("not-positive", "tolerance"));
});
