import { expect, test } from "vitest";
import { Random } from "./random";
import { criticalAt, drawTruth, gradeOfRise, micron, seenGrade, wearRise } from "./wear-model";

const truth = {
  critical: 48 * micron,
  slope: 3 * micron,
  baseRate: 0.1 * micron,
  viscosityShift: 5 * micron,
  coatingBenefit: 3 * micron,
  beddingIn: 2 * micron,
  boreShare: 0.85,
};

// By hand from the model's formulas, rise = 1 + exp((critical − c) / s) and critical = c0 + k ln(µ/µ0) − benefit;
// exact but for rounding of doubles.
test("wear doubles at the critical clearance and rises e-fold below it", () => {
  expect(wearRise(truth, 48 * micron, 48 * micron)).toBeCloseTo(2, 10);
  expect(wearRise(truth, 45 * micron, 48 * micron)).toBeCloseTo(1 + Math.E, 10);
  expect(wearRise(truth, 80 * micron, 48 * micron)).toBeLessThan(1.0001);
});

test("a thinner oil and a coating both let the fit close", () => {
  expect(criticalAt(truth, 0.0135, false) / micron).toBeCloseTo(48, 10);
  expect(criticalAt(truth, 0.0135, true) / micron).toBeCloseTo(45, 10);
  expect(criticalAt(truth, 0.0135 / Math.E, false) / micron).toBeCloseTo(43, 10);
});

test("grades follow the rise, and nobody takes polish for distress", () => {
  expect([1.2, 1.6, 3.5, 9].map(gradeOfRise)).toEqual([1, 2, 3, 4]);
  const random = Random.named("grades of the tests");
  const seen = (grade: number) => new Set(Array.from({ length: 300 }, () => seenGrade(random, grade)));
  expect([...seen(1)].sort()).toEqual([0, 1, 2]);
  expect([...seen(2)].sort()).toEqual([1, 2]);
  expect([...seen(3)]).toEqual([3]);
});

test("dust wears the same parts half as much again", () => {
  const draw = (dusty: boolean) => drawTruth(Random.named("the same parts"), "main", 68e-6, dusty);
  expect(draw(true).baseRate / draw(false).baseRate).toBeCloseTo(1.5, 10);
  expect({ ...draw(true), baseRate: 0 }).toEqual({ ...draw(false), baseRate: 0 });
});
