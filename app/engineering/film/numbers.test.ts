import fc from "fast-check";
import { expect, test } from "vitest";
import { solveBanded } from "./banded-system";
import { risingRoot } from "./false-position";
import { monotoneCurve, spotAt, valueAt } from "./monotone-curve";

test("a banded system is solved: its matrix times the solution is the right side", () => {
  const size = 40;
  const bandwidth = 5;
  const entryOf = (row: number, column: number) => {
    const off = Math.abs(row - column);
    if (off > bandwidth) return 0;
    return off === 0 ? 6 + Math.sin(row) : -0.5 + 0.1 * Math.cos(row + column);
  };
  const entries = new Float64Array(size * (bandwidth + 1));
  for (let row = 0; row < size; row++) {
    for (let off = 0; off <= Math.min(row, bandwidth); off++) {
      entries[row * (bandwidth + 1) + bandwidth - off] = entryOf(row, row - off);
    }
  }
  const right = Float64Array.from({ length: size }, (_, row) => Math.cos(3 * row));
  const solution = right.slice();
  solveBanded({ bandwidth, entries, right: solution }, size);
  for (let row = 0; row < size; row++) {
    const product = solution.reduce((sum, value, column) => sum + entryOf(row, column) * value, 0);
    expect(product).toBeCloseTo(right[row]!, 10);
  }
});

test("a monotone curve goes through its points and never over them", () => {
  const rises = fc.array(fc.double({ min: 0, max: 10, noNaN: true }), { minLength: 3, maxLength: 12 });
  fc.assert(
    fc.property(rises, fc.double({ min: 0, max: 1, noNaN: true }), (steps, part) => {
      const values = steps.map((_, index) => steps.slice(0, index + 1).reduce((sum, step) => sum + step, 0));
      const places = values.map((_, index) => index + 0.3 * Math.sin(index));
      const curve = monotoneCurve(places, values);
      const at = (place: number) => valueAt(curve, spotAt(places, place));
      for (let index = 0; index + 1 < places.length; index++) {
        const between = at(places[index]! + part * (places[index + 1]! - places[index]!));
        expect(between).toBeGreaterThanOrEqual(values[index]! - 1e-9);
        expect(between).toBeLessThanOrEqual(values[index + 1]! + 1e-9);
        expect(at(places[index]!)).toBeCloseTo(values[index]!, 12);
      }
    }),
  );
});

test("a root is found where there is one, and owned up to where there is none", () => {
  const cube = (place: number) => place ** 3 - 2;
  expect(risingRoot(cube, { low: 0, high: 5, tolerance: 1e-12 }).place).toBeCloseTo(Math.cbrt(2), 10);
  expect(risingRoot(cube, { low: 2, high: 5, tolerance: 1e-12 })).toEqual({ place: 2, converged: false });
  expect(risingRoot(cube, { low: 0, high: 1, tolerance: 1e-12 })).toEqual({ place: 1, converged: false });
});
