import { describe, expect, test } from "vitest";
import { filmCurves, type TableFilm } from "~/engineering/film/film-table";
import { solveReynolds } from "~/engineering/film/reynolds";
import published from "./data/film.json";

const degrees = 180 / Math.PI;
const away = (value: number, print: number) => Math.abs(value / print - 1);

interface Shape {
  eccentricityRatio: number;
  lengthToDiameter: number;
}

type Film = Omit<TableFilm, "eccentricityRatio" | "outsideRange">;

/** Both ways to a film: the solver itself, and the table the pages use, where it reaches. */
const ways: [string, (shape: Shape) => Film, number][] = [
  ["the solver", solveReynolds, 0.02],
  [
    "the table",
    ({ eccentricityRatio, lengthToDiameter }) => filmCurves(lengthToDiameter).at(eccentricityRatio),
    0.15,
  ],
];

/** The worst deviation of each quantity, to hold and to show. */
class Deviations {
  readonly worst: Record<string, number> = {};

  see(quantity: string, deviation: number): void {
    this.worst[quantity] = Math.max(this.worst[quantity] ?? 0, deviation);
  }

  expectWithin(tolerance: number): void {
    for (const [quantity, deviation] of Object.entries(this.worst))
      expect(deviation, quantity).toBeLessThan(tolerance);
  }
}

describe.each(ways)("%s", (_, filmOf, shortest) => {
  // 2 %: the table's printed digits, its coarser mesh (steps of 3°) and ours. Worst seen is 1.8 %, of the peak at ε 0.95.
  test("Khonsari and Booser's finite bearing table", () => {
    const deviations = new Deviations();
    for (const row of published.khonsariBooser.rows as [number, number, ...number[]][]) {
      const [lengthToDiameter, eccentricityRatio, s, side, inflow, friction, peak, , attitude] = row;
      const film = filmOf({ eccentricityRatio, lengthToDiameter });
      deviations.see("S", away(film.sommerfeld, s!));
      deviations.see("side flow", away(film.sideFlow / Math.PI, side!));
      deviations.see("inflow", away(film.inflow / Math.PI, inflow!));
      deviations.see("friction", away(film.friction, friction!));
      deviations.see("peak pressure", away(film.peakPressure / film.sommerfeld, peak!));
      deviations.see("attitude", away(film.attitude * degrees, attitude!));
    }
    deviations.expectWithin(0.02);
  });

  // 2 %: the load table has four decimals, which is 2 % of its smallest value.
  test("Butenschön's load and attitude tables (DIN 31652, ISO 7902)", () => {
    const deviations = new Deviations();
    const { eccentricityRatios, lengthToDiameters, load, attitudeDegrees } = published.butenschoen;
    eccentricityRatios.forEach((eccentricityRatio, row) => {
      lengthToDiameters.forEach((lengthToDiameter, column) => {
        if (lengthToDiameter < shortest) return;
        const film = filmOf({ eccentricityRatio, lengthToDiameter });
        deviations.see("load", away(1 / (2 * Math.PI * film.sommerfeld), load[row]![column]!));
        deviations.see("attitude", away(film.attitude * degrees, attitudeDegrees[row]![column]!));
      });
    });
    deviations.expectWithin(0.02);
  });

  // 2 %, as above; four decimals of flows from 0.025.
  test("Butenschön's side flow table", () => {
    const deviations = new Deviations();
    const { lengthToDiameters, sideFlow } = published.butenschoen;
    sideFlow.eccentricityRatios.forEach((eccentricityRatio, row) => {
      lengthToDiameters.forEach((lengthToDiameter, column) => {
        if (lengthToDiameter < shortest) return;
        const film = filmOf({ eccentricityRatio, lengthToDiameter });
        deviations.see(
          "side flow",
          away((film.sideFlow * lengthToDiameter) / Math.PI, sideFlow.rows[row]![column]!),
        );
      });
    });
    deviations.expectWithin(0.02);
  });

  // 3 % and half the last printed digit of S. Their peak pressures at ε 0.97, from a mesh of 1958, are 4 to 6 % off
  // both other tables and left out; so are the infinitely long rows below ε 0.6, 3 to 10 % off the closed solution.
  test("Raimondi and Boyd's table", () => {
    const deviations = new Deviations();
    for (const row of published.raimondiBoyd.rows as [number, number, ...number[]][]) {
      const [lengthToDiameter, eccentricityRatio, s, attitude, friction, inflow, sideShare, peak] = row;
      if (lengthToDiameter > 1) continue;
      const film = filmOf({ eccentricityRatio, lengthToDiameter });
      const digit = 10 ** (Math.floor(Math.log10(s!)) - 2) / 2;
      deviations.see("S", away(film.sommerfeld, s!) - digit / s!);
      deviations.see("attitude", away(film.attitude * degrees, attitude!));
      deviations.see("friction", away(film.friction, friction!));
      deviations.see("inflow", away(film.inflow, inflow!));
      deviations.see("side share", away(film.sideFlow / film.inflow, sideShare!));
      if (eccentricityRatio < 0.97) deviations.see("peak pressure", away(1 / film.peakPressure, peak!));
    }
    deviations.expectWithin(0.03);
  });
});

// The table's angles stand on a mesh of 3°.
test("Khonsari and Booser's angles of the peak and of the film's end", () => {
  for (const row of published.khonsariBooser.rows as [number, number, ...number[]][]) {
    const [lengthToDiameter, eccentricityRatio] = row;
    const { peakAngle, filmEnd } = solveReynolds({ eccentricityRatio, lengthToDiameter });
    expect(Math.abs(peakAngle * degrees - row[7]!)).toBeLessThan(3);
    expect(Math.abs(filmEnd * degrees - row[9]!)).toBeLessThan(3);
  }
});

// The standard's own approximation is 2 to 7 % and up to 2.4° from its tables: a comparison, no better than that. Between
// the table's lengths of 0.5 and 1 the formula as it was seen strays by 12 %, and is left out.
test("the approximation formulas of DIN 31652 / ISO 7902", () => {
  const { approximation } = published.butenschoen;
  const coefficient = (name: keyof typeof approximation, b: number) =>
    approximation[name].reduce((sum, value, power) => sum + value * b ** power, 0);
  for (const b of [0.2, 0.25, 0.4, 0.5, 1]) {
    for (const e of [0.1, 0.3, 0.5, 0.7, 0.9, 0.95]) {
      const load =
        ((b ** 2 * e) / (2 * (1 - e ** 2) ** 2)) *
        Math.sqrt(Math.PI ** 2 * (1 - e ** 2) + 16 * e ** 2) *
        ((coefficient("a1", b) * (e - 1)) / (coefficient("a2", b) + e));
      const shape = (["a3", "a4", "a5", "a6", "a7"] as const).reduce(
        (sum, name, power) => sum + coefficient(name, b) * e ** power,
        0,
      );
      const attitude = Math.atan((Math.PI * Math.sqrt(1 - e ** 2)) / (2 * e)) * shape;
      const film = filmCurves(b).at(e);
      expect(away(1 / (2 * Math.PI * film.sommerfeld), load), `load ${b} ${e}`).toBeLessThan(0.07);
      expect(Math.abs(film.attitude - attitude) * degrees, `attitude ${b} ${e}`).toBeLessThan(2.5);
    }
  }
});
