import tQuantile from "@stdlib/stats-base-dists-t-quantile";
import ttest2 from "@stdlib/stats-ttest2";
import { describe, expect, test } from "vitest";
import { compareBuilds, pairedT, welchT } from "~/engineering/wear/compare-builds";

// Data and results seen on Rosetta Code, "Welch's t-test"; recomputed. Tolerance: the digits printed there.
const welchSets = [
  {
    a: [27.5, 21.0, 19.0, 23.6, 17.0, 17.9, 16.9, 20.1, 21.9, 22.6, 23.1, 19.6, 19.0, 21.7, 21.4],
    b: [27.1, 22.0, 20.8, 23.4, 23.4, 23.5, 25.8, 22.0, 24.8, 20.2, 21.9, 22.1, 22.9, 20.5, 24.4],
    t: -2.4553564,
    df: 24.9885293,
    p: 0.0213780015,
  },
  {
    a: [30.02, 29.99, 30.11, 29.97, 30.01, 29.99],
    b: [29.89, 29.93, 29.72, 29.98, 30.02, 29.98],
    t: 1.959006,
    df: 7.03056,
    p: 0.0907733,
  },
];

describe("Welch's test", () => {
  test.each(welchSets)("gives t $t on $df degrees of freedom", ({ a, b, t, df, p }) => {
    // Ours is the later minus the earlier.
    const result = welchT(b, a);
    expect(result.t).toBeCloseTo(t, 5);
    expect(result.degreesOfFreedom).toBeCloseTo(df, 4);
    expect(result.p).toBeCloseTo(p, 6);
  });

  test.each(welchSets)("agrees with an independent implementation, interval included", ({ a, b }) => {
    const ours = welchT(b, a);
    const theirs = ttest2(a, b);
    expect(ours.t).toBeCloseTo(theirs.statistic, 10);
    expect(ours.p).toBeCloseTo(theirs.pValue, 10);
    expect(ours.confidence95!.from).toBeCloseTo(theirs.ci[0]!, 8);
    expect(ours.confidence95!.to).toBeCloseTo(theirs.ci[1]!, 8);
  });
});

// W. S. Gosset ("Student"), The probable error of a mean, Biometrika 6 (1908): hours of sleep gained by ten patients
// with two drugs; from memory, t = 4.0621 on 9 degrees of freedom, p = 0.00283 (as printed in many textbooks).
test("Student's own pairs: sleep gained by ten patients with two drugs", () => {
  const first = [0.7, -1.6, -0.2, -1.2, -0.1, 3.4, 3.7, 0.8, 0.0, 2.0];
  const second = [1.9, 0.8, 1.1, 0.1, -0.1, 4.4, 5.5, 1.6, 4.6, 3.4];
  const byPatient = (values: number[]) => values.map((value, index) => ({ position: index + 1, value }));
  const result = compareBuilds(byPatient(first), byPatient(second));
  expect(result.method).toBe("paired");
  expect(result.difference).toBeCloseTo(1.58, 12);
  expect(result.t).toBeCloseTo(4.0621, 4);
  expect(result.degreesOfFreedom).toBe(9);
  expect(result.p).toBeCloseTo(0.00283, 5);
  expect(result.confidence95!.from).toBeCloseTo(0.7, 2);
  expect(result.confidence95!.to).toBeCloseTo(2.46, 2);
});

// Computed with scipy (checkvalues 8.2), to the four decimals of printed tables.
test.each([
  [1, 0.975, 12.7062],
  [7, 0.975, 2.3646],
  [9, 0.995, 3.2498],
  [120, 0.95, 1.6577],
])("Student's t for %d degrees of freedom at %d is %d, in the quantile that we use", (df, p, expected) => {
  expect(tQuantile(p, df)).toBeCloseTo(expected, 3);
  // And through our own interval: differences with a standard error of one.
  const count = df + 1;
  const spread = Array.from({ length: count }, (_, index) => (index % 2 === 0 ? 1 : -1));
  if (p === 0.975 && count % 2 === 0) {
    const { confidence95, standardError } = pairedT(spread);
    expect(confidence95!.to / standardError).toBeCloseTo(expected, 3);
  }
});
