import { linearRegression } from "simple-statistics";
import { describe, expect, test } from "vitest";
import { fitLine } from "~/engineering/wear/fit-line";
import { weightedTrend } from "~/engineering/wear/trend";
import strd from "./data/nist-strd.json";

/** Certified values have 15 digits; double precision on centred sums keeps 12 of them. */
const tolerance = 1e-12;

function closeTo(got: number | null, certified: number): void {
  expect(got).not.toBeNull();
  expect(Math.abs(got! / certified - 1)).toBeLessThan(tolerance);
}

const pointsOf = ({ x, y }: { x: number[]; y: number[] }) =>
  x.map((value, index) => ({ x: value, y: y[index]! }));

describe("the line of least squares reaches the certified digits of NIST StRD", () => {
  test("Norris: ozone monitors, 36 points", () => {
    const line = fitLine(pointsOf(strd.Norris));
    closeTo(line.slope, strd.Norris.b1);
    closeTo(line.slopeStandardError, strd.Norris.se_b1);
    closeTo(line.interceptStandardError, strd.Norris.se_b0);
    closeTo(line.residualStandardDeviation, strd.Norris.rsd);
    closeTo(line.r2, strd.Norris.r2);
    // The intercept is a difference of numbers near 430 that leaves 0.26: three digits go.
    expect(Math.abs(line.intercept / strd.Norris.b0 - 1)).toBeLessThan(1e-11);
  });

  test.each(["NoInt1", "NoInt2"] as const)("%s: through the origin, r² about zero", (name) => {
    const line = fitLine(pointsOf(strd[name]), { throughOrigin: true });
    expect(line.intercept).toBe(0);
    expect(line.interceptStandardError).toBeNull();
    closeTo(line.slope, strd[name].b1);
    closeTo(line.slopeStandardError, strd[name].se_b1);
    closeTo(line.residualStandardDeviation, strd[name].rsd);
    closeTo(line.r2, strd[name].r2);
  });

  test("a large offset costs no digits: Norris moved by a million keeps its slope", () => {
    const moved = pointsOf(strd.Norris).map(({ x, y }) => ({ x: x + 1e6, y: y + 1e6 }));
    // x + 1e6 itself is rounded to 1e-10 of these x.
    expect(Math.abs(fitLine(moved).slope / strd.Norris.b1 - 1)).toBeLessThan(1e-11);
  });
});

test("slope and intercept agree with an independent library (simple-statistics)", () => {
  const points = [3.1, 4.4, 6.5, 9.8, 12.2].map((x, index) => ({ x, y: [0.4, 0.5, 0.9, 1.1, 1.6][index]! }));
  const { m, b } = linearRegression(points.map(({ x, y }) => [x, y]));
  const { slope, intercept } = fitLine(points);
  expect(slope).toBeCloseTo(m, 12);
  expect(intercept).toBeCloseTo(b, 12);
});

test("the weighted trend with equal weights is the plain line, Norris again", () => {
  const trend = weightedTrend(pointsOf(strd.Norris).map((point) => ({ ...point, uncertainty: 0.3 })));
  closeTo(trend.slope, strd.Norris.b1);
  closeTo(trend.slopeStandardError, strd.Norris.se_b1);
  closeTo(trend.interceptStandardError, strd.Norris.se_b0);
  closeTo(trend.residualStandardDeviation, strd.Norris.rsd);
  // Student's t for 34 degrees of freedom, 97.5 %: 2.032245 (computed with scipy, as all t values here).
  const half = 2.0322445 * strd.Norris.se_b1;
  expect(trend.confidence95!.to).toBeCloseTo(strd.Norris.b1 + half, 9);
});
