import { expect, test } from "vitest";
import { at20, atTemperature } from "~/engineering/temperature/expansion";
import { hotClearance } from "~/engineering/temperature/hot-clearance";
import { findMaterial } from "~/engineering/temperature/materials";

// Reference temperature 20 °C: ISO 1. Coefficients: Callister, Fundamentals of Materials Science and Engineering,
// 3rd ed., table B.6. Results worked by hand: d20 = d / (1 + α Δt), to the hundredth of a micrometre.
test("60.000 mm read at 35 °C, in iron and in aluminium", () => {
  const iron = findMaterial("gray-iron");
  const aluminium = findMaterial("aluminium-356");
  expect(iron.expansion).toBe(11.4e-6);
  expect(at20(0.06, 35, iron.expansion)).toBeCloseTo(0.05998974, 8);
  expect(at20(0.06, 35, aluminium.expansion)).toBeCloseTo(0.05998066, 8);
});

// 60.060 mm bore of α 21.5 on a 60.000 mm journal of α 12.3: 0.060 mm at 20 °C is 0.10426 mm at 100 °C, by hand:
// 60.060 (1 + 80 × 21.5e-6) − 60.000 (1 + 80 × 12.3e-6).
test("an aluminium housing opens on a steel journal", () => {
  const hot = hotClearance({
    clearance: 60e-6,
    journalDiameter: 0.06,
    shellWall: 0,
    housing: { expansion: 21.5e-6, temperatureC: 100 },
    shell: { expansion: 11.7e-6, temperatureC: 100 },
    journal: { expansion: 12.3e-6, temperatureC: 100 },
  });
  expect(hot).toBeCloseTo(0.1042632e-3, 9);
});

test("a shell's wall takes clearance as it thickens inwards, twice", () => {
  const wall = { expansion: 11.7e-6, temperatureC: 120 };
  const cold = { expansion: 11.7e-6, temperatureC: 20 };
  const parts = { clearance: 60e-6, journalDiameter: 0.06, shellWall: 0.0025, housing: cold, journal: cold };
  const taken = hotClearance({ ...parts, shell: cold }) - hotClearance({ ...parts, shell: wall });
  // By hand: 2 × 2.5 mm × 11.7e-6 × 100 °C = 5.85 µm.
  expect(taken).toBeCloseTo(5.85e-6, 12);
});

test("100 mm of steel grows 1.15 µm in a degree", () => {
  // Common practice rule, worked: 100 mm × 11.5e-6.
  expect(atTemperature(0.1, 21, 11.5e-6) - 0.1).toBeCloseTo(1.15e-6, 12);
});
