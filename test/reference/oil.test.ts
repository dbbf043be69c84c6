import { describe, expect, test } from "vitest";
import { blendViscosity } from "~/engineering/oil/blend";
import { densityAt } from "~/engineering/oil/density";
import { gradeOf } from "~/engineering/oil/j300";
import { fuelDilution } from "~/engineering/oil/used-oil";
import { kinematicViscosity, viscosityLine } from "~/engineering/oil/viscosity";
import { viscosityIndex } from "~/engineering/oil/viscosity-index";

const away = (value: number, published: number) => Math.abs(value / published - 1);

// Seen: a solved example of ASTM D341 at ar.scribd.com/document/361017004: 32 mm²/s at 40 °C and 5.4 at 100 °C make
// 8.5 at 80 °C, printed with two figures (0.6 % of rounding).
test("a worked example of ASTM D341 between its two points", () => {
  const at = viscosityLine({ temperatureC: 40, kinematic: 32 }, { temperatureC: 100, kinematic: 5.4 });
  expect(away(at(80), 8.5)).toBeLessThan(0.006);
});

// Computed for this collection with scipy from the same formula, six figures printed: 1e-5 of rounding.
test.each([
  [100, 11, { 0: 1861.39, 20: 344.41, 60: 39.497, 80: 19.3225, 120: 6.9874, 150: 4.0911 }],
  [110, 14.5, { 80: 24.6455, 120: 9.3901, 150: 5.5771 }],
  [62, 10.6, { 80: 16.9077, 150: 4.5201 }],
])("ASTM D341 for an oil of KV40 %d and KV100 %d, calculated elsewhere", (kv40, kv100, expected) => {
  for (const [temperatureC, kinematic] of Object.entries(expected)) {
    expect(away(kinematicViscosity({ kv40, kv100 }, Number(temperatureC)), kinematic)).toBeLessThan(2e-5);
  }
});

// Seen: examples of ASTM D2270-10(2016) as the tests of a public program carry them (CalebBell/chemicals), whole numbers.
test.each([
  [73.3, 8.86, 92, "A"],
  [73.5, 8.86, 92, "A"],
  [22.83, 5.05, 156, "B"],
  [1000, 100, 193, "B"],
])("ASTM D2270 for KV40 %d and KV100 %d gives a viscosity index of %d", (kv40, kv100, index, procedure) => {
  expect(viscosityIndex({ kv40, kv100 })).toMatchObject({ index, procedure });
});

// Recalled: the quadratic fits of L and H over KV100 that older editions of D2270 print; they follow its table to
// 0.113 %. An oil whose KV40 is such an L or H has index 0 or 100, within what 0.113 % of KV40 is worth.
test.each([
  [12, 15, 0.7672, 10.7972, -38.18, 0.20073, 8.4658, -22.49],
  [22, 28, 0.91413, 7.4759, -21.82, 0.20323, 9.1267, -34.23],
  [55, 70, 0.85921, 11.1009, -83.19, 0.1713, 11.368, -76.94],
])(
  "ASTM D2270's table between KV100 %d and %d follows the standard's polynomials",
  (from, to, a, b, c, d, e, f) => {
    for (let kv100 = from; kv100 < to; kv100 += 0.37) {
      const low = (a * kv100 + b) * kv100 + c;
      const high = (d * kv100 + e) * kv100 + f;
      const worth = (100 * 0.00113 * low) / (low - high);
      expect(Math.abs(viscosityIndex({ kv40: low, kv100 }).unrounded)).toBeLessThan(worth);
      expect(Math.abs(viscosityIndex({ kv40: high, kv100 }).unrounded - 100)).toBeLessThan(worth);
    }
  },
);

// Computed for this collection with the form and constant of API MPMS 11.1 / ASTM D1250, two decimals printed.
test("density of an oil of 870 kg/m³ from 15 to 150 °C", () => {
  const expected = {
    15: 870,
    20: 866.86,
    40: 854.22,
    60: 841.49,
    80: 828.68,
    100: 815.78,
    120: 802.82,
    150: 783.28,
  };
  for (const [temperatureC, density] of Object.entries(expected)) {
    expect(Math.abs(densityAt(870, Number(temperatureC)) - density)).toBeLessThan(0.006);
  }
});

// Seen: limits of SAE J300 (January 2015) in secondary pages. At a limit the oil is in the grade, at the next one it is not.
describe("SAE J300", () => {
  test.each([
    ["8", 4, 1.7],
    ["12", 5, 2.0],
    ["16", 6.1, 2.3],
    ["20", 6.9, 2.6],
    ["30", 9.3, 2.9],
    ["50", 16.3, 3.7],
    ["60", 21.9, 3.7],
  ])("a %s begins at KV100 %d and HTHS %d", (summer, kv100, hths) => {
    expect(gradeOf({ kv100, hths: hths / 1e3 })).toEqual({ summer, disagreements: [] });
    expect(gradeOf({ kv100: kv100 - 0.01, hths: hths / 1e3 }).summer).not.toBe(summer);
    expect(gradeOf({ kv100, hths: hths / 1e3 - 1e-5 }).summer).not.toBe(summer);
  });

  test.each([
    ["8", 6.1],
    ["12", 7.1],
    ["16", 8.2],
    ["20", 9.3],
    ["30", 12.5],
    ["40", 16.3],
    ["50", 21.9],
    ["60", 26.1],
  ])("a %s ends below KV100 %d", (grade, kv100) => {
    expect(gradeOf({ kv100, label: grade }).summer).not.toBe(grade);
    expect(gradeOf({ kv100: kv100 - 0.01, label: grade })).toEqual({ summer: grade, disagreements: [] });
  });

  test.each([
    ["0W-40", 3.5],
    ["5W-40", 3.5],
    ["10W-40", 3.5],
    ["15W-40", 3.7],
    ["20W-40", 3.7],
    ["25W-40", 3.7],
    ["SAE 40", 3.7],
  ])("a %s needs an HTHS of %d mPa·s", (label, hths) => {
    expect(gradeOf({ kv100: 14, hths: hths / 1e3, label }).disagreements).toEqual([]);
    expect(gradeOf({ kv100: 14, hths: hths / 1e3 - 1e-5, label }).summer).toBeUndefined();
  });

  test.each([
    ["0W", 3.8],
    ["5W", 3.8],
    ["10W", 4.1],
    ["15W", 5.6],
    ["20W", 5.6],
    ["25W", 9.3],
  ])("a %s needs a KV100 of %d", (label, kv100) => {
    expect(gradeOf({ kv100, label })).toEqual({ winter: label, disagreements: [] });
    expect(gradeOf({ kv100: kv100 - 0.01, label })).toMatchObject({ disagreements: [expect.any(String)] });
  });
});

// Seen: R. E. Maples, Petroleum Refinery Process Economics (2000), as quoted: 14.534 ln ln(ν + 0.8) + 10.975 mixed by
// share. Another constant than ASTM D7152's 0.7; for engine oils the two agree within 0.5 %.
test("two-oil blends against the refiners' blending index", () => {
  const index = (kinematic: number) => 14.534 * Math.log(Math.log(kinematic + 0.8)) + 10.975;
  const viscosity = (value: number) => Math.exp(Math.exp((value - 10.975) / 14.534)) - 0.8;
  for (const [first, second] of [
    [5, 20],
    [10.6, 17.8],
    [62, 160],
  ] as const) {
    for (const share of [0, 0.25, 0.5, 0.6, 1]) {
      const blended = viscosity(share * index(first) + (1 - share) * index(second));
      expect(away(blendViscosity(first, second, share), blended)).toBeLessThan(0.005);
    }
  }
});

// Seen: a dilution chart (visgage.com, fuel of 3.0 mm²/s at 40 °C): 160 mm²/s down to 137 is 3 %. The mixing rules
// bound it from both sides.
test("fuel dilution against a published chart", () => {
  const { least, most } = fuelDilution({ newViscosity: 160, usedViscosity: 137, fuelViscosity: 3 });
  expect(least).toBeLessThan(0.03);
  expect(most).toBeGreaterThan(0.03);
  expect(most).toBeLessThan(0.04);
  expect(least).toBeGreaterThan(0.02);
});
