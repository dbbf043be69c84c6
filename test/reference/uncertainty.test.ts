import { expect, test } from "vitest";
import { combine, rectangular } from "~/engineering/uncertainty/budget";

// JCGM 100:2008, annex H.1, calibration of an end gauge of 50 mm: inputs of table H.1, nm. The budget and uc = 32 nm
// were seen in a public worked copy; the printed U99 = 93 nm is recalled (unrounded inputs give 92.5).
test("the end gauge of GUM H.1", () => {
  const length = 50_000_623;
  const budget = [
    { what: "calibration of the standard", uncertainty: 25, degreesOfFreedom: 18 },
    { what: "measured difference", uncertainty: Math.hypot(5.8, 3.9, 6.7), degreesOfFreedom: 25.45 },
    {
      what: "difference of the expansions, half-width 1e-6 at θ −0.1 °C",
      uncertainty: length * 0.1 * rectangular(1e-6),
      degreesOfFreedom: 50,
    },
    {
      what: "difference of the temperatures, half-width 0.05 °C",
      uncertainty: length * 11.5e-6 * rectangular(0.05),
      degreesOfFreedom: 2,
    },
  ];
  const at99 = combine(budget, 0.99);
  expect(at99.combined).toBeCloseTo(31.66, 1);
  // Printed: effective degrees of freedom 16 (truncated), coverage factor 2.92.
  expect(Math.floor(at99.effectiveDegreesOfFreedom!)).toBe(16);
  expect(at99.coverage).toBeCloseTo(2.92, 2);
  expect(at99.expanded).toBeCloseTo(92.5, 0);
  expect(combine(budget).coverage).toBeCloseTo(2.12, 2);
});

// JCGM 100:2008, table G.2 (from memory): t for 95 % and 99 %, two decimals.
test.each([
  [1, 12.71, 63.66],
  [2, 4.3, 9.92],
  [5, 2.57, 4.03],
  [10, 2.23, 3.17],
  [16, 2.12, 2.92],
  [30, 2.04, 2.75],
  [100, 1.984, 2.626],
])("with %d degrees of freedom, k is %d for 95 %% and %d for 99 %%", (degreesOfFreedom, k95, k99) => {
  const lines = [{ what: "repeats", uncertainty: 1, degreesOfFreedom }];
  expect(combine(lines).coverage).toBeCloseTo(k95, 2);
  expect(combine(lines, 0.99).coverage).toBeCloseTo(k99, 2);
});

// JCGM 100:2008, 4.3.7 and G.2b by hand: a half-width of 3 is √3; two equal lines of 4 degrees of freedom have 8.
test("rectangular bounds and equal lines by hand", () => {
  expect(rectangular(3)).toBeCloseTo(Math.sqrt(3), 15);
  const { combined, effectiveDegreesOfFreedom, budget } = combine([
    { what: "one", uncertainty: 3, degreesOfFreedom: 4 },
    { what: "other", uncertainty: 3, degreesOfFreedom: 4 },
  ]);
  expect(combined).toBeCloseTo(Math.sqrt(18), 14);
  expect(effectiveDegreesOfFreedom).toBeCloseTo(8, 12);
  expect(budget.map(({ share }) => share)).toEqual([expect.closeTo(0.5, 14), expect.closeTo(0.5, 14)]);
});
