import fc from "fast-check";
import { expect, test } from "vitest";
import { solveReynolds } from "./reynolds";

const degrees = 180 / Math.PI;
const shapes = fc.record({
  eccentricityRatio: fc.double({ min: 0.01, max: 0.99, noNaN: true }),
  lengthToDiameter: fc.double({ min: 0.15, max: 1.5, noNaN: true }),
});

test("oil is neither made nor lost: what comes in leaves at the edges or with the end of the film", () => {
  fc.assert(
    fc.property(shapes, (shape) => {
      const { inflow, sideFlow, filmEnd } = solveReynolds(shape);
      // At the film's end the oil is dragged through the gap there: between the gap at the end in the middle of the
      // bearing and the least gap, where the edges tear. 0.5 % for the mesh.
      const through = (angle: number) => Math.PI * (1 + shape.eccentricityRatio * Math.cos(angle));
      expect(inflow - sideFlow).toBeGreaterThan(through(Math.PI) - 0.005 * inflow);
      expect(inflow - sideFlow).toBeLessThan(through(filmEnd) + 0.005 * inflow);
    }),
    { numRuns: 40 },
  );
});

test("the film peaks where the gap narrows and tears where it widens", () => {
  fc.assert(
    fc.property(shapes, (shape) => {
      const film = solveReynolds(shape);
      expect(film.converged).toBe(true);
      expect(film.peakAngle * degrees).toBeGreaterThan(88);
      expect(film.peakAngle * degrees).toBeLessThan(180);
      expect(film.filmEnd * degrees).toBeGreaterThan(180);
      expect(film.filmEnd * degrees).toBeLessThan(230);
      expect(film.peakPressure).toBeGreaterThan(1);
    }),
    { numRuns: 40 },
  );
});

test("a mesh twice as fine changes the answer by less than 0.3 %", () => {
  for (const [eccentricityRatio, lengthToDiameter] of [
    [0.02, 0.2],
    [0.5, 1.5],
    [0.9, 0.4],
    [0.99, 0.15],
    [0.99, 1.5],
  ] as const) {
    const usual = solveReynolds({ eccentricityRatio, lengthToDiameter });
    const fine = solveReynolds({ eccentricityRatio, lengthToDiameter }, { around: 480, along: 40 });
    for (const quantity of [
      "sommerfeld",
      "attitude",
      "friction",
      "inflow",
      "sideFlow",
      "peakPressure",
    ] as const) {
      expect(Math.abs(usual[quantity] / fine[quantity] - 1)).toBeLessThan(0.003);
    }
  }
});

test.each([
  [{ eccentricityRatio: 0, lengthToDiameter: 1 }, "not-positive"],
  [{ eccentricityRatio: 1, lengthToDiameter: 1 }, "outside-range"],
  [{ eccentricityRatio: 0.5, lengthToDiameter: 0 }, "not-positive"],
  [{ eccentricityRatio: 0.5, lengthToDiameter: Number.NaN }, "not-a-number"],
  [{ eccentricityRatio: 0.5, lengthToDiameter: 1e308 }, "outside-range"],
])("refuses %o", (shape, code) => {
  expect(() => solveReynolds(shape)).toThrow(expect.objectContaining({ code }));
});
