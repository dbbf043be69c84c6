import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { EngineeringError } from "../engineering-error";
import { type LoadPoint, loadCycle } from "./load-cycle";

const degrees = Math.PI / 180;
const every = (step: number, count: number): LoadPoint[] =>
  Array.from({ length: count }, (_, index) => ({ crankAngle: index * step * degrees, x: index, y: -index }));

const codeOf = (loads: LoadPoint[]): string => {
  try {
    loadCycle(loads, 100);
  } catch (error) {
    if (error instanceof EngineeringError) return error.code;
    throw error;
  }
  return "accepted";
};

describe("loads of one cycle", () => {
  test("every 10° become every degree by straight lines, round to the first point again", () => {
    const { cycle, points } = loadCycle(every(10, 72), 100);
    expect(cycle).toBe(4 * Math.PI);
    expect(points).toHaveLength(720);
    expect(points[15]).toMatchObject({ x: 1.5, y: -1.5, journalSpeed: 100 });
    expect(points[719]!.x).toBeCloseTo(7.1, 9);
  });

  test("a closing point is not counted twice, and a cycle may begin anywhere", () => {
    const closed = [...every(10, 72), { crankAngle: 4 * Math.PI, x: 0, y: 0 }];
    expect(loadCycle(closed, 1).points[719]!.x).toBeCloseTo(7.1, 9);
    const early = every(10, 72).map((point) => ({ ...point, crankAngle: point.crankAngle - 2 * Math.PI }));
    expect(loadCycle(early, 1).points[360]!.x).toBeCloseTo(0, 9);
    expect(loadCycle(early, 1).points[0]!.x).toBeCloseTo(36, 9);
  });

  test.each([
    ["the same angle twice", [...every(10, 40), ...every(10, 72).slice(39)], "unsorted"],
    ["backwards", every(10, 72).reverse(), "unsorted"],
    ["a hole of 40°", every(10, 72).filter((_, index) => index < 20 || index > 22), "gap"],
    ["three quarters of a cycle", every(10, 54), "wrong-span"],
    [
      "degrees for rad",
      every(10, 73).map((p) => ({ ...p, crankAngle: p.crankAngle / degrees })),
      "angle-unit",
    ],
    ["three turns", every(10, 108), "wrong-span"],
    ["three points", every(10, 3), "too-few-points"],
    ["100 001 points", every(720 / 100_001, 100_001), "too-many-points"],
    [
      "a load that is no number",
      [{ crankAngle: -0.1, x: Number.NaN, y: 0 }, ...every(10, 72)],
      "not-a-number",
    ],
    ["a load of 1e308", [{ crankAngle: -0.1, x: 0, y: 1e308 }, ...every(10, 72)], "outside-range"],
  ])("%s is refused", (_, loads, code) => {
    expect(codeOf(loads)).toBe(code);
  });

  test("100 000 points are read", () => {
    expect(loadCycle(every(720 / 100_000, 100_000), 1).points[360]!.x).toBeCloseTo(50_000, 3);
  });

  test("between any points the load stays between theirs", () => {
    const size = fc.double({ min: -1e5, max: 1e5, noNaN: true });
    const gap = fc.double({ min: 10, max: 19, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.tuple(gap, size), { minLength: 50, maxLength: 80 }), (parts) => {
        const total = parts.reduce((sum, [width]) => sum + width, 0);
        let angle = 0;
        const loads = parts.map(([width, x]) => {
          const point = { crankAngle: angle, x, y: 0 };
          angle += (width * 4 * Math.PI) / total;
          return point;
        });
        const { points } = loadCycle(loads, 1);
        const given = loads.map(({ x }) => x);
        expect(Math.max(...points.map(({ x }) => x))).toBeLessThanOrEqual(Math.max(...given) + 1e-9);
        expect(Math.min(...points.map(({ x }) => x))).toBeGreaterThanOrEqual(Math.min(...given) - 1e-9);
      }),
      { numRuns: 50 },
    );
  });
});
