import tQuantileOfStdlib from "@stdlib/stats-base-dists-t-quantile";
import fc from "fast-check";
import { expect, test } from "vitest";
import { incompleteBeta, logGamma } from "./incomplete-beta";
import { tQuantile } from "./student-t";

test("agrees with an independent package over the range of use", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.0005, max: 0.9995, noNaN: true }),
      fc.oneof(fc.integer({ min: 1, max: 40 }), fc.integer({ min: 41, max: 100_000 })),
      (probability, degrees) => {
        const expected = tQuantileOfStdlib(probability, degrees);
        // Of the value, and near the middle, where it is zero, as an absolute difference; over ten thousand degrees of
        // freedom an expansion with an error of that order takes over.
        const tolerance = degrees > 10_000 ? 1e-6 : 1e-8;
        const difference = Math.abs(tQuantile(probability, degrees) - expected);
        expect(difference).toBeLessThan(tolerance * Math.max(1, Math.abs(expected)));
      },
    ),
    { numRuns: 300 },
  );
});

test("infinite degrees of freedom give the normal distribution's value", () => {
  // 1.959963985, 2.575829304: the normal distribution's, in any table; from memory.
  expect(tQuantile(0.975, Number.POSITIVE_INFINITY)).toBeCloseTo(1.959963985, 6);
  expect(tQuantile(0.995, Number.POSITIVE_INFINITY)).toBeCloseTo(2.575829304, 6);
});

test("one degree of freedom is Cauchy's distribution, two has a closed form", () => {
  for (const probability of [0.6, 0.9, 0.975, 0.9995]) {
    expect(tQuantile(probability, 1) / Math.tan(Math.PI * (probability - 0.5))).toBeCloseTo(1, 9);
    const closed = (2 * probability - 1) / Math.sqrt(2 * probability * (1 - probability));
    expect(tQuantile(probability, 2) / closed).toBeCloseTo(1, 9);
  }
});

test("what cannot be answered is refused", () => {
  const refused = expect.objectContaining({ code: "outside-range" });
  for (const probability of [0, 1, -1, Number.NaN]) expect(() => tQuantile(probability, 5)).toThrow(refused);
  for (const degrees of [0, -3, Number.NaN]) expect(() => tQuantile(0.975, degrees)).toThrow(refused);
});

test("the gamma function is the factorial at whole numbers, and √π at a half", () => {
  let factorial = 1;
  for (let n = 1; n < 20; n++) {
    expect(Math.exp(logGamma(n)) / factorial).toBeCloseTo(1, 12);
    factorial *= n;
  }
  expect(Math.exp(logGamma(0.5))).toBeCloseTo(Math.sqrt(Math.PI), 13);
  expect(Math.exp(logGamma(0.25))).toBeCloseTo(3.625609908221908, 12);
});

test("the incomplete beta function meets its closed forms", () => {
  for (const x of [0.01, 0.3, 0.5, 0.77, 0.999]) {
    expect(incompleteBeta(x, 1, 1)).toBeCloseTo(x, 13);
    expect(incompleteBeta(x, 3, 1)).toBeCloseTo(x ** 3, 13);
    expect(incompleteBeta(x, 1, 4)).toBeCloseTo(1 - (1 - x) ** 4, 13);
    expect(incompleteBeta(x, 0.5, 0.5)).toBeCloseTo((2 / Math.PI) * Math.asin(Math.sqrt(x)), 13);
  }
  expect(incompleteBeta(0, 2, 3)).toBe(0);
  expect(incompleteBeta(1, 2, 3)).toBe(1);
});
