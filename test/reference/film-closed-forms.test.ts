import { describe, expect, test } from "vitest";
import { filmCurves } from "~/engineering/film/film-table";
import { frictionOf, solveReynolds } from "~/engineering/film/reynolds";
import published from "./data/film.json";

const away = (value: number, exact: number) => Math.abs(value / exact - 1);

// A bearing of finite length carries less than the short bearing's closed form, by a share that goes with (L/D)².
// At L/D 0.02 that is 0.5 % at ε 0.9, 2.5 % at 0.98: the pressure is no longer wide against the bearing's length.
describe("Ocvirk's short bearing, closed form", () => {
  test.each(published.ocvirk.rows as [number, number, number][])(
    "at ε %d",
    (eccentricityRatio, load, attitude) => {
      const film = solveReynolds({ eccentricityRatio, lengthToDiameter: 0.02 });
      const tolerance = eccentricityRatio < 0.95 ? 0.006 : 0.03;
      expect(away(film.sommerfeld * 0.02 ** 2, load)).toBeLessThan(tolerance);
      expect(away((film.attitude * 180) / Math.PI, attitude)).toBeLessThan(tolerance);
      expect(away(film.sideFlow, 2 * Math.PI * eccentricityRatio)).toBeLessThan(tolerance);
    },
  );

  // The shortest bearing of the table, lightly loaded: its ends leak 1 % of the load.
  test("is where the table's short end points", () => {
    for (const [eccentricityRatio, load] of published.ocvirk.rows as [number, number, number][]) {
      if (eccentricityRatio > 0.3) continue;
      expect(away(filmCurves(0.15).at(eccentricityRatio).sommerfeld * 0.15 ** 2, load)).toBeLessThan(0.025);
    }
  });
});

// Friction of Sommerfeld's full film follows from its load at an attitude of 90°: exact.
test.each(published.sommerfeld.rows as [number, number, number][])(
  "the friction of Sommerfeld's long bearing, closed form, at ε %d",
  (eccentricityRatio, sommerfeld, friction) => {
    expect(away(frictionOf(eccentricityRatio, sommerfeld, Math.PI / 2), friction)).toBeLessThan(1e-8);
  },
);

// The long bearing whose film tears where pressure and gradient vanish has p' = (h − h₂)/h³, h₂ where it tears: one
// quadrature for the pressure, one for the load, done here by Simpson's rule. At L/D 100 the ends are worth 1 %.
test.each([0.2, 0.4, 0.6, 0.8, 0.9])("the long bearing by quadrature, at ε %d", (eccentricityRatio) => {
  const { load, attitude } = longBearing(eccentricityRatio);
  const film = solveReynolds({ eccentricityRatio, lengthToDiameter: 100 }, { around: 240, along: 40 });
  expect(away(film.sommerfeld, 1 / (6 * Math.PI * load))).toBeLessThan(0.012);
  expect(away(film.attitude, attitude)).toBeLessThan(0.005);
});

// Raimondi and Boyd's infinitely long rows from ε 0.6 (from memory), 3 % as for the others.
test("Raimondi and Boyd's infinitely long bearing", () => {
  const rows = (published.raimondiBoyd.rows as [number, number, ...number[]][]).filter(
    ([length]) => length > 1,
  );
  expect(rows).toHaveLength(3);
  for (const [, eccentricityRatio, s, attitude, friction] of rows) {
    const film = solveReynolds({ eccentricityRatio, lengthToDiameter: 100 }, { around: 240, along: 40 });
    expect(away(film.sommerfeld, s!)).toBeLessThan(0.03);
    expect(away((film.attitude * 180) / Math.PI, attitude!)).toBeLessThan(0.03);
    expect(away(film.friction, friction!)).toBeLessThan(0.03);
  }
});

function longBearing(eccentricityRatio: number): { load: number; attitude: number } {
  const gap = (angle: number) => 1 + eccentricityRatio * Math.cos(angle);
  const pressures = (end: number, steps: number) => {
    const slope = (angle: number) => (gap(angle) - gap(end)) / gap(angle) ** 3;
    const step = end / steps;
    const values = [0];
    for (let i = 0; i < steps; i++) {
      const at = i * step;
      values.push(values[i]! + (step / 6) * (slope(at) + 4 * slope(at + step / 2) + slope(at + step)));
    }
    return values;
  };
  let [low, high] = [Math.PI * 1.0001, Math.PI * 1.9];
  for (let round = 0; round < 60; round++) {
    const middle = (low + high) / 2;
    if (pressures(middle, 2000).at(-1)! > 0) low = middle;
    else high = middle;
  }
  const steps = 4000;
  const values = pressures(low, steps);
  const step = low / steps;
  let [outward, sideways] = [0, 0];
  values.forEach((pressure, i) => {
    outward -= pressure * Math.cos(i * step) * step;
    sideways += pressure * Math.sin(i * step) * step;
  });
  return { load: Math.hypot(outward, sideways), attitude: Math.atan2(sideways, outward) };
}
