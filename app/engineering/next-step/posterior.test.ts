import { expect, test } from "vitest";
import { likelyLimit } from "./likely-limit";
import { lookAhead } from "./look-ahead";
import { believe, type Sign } from "./posterior";
import type { Situation } from "./situation";
import { lawTable, normalBelow, rowOf } from "./wear-law";

const situation: Situation = {
  current: 56,
  positions: 8,
  scatter: 1.2,
  wearUncertainty: 1.4,
  hours: 6,
  largestStep: 5.08,
  hardLeast: 25.4,
  hardMost: 81.3,
};

/** Signs without any error, as the law of the simulated shop gives them (next-step.md): limit 48 µm, slope 3 µm. */
function trueSigns(clearances: number[], { limit = 48, slope = 3, baseRate = 0.15 } = {}): Sign[] {
  return clearances.flatMap((clearance) =>
    [-1.5, -0.5, 0.5, 1.5].map((offset) => {
      const rise = 1 + Math.exp((limit - clearance - offset) / slope);
      const grade = rise < 1.5 ? 1 : rise < 3 ? 2 : rise < 8 ? 3 : 4;
      return {
        clearance: clearance + offset,
        grade,
        wear: baseRate * rise * 6,
        wearUncertainty: 1.4,
        hours: 6,
        weight: 1,
      };
    }),
  );
}

test("signs without error, on both sides of a limit, find it", () => {
  const belief = believe(trueSigns([63.5, 58, 53, 50, 48, 46, 44]), 63.5, 0.7);
  const { median, bands, slope, baseRate } = likelyLimit(belief, situation, true);
  // Within a grid step (1 µm) and the width of a grade at this slope.
  expect(Math.abs(median * 1e6 - 48)).toBeLessThan(1.5);
  expect(bands[2]!.from * 1e6).toBeLessThan(48);
  expect(bands[2]!.to * 1e6).toBeGreaterThan(48);
  expect(slope * 1e6).toBeGreaterThan(2);
  expect(slope * 1e6).toBeLessThan(4.2);
  expect(Math.abs(baseRate! * 1e6 - 0.15)).toBeLessThan(0.05);
});

test("clean builds push the limit down and narrow the belief; distress holds it up", () => {
  const band = (signs: Sign[]) => likelyLimit(believe(signs, 63.5, 0.7), situation, true).bands[2]!;
  const one = band(trueSigns([63.5]));
  const three = band(trueSigns([63.5, 58, 53]));
  expect(three.to).toBeLessThan(one.to);
  const distressed = trueSigns([63.5, 53]).map((sign) =>
    sign.clearance < 56 ? { ...sign, grade: 3 } : sign,
  );
  expect(band(distressed).from).toBeGreaterThan(three.to);
});

test("the drawn density covers the belief once, and the bands lie inside one another", () => {
  const { density, bands } = likelyLimit(believe(trueSigns([63.5, 56]), 63.5, 0.7), situation, true);
  const spacing = density[1]!.clearance - density[0]!.clearance;
  expect(density.reduce((sum, point) => sum + point.density * spacing, 0)).toBeCloseTo(1, 9);
  expect(bands[0]!.from).toBeGreaterThanOrEqual(bands[1]!.from);
  expect(bands[2]!.to).toBeGreaterThanOrEqual(bands[1]!.to);
});

test("one mistyped grade among clean ones moves the limit little", () => {
  const clean = trueSigns([63.5, 60]);
  const slip = clean.map((sign, index) => (index === 2 ? { ...sign, grade: 4 } : sign));
  const median = (signs: Sign[]) => likelyLimit(believe(signs, 63.5, 0.7), situation, true).median * 1e6;
  expect(Math.abs(median(slip) - median(clean))).toBeLessThan(6);
});

test("closing costs more in distress the nearer it goes to the limit", () => {
  const belief = believe(trueSigns([63.5, 56]), 63.5, 0.7);
  const { prospects } = lookAhead(belief, situation, [54, 52, 50, 46]);
  const distress = prospects.map((prospect) => prospect.distress);
  expect(distress).toEqual([...distress].sort((a, b) => a - b));
  for (const prospect of prospects) expect(prospect.failure).toBeLessThanOrEqual(prospect.distress);
});

test("where the limit is known, staying at the best clearance costs less than leaving it", () => {
  const belief = believe(trueSigns([63.5, 58, 56, 53, 50, 48, 46, 44]), 63.5, 0.7);
  const { settled, prospects } = lookAhead(belief, situation, [50.9, 61]);
  for (const { expectedCost } of prospects) expect(settled).toBeLessThan(expectedCost);
});

// Abramowitz & Stegun, Handbook of Mathematical Functions, table 26.1 (from memory), to its own 7.5e-8.
test.each([
  [0, 0.5],
  [1, 0.841344746],
  [-1, 0.158655254],
  [2, 0.977249868],
  [-3, 0.001349898],
  [4, 0.999968329],
])("the normal distribution below %d is %d", (z, expected) => {
  expect(Math.abs(normalBelow(z) - expected)).toBeLessThan(1e-7);
});

test("the grades reported at any distance from the limit add up to one", () => {
  const table = lawTable(2.8, 1.2);
  for (const above of [-30, -5, 0, 2, 6, 40]) {
    const row = 4 * rowOf(above);
    const sum = [0, 1, 2, 3].reduce((total, grade) => total + table.reported[row + grade]!, 0);
    expect(sum).toBeCloseTo(1, 12);
  }
});
