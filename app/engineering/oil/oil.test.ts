import fc from "fast-check";
import { expect, test } from "vitest";
import { blend } from "./blend";
import { shearedLine, shearedShare } from "./high-shear";
import { gradeOf } from "./j300";
import { fuelDilution, wearMetalRate } from "./used-oil";
import { dynamicViscosity, kinematicViscosity, oilAt, oilFromPoints, viscosityLine } from "./viscosity";
import { viscosityIndex } from "./viscosity-index";
import { doubleLog, fromDoubleLog } from "./walther";

const oils = fc
  .record({
    kv100: fc.double({ min: 2.5, max: 30, noNaN: true }),
    index: fc.double({ min: 1.5, max: 2.1, noNaN: true }),
  })
  .map(({ kv100, index }) => ({ kv100, kv40: kv100 ** index }))
  .filter(({ kv40, kv100 }) => kv40 > 1.5 * kv100);

test("Walther's double logarithm comes back to the viscosity it was made from", () => {
  fc.assert(
    fc.property(fc.double({ min: 0.21, max: 1e5, noNaN: true }), (kinematic) => {
      // The step of 0.0008 at 2 mm²/s is the standard's own, where its correction ends.
      const tolerance = Math.abs(kinematic - 2) < 0.001 ? 1e-3 : 1e-9;
      expect(Math.abs(fromDoubleLog(doubleLog(kinematic)) / kinematic - 1)).toBeLessThan(tolerance);
    }),
  );
});

test("an oil thins as it warms, and keeps the viscosities it was given", () => {
  const temperatures = fc.double({ min: 0, max: 149, noNaN: true });
  fc.assert(
    fc.property(oils, temperatures, (oil, temperatureC) => {
      expect(dynamicViscosity(oil, temperatureC + 1)).toBeLessThan(dynamicViscosity(oil, temperatureC));
      expect(kinematicViscosity(oil, 40)).toBeCloseTo(oil.kv40, 8);
      expect(kinematicViscosity(oil, 100)).toBeCloseTo(oil.kv100, 8);
    }),
  );
});

test("the same line results from any two points on it, in either order", () => {
  const oil = { kv40: 110, kv100: 16.2 };
  const at = viscosityLine(
    { temperatureC: 40, kinematic: oil.kv40 },
    { temperatureC: 100, kinematic: oil.kv100 },
  );
  const again = oilFromPoints(
    { temperatureC: 120, kinematic: at(120) },
    { temperatureC: 60, kinematic: at(60) },
  );
  expect(again.kv40).toBeCloseTo(oil.kv40, 8);
  expect(again.kv100).toBeCloseTo(oil.kv100, 8);
});

test("temperatures far from the measured ones are flagged, impossible ones refused", () => {
  const oil = { kv40: 110, kv100: 16.2 };
  expect(oilAt(oil, 150).outsideRange).toBe(false);
  expect(oilAt(oil, 160).outsideRange).toBe(true);
  expect(oilAt(oil, -10).outsideRange).toBe(true);
  for (const temperatureC of [Number.NaN, Number.POSITIVE_INFINITY, 1e308, -273.15, 300]) {
    expect(() => oilAt(oil, temperatureC)).toThrow(expect.objectContaining({ field: "temperature" }));
  }
});

test.each([
  [{ kv40: 16, kv100: 110 }, "viscosity-order", "kv100"],
  [{ kv40: 16, kv100: 16 }, "viscosity-order", "kv100"],
  [{ kv40: 110, kv100: 0 }, "not-positive", "kv100"],
  [{ kv40: -1, kv100: 10 }, "not-positive", "kv40"],
  [{ kv40: Number.NaN, kv100: 10 }, "not-a-number", "kv40"],
  [{ kv40: 1e308, kv100: 10 }, "outside-range", "kv40"],
  [{ kv40: 110, kv100: 10, density15: 0 }, "not-positive", "density15"],
])("refuses %o", (oil, code, field) => {
  expect(() => oilAt(oil, 90)).toThrow(expect.objectContaining({ code, field }));
});

test("no viscosity index is made up below KV100 2", () => {
  expect(() => viscosityIndex({ kv40: 5, kv100: 1.9 })).toThrow(
    expect.objectContaining({ code: "outside-range" }),
  );
});

test("a sheet that disagrees with its label says where", () => {
  expect(gradeOf({ kv100: 14.5, hths: 0.0042, label: "10W-40" })).toEqual({
    winter: "10W",
    summer: "40",
    disagreements: [],
  });
  expect(gradeOf({ kv100: 10.6, label: "10W-40" })).toEqual({
    winter: "10W",
    summer: "30",
    disagreements: ["The label says 40, but these figures are those of a 30."],
  });
  expect(gradeOf({ kv100: 10.6, hths: 0.0025 }).summer).toBeUndefined();
  expect(gradeOf({ kv100: 10.6, hths: 0.0025 }).disagreements).toEqual([
    "KV100 is that of a 30, but its HTHS of 2.5 mPa·s is below the 2.9 of a 30.",
  ]);
  expect(gradeOf({ kv100: 7, hths: 0.00235, label: "0W-16" })).toMatchObject({
    summer: "16",
    disagreements: [],
  });
  expect(gradeOf({ kv100: 14, label: "0W-5" }).disagreements).toEqual(['"0W-5" is not a grade of SAE J300.']);
  expect(gradeOf({ kv100: 30 }).disagreements[0]).toContain("thicker than any grade");
});

test("shear takes the same share of viscosity at every temperature", () => {
  const oil = { kv40: 110, kv100: 16.2, hths: 0.004 };
  const share = shearedShare(oil);
  expect(share).toBeGreaterThan(0.6);
  expect(share).toBeLessThan(1);
  expect(shearedLine(oil)(150)).toBeCloseTo(0.004, 10);
  expect(shearedLine(oil)(100)).toBeCloseTo(share * dynamicViscosity(oil, 100), 12);
  expect(() => shearedShare({ ...oil, hths: 0.009 })).toThrow(
    expect.objectContaining({ code: "hths-above-unsheared" }),
  );
});

test("a blend lies between its oils, and density goes by volume", () => {
  const thin = { kv40: 62, kv100: 10.6, density15: 850 };
  const thick = { kv40: 160, kv100: 17.8, density15: 880 };
  const half = blend(thin, thick, 0.5);
  expect(half.kv40).toBeGreaterThan(62);
  expect(half.kv40).toBeLessThan((62 + 160) / 2);
  expect(half.density15).toBe(865);
  expect(blend(thin, thick, 1).kv100).toBeCloseTo(10.6, 9);
  expect(() => blend(thin, thick, 1.2)).toThrow(expect.objectContaining({ field: "firstShare" }));
});

test("a loss of viscosity too small to see leaves only a bound on the fuel", () => {
  const seen = fuelDilution({ newViscosity: 16.2, usedViscosity: 13.5 });
  expect(seen.measurable).toBe(true);
  expect(seen.least).toBeLessThan(seen.most);
  const unseen = fuelDilution({ newViscosity: 16.2, usedViscosity: 16.1 });
  expect(unseen).toMatchObject({ measurable: false, least: 0 });
  expect(unseen.most).toBeGreaterThan(0);
});

test("topping up hides metal, and the rate brings it back", () => {
  // Simulated in small steps: 5 ppm/h into 8 litres, 2 litres lost and replaced over 20 hours.
  let ppm = 10;
  for (let step = 0; step < 20_000; step++) ppm += 0.001 * (5 - (2 / 20 / 8) * ppm);
  const rate = wearMetalRate({
    before: { hours: 100, ppm: 10 },
    after: { hours: 120, ppm },
    sumpVolume: 0.008,
    toppedUp: 0.002,
  });
  expect(rate.rate).toBeCloseTo(5, 3);
  expect(rate.withoutTopUps).toBeLessThan(4.5);
});

test("without top-ups the rate is the plain difference", () => {
  const samples = { before: { hours: 2, ppm: 3 }, after: { hours: 8, ppm: 15 }, sumpVolume: 0.008 };
  expect(wearMetalRate(samples)).toEqual({ rate: 2, withoutTopUps: 2 });
  expect(() => wearMetalRate({ ...samples, after: { hours: 1, ppm: 5 } })).toThrow(
    expect.objectContaining({ field: "after.hours" }),
  );
});
