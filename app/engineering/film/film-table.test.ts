import fc from "fast-check";
import { expect, test } from "vitest";
import { filmCurves } from "./film-table";
import { films, lengthToDiameters, opennesses } from "./film-table.generated";
import { solveReynolds } from "./reynolds";
import { tableFilm, tableLengths, tableOpennesses } from "./table-film";

test("the committed table is what the solver makes today", () => {
  expect(lengthToDiameters).toEqual(tableLengths);
  expect(opennesses).toEqual(tableOpennesses);
  for (let node = 0; node < tableLengths.length * tableOpennesses.length; node += 7) {
    const length = node % tableLengths.length;
    const openness = Math.floor(node / tableLengths.length);
    const made = tableFilm(tableLengths[length]!, tableOpennesses[openness]!);
    made.forEach((value, quantity) => {
      // One in the last place for another machine's arithmetic.
      expect(Math.abs(value - films[length]![quantity]![openness]!)).toBeLessThanOrEqual(1);
    });
  }
});

const lengths = fc.double({ min: 0.15, max: 1.5, noNaN: true });

test("between its films the table keeps to the solver within 0.3 %", () => {
  fc.assert(
    fc.property(lengths, fc.double({ min: 0.1, max: 0.995, noNaN: true }), (lengthToDiameter, openness) => {
      const eccentricityRatio = 1 - openness ** 2;
      const solved = solveReynolds({ eccentricityRatio, lengthToDiameter });
      const read = filmCurves(lengthToDiameter).at(eccentricityRatio);
      for (const quantity of [
        "sommerfeld",
        "attitude",
        "friction",
        "inflow",
        "sideFlow",
        "peakPressure",
      ] as const) {
        expect(Math.abs(read[quantity] / solved[quantity] - 1), quantity).toBeLessThan(0.003);
      }
    }),
    { numRuns: 60 },
  );
});

test("a film found by its load is the film that carries it", () => {
  fc.assert(
    fc.property(lengths, fc.double({ min: -9, max: -0.0044, noNaN: true }), (lengthToDiameter, exponent) => {
      const eccentricityRatio = 10 ** exponent;
      const curves = filmCurves(lengthToDiameter);
      const { sommerfeld } = curves.at(eccentricityRatio);
      expect(Math.abs(curves.under(sommerfeld).eccentricityRatio / eccentricityRatio - 1)).toBeLessThan(1e-9);
    }),
  );
});

test("a heavier load always has the journal further out", () => {
  for (const lengthToDiameter of [0.15, 0.17, 0.33, 0.5, 0.97, 1.2, 1.5]) {
    const { at } = filmCurves(lengthToDiameter);
    const sommerfelds = Array.from({ length: 990 }, (_, index) => at((index + 1) / 1000).sommerfeld);
    for (let index = 1; index < sommerfelds.length; index++) {
      expect(sommerfelds[index]!).toBeLessThan(sommerfelds[index - 1]!);
    }
  }
});

test("the lightest load leaves the journal centred with Petroff's friction, 2π²S", () => {
  const film = filmCurves(0.8).under(1e6);
  expect(film.eccentricityRatio).toBeLessThan(1e-6);
  expect(film.friction / (2 * Math.PI ** 2 * 1e6)).toBeCloseTo(1, 6);
  expect(film.inflow).toBeCloseTo(Math.PI, 4);
});

test("beyond an eccentricity ratio of 0.99 the film at 0.99 is given, flagged", () => {
  const { at, under } = filmCurves(0.4);
  const edge = at(0.99);
  expect(under(edge.sommerfeld * 1.001).outsideRange).toBe(false);
  expect(under(edge.sommerfeld * 0.999)).toMatchObject({ outsideRange: true, eccentricityRatio: 0.99 });
});

test("a length of exactly 0.15 or 1.5 diameters is in the table, however it was divided", () => {
  expect(filmCurves((0.05 * 1.5) / 0.05).at(0.5).sommerfeld).toBeGreaterThan(0);
  expect(filmCurves(0.0081 / 0.054).at(0.5).sommerfeld).toBeGreaterThan(0);
  for (const length of [0.1499, 1.501, Number.NaN, 1e308, -1]) {
    expect(() => filmCurves(length)).toThrow(expect.objectContaining({ field: "length" }));
  }
});
