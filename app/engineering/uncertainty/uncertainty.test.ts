import fc from "fast-check";
import { expect, test } from "vitest";
import { combine } from "./budget";
import { type ClearanceUncertaintyInput, clearanceUncertainty, unknownGauge } from "./clearance-uncertainty";
import { pooled, repeatabilityOf } from "./repeatability";

const refused = (code: string, field: string) => expect.objectContaining({ code, field });

const gauge = { resolution: 1e-6, calibration: 0.8e-6, repeatability: 0.5e-6 };
const steel = { expansion: 12.3e-6, uncertainty: 0.2e-6 };
const aluminium = { expansion: 21.5e-6, uncertainty: 0.4e-6 };
const input: ClearanceUncertaintyInput = {
  boreGauge: gauge,
  journalGauge: gauge,
  method: "absolute",
  nominal: 53.34e-3,
};

test("two gauges without temperatures, by hand", () => {
  // Variances in µm²: resolution 2 × (0.5² / 3), calibration 2 × 0.64, repeats 2 × 0.25.
  const { combined, budget } = clearanceUncertainty(input);
  expect(combined * 1e6).toBeCloseTo(Math.sqrt(2 * (0.25 / 3 + 0.64 + 0.25)), 12);
  expect(budget.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
});

test("measuring against the journal's own setting cancels the micrometer's calibration, and only that", () => {
  const absolute = clearanceUncertainty(input);
  const comparative = clearanceUncertainty({ ...input, method: "comparative" });
  expect(absolute.combined ** 2 - comparative.combined ** 2).toBeCloseTo(gauge.calibration ** 2, 18);
  expect(comparative.budget.map(({ what }) => what)).not.toContain("calibration of the journal gauge");
  const micrometerOff = { ...gauge, calibration: 50e-6 };
  expect(
    clearanceUncertainty({ ...input, journalGauge: micrometerOff, method: "comparative" }).expanded,
  ).toBe(comparative.expanded);
});

test("a mean of readings repeats better by their square root, and calibration does not", () => {
  const line = (readings: { bore: number; journal: number }) =>
    clearanceUncertainty({ ...input, readings }).budget.find(
      ({ what }) => what === "repeatability of the journal gauge",
    )!.uncertainty;
  expect(line({ bore: 1, journal: 4 })).toBeCloseTo(line({ bore: 1, journal: 1 }) / 2, 15);
});

test("the temperature counts with the difference of the expansions, and more where nobody took it", () => {
  const of = (what: string, more: Partial<ClearanceUncertaintyInput>) =>
    clearanceUncertainty({ ...input, ...more }).budget.find((line) => line.what === what)?.uncertainty ?? 0;
  const parts = { bore: aluminium, journal: steel };
  const common = "temperature of both parts";
  // 53.34 mm × 9.2e-6 × 0.5 / √3 = 0.1417 µm; ± 5 °C is ten times that.
  expect(of(common, { ...parts, temperatureOffset: 3 }) * 1e6).toBeCloseTo(0.1417, 4);
  expect(of(common, parts)).toBeCloseTo(10 * of(common, { ...parts, temperatureOffset: 3 }), 15);
  expect(of(common, { bore: steel, journal: steel })).toBe(0);
  // 53.34 mm × 3 °C × 0.4e-6 = 0.064 µm, whichever side of 20 °C.
  for (const temperatureOffset of [3, -3])
    expect(of("expansion of the bore", { ...parts, temperatureOffset }) * 1e6).toBeCloseTo(0.064008, 6);
});

test("the day's repeats refine what the gauge's study says, and two that agree do not make it perfect", () => {
  const bore = (repeats: number[][]) =>
    clearanceUncertainty({ ...input, repeats: { bore: repeats, journal: [] } }).budget.find(
      ({ what }) => what === "repeatability of the bore gauge",
    )!;
  expect(bore([]).uncertainty).toBe(gauge.repeatability);
  const agreeing = bore([[0.05, 0.05]]);
  expect(agreeing.uncertainty).toBeCloseTo(0.5e-6 * Math.sqrt(10 / 11), 15);
  expect(agreeing.degreesOfFreedom).toBe(11);
  expect(bore([[0.05, 0.050003]]).uncertainty).toBeGreaterThan(gauge.repeatability);
});

test("scatter from repeats, by hand", () => {
  // 1, 2, 3 has squares 2 with 2 degrees of freedom; 5, 7 has 2 with 1: √(4 / 3).
  expect(repeatabilityOf([[1, 2, 3], [5, 7], [9]])).toEqual({
    standardDeviation: Math.sqrt(4 / 3),
    degreesOfFreedom: 3,
  });
  expect(repeatabilityOf([[1], []])).toBeUndefined();
  expect(
    pooled({ standardDeviation: 1, degreesOfFreedom: 1 }, { standardDeviation: 2, degreesOfFreedom: 2 }),
  ).toEqual({ standardDeviation: Math.sqrt(3), degreesOfFreedom: 3 });
});

test("figures that no gauge or part has are refused", () => {
  expect(() => clearanceUncertainty({ ...input, nominal: 0 })).toThrow(refused("not-positive", "nominal"));
  expect(() => clearanceUncertainty({ ...input, boreGauge: { ...gauge, resolution: -1 } })).toThrow(
    refused("negative", "boreGauge.resolution"),
  );
  expect(() =>
    clearanceUncertainty({ ...input, journalGauge: { ...gauge, repeatability: Number.NaN } }),
  ).toThrow(refused("negative", "journalGauge.repeatability"));
  expect(() => clearanceUncertainty({ ...input, temperatureOffset: Number.NaN })).toThrow(
    refused("not-a-number", "temperatureOffset"),
  );
  expect(() => combine([{ what: "drift", uncertainty: -1 }])).toThrow(refused("not-a-number", "drift"));
  expect(() => combine([{ what: "drift", uncertainty: 1, degreesOfFreedom: 0 }])).toThrow(
    refused("outside-range", "drift"),
  );
});

test("a budget is never narrower than any of its lines, never a NaN, and nothing in it gives nothing", () => {
  fc.assert(
    fc.property(
      fc.array(
        fc.record({
          what: fc.constant("line"),
          uncertainty: fc.double({ min: 0, max: 1e-3, noNaN: true }),
          degreesOfFreedom: fc.integer({ min: 1, max: 1000 }),
        }),
        { maxLength: 8 },
      ),
      (lines) => {
        const { combined, expanded, coverage, effectiveDegreesOfFreedom = 1 } = combine(lines);
        for (const { uncertainty } of lines)
          expect(combined).toBeGreaterThanOrEqual(uncertainty * (1 - 1e-12));
        expect(coverage).toBeGreaterThan(1.9599);
        expect(Number.isFinite(expanded)).toBe(true);
        expect(effectiveDegreesOfFreedom).toBeGreaterThanOrEqual(1 - 1e-9);
      },
    ),
    { numRuns: 200 },
  );
  expect(combine([])).toMatchObject({ combined: 0, expanded: 0 });
});

test("an undescribed gauge is worse than a tenths gauge that somebody checked", () => {
  const unknown = clearanceUncertainty({ ...input, boreGauge: unknownGauge, journalGauge: unknownGauge });
  expect(unknown.expanded).toBeGreaterThan(clearanceUncertainty(input).expanded);
});
