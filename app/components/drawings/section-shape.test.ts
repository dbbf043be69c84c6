import fc from "fast-check";
import { expect, test } from "vitest";
import { at, diameterAround, outline } from "./section-shape";

test("the shape goes through every diameter measured, and is the same half a turn on", () => {
  const measured = new Map([
    [90, 53.4],
    [45, 53.41],
    [135, 53.38],
  ]);
  const diameter = diameterAround(measured);
  for (const [angle, value] of measured) {
    expect(diameter(angle)).toBeCloseTo(value, 12);
    expect(diameter(angle + 180)).toBeCloseTo(value, 12);
    expect(diameter(angle - 180)).toBeCloseTo(value, 12);
  }
});

test("one diameter alone is a circle", () => {
  const diameter = diameterAround(new Map([[90, 53.4]]));
  for (const degrees of [0, 1, 89, 90, 91, 270, 359]) expect(diameter(degrees)).toBe(53.4);
});

test("between the axes the shape never leaves what was measured", () => {
  const angles = fc.uniqueArray(fc.constantFrom(0, 45, 90, 135), { minLength: 1 });
  const values = fc.array(fc.double({ min: 0.01, max: 0.2, noNaN: true }), { minLength: 4, maxLength: 4 });
  fc.assert(
    fc.property(angles, values, fc.integer({ min: -720, max: 720 }), (at, given, degrees) => {
      const measured = new Map(at.map((angle, index) => [angle, given[index]!]));
      const diameter = diameterAround(measured)(degrees);
      // A rounding of the last digit is no leaving.
      expect(diameter).toBeGreaterThanOrEqual(Math.min(...measured.values()) - 1e-15);
      expect(diameter).toBeLessThanOrEqual(Math.max(...measured.values()) + 1e-15);
    }),
  );
});

test("0° is to the right and 90° is up", () => {
  expect(at(0, 2)).toEqual([2, 0]);
  const [across, up] = at(90, 2);
  expect(across).toBeCloseTo(0, 12);
  expect(up).toBe(2);
});

test("an outline is closed and starts at the right", () => {
  const path = outline(100, 100, () => 50);
  expect(path.startsWith("M150 100L")).toBe(true);
  expect(path.endsWith("Z")).toBe(true);
});
