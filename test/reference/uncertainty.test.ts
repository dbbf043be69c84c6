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
  expect(Math.floor(at99.effectiveDegreesOfFreedom)).toBe(16);
  expect(at99.coverage).toBeCloseTo(2.92, 2);
  expect(at99.expanded).toBeCloseTo(92.5, 0);
  expect(combine(budget).coverage).toBeCloseTo(2.12, 2);
});
