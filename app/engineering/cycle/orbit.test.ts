import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { EngineeringError } from "../engineering-error";
import type { LoadPoint } from "./load-cycle";
import { type Orbit, type OrbitDuty, orbit, shareBelow } from "./orbit";

const bearing = { diameter: 0.05334, length: 0.0224, clearance: 63.5e-6 };
const degrees = Math.PI / 180;

const loadsOf = (x: (angle: number) => number, y: (angle: number) => number, step = 10): LoadPoint[] =>
  Array.from({ length: 720 / step }, (_, index) => {
    const crankAngle = index * step * degrees;
    return { crankAngle, x: x(crankAngle), y: y(crankAngle) };
  });

const duty: OrbitDuty = {
  bearing,
  viscosity: 0.008,
  speed: 600,
  sleeveFixed: true,
  loads: loadsOf(
    (angle) => 8000 * Math.cos(angle) + 12_000 * Math.cos(angle / 2) ** 20,
    (angle) => 3000 * Math.sin(angle),
  ),
};

const refusal = (change: object): string => {
  try {
    orbit({ ...duty, ...change });
  } catch (error) {
    if (error instanceof EngineeringError) return error.code;
    throw error;
  }
  return "accepted";
};

const allFinite = ({ leastFilm, leastFilmAngle, meanPower, orbit: points }: Orbit) =>
  [leastFilm, leastFilmAngle, meanPower].every(Number.isFinite) &&
  points.every(({ ex, ey, film }) => Number.isFinite(ex + ey) && film > 0);

describe("a big end over the cycle", () => {
  test("settles, and the film it names is the thinnest of its orbit", () => {
    const settled = orbit(duty);
    expect(settled.converged).toBe(true);
    expect(settled.orbit).toHaveLength(720);
    const thinnest = settled.orbit.find(({ film }) => film === settled.leastFilm)!;
    expect(thinnest.crankAngle).toBe(settled.leastFilmAngle);
    expect(Math.min(...settled.orbit.map(({ film }) => film))).toBe(settled.leastFilm);
    expect((1 - Math.hypot(thinnest.ex, thinnest.ey)) * (bearing.clearance / 2)).toBeCloseTo(
      thinnest.film,
      12,
    );
  });

  test("an unloaded journal floats in the middle", () => {
    const floating = orbit({
      ...duty,
      loads: loadsOf(
        () => 0,
        () => 0,
      ),
    });
    expect(floating.leastFilm).toBe(bearing.clearance / 2);
    expect(floating.converged).toBe(true);
  });

  test("a load of one turn gives the orbit of the same load given over two", () => {
    const load = (angle: number) => 5000 + 4000 * Math.cos(angle);
    const two = orbit({ ...duty, loads: loadsOf(load, () => 0) });
    const one = orbit({ ...duty, loads: loadsOf(load, () => 0).slice(0, 36) });
    expect(one.orbit).toHaveLength(360);
    // 0.1 %: what two cycles must agree to.
    expect(Math.abs(one.leastFilm / two.leastFilm - 1)).toBeLessThan(1e-3);
  });

  test("too much load for any film is an answer, marked", () => {
    const pressed = orbit({
      ...duty,
      loads: loadsOf(
        () => 1e9,
        () => 0,
      ),
    });
    expect(pressed.outsideRange).toBe(true);
    expect(pressed.leastFilm).toBeGreaterThan(0);
  });

  test("a stubby bearing takes the short film by itself, an odd long one is refused", () => {
    expect(orbit({ ...duty, bearing: { ...bearing, length: 0.004 } }).model).toBe("short");
    expect(orbit(duty).model).toBe("finite");
    expect(refusal({ bearing: { ...bearing, length: 0.1 } })).toBe("outside-range");
  });
});

describe("what must hold for any load", () => {
  const size = fc.double({ min: -3e4, max: 3e4, noNaN: true });
  const anyDuty = fc.record({
    lengthToDiameter: fc.double({ min: 0.1, max: 1.5, noNaN: true }),
    clearance: fc.double({ min: 2e-5, max: 2e-4, noNaN: true }),
    viscosity: fc.double({ min: 1e-3, max: 0.1, noNaN: true }),
    speed: fc.double({ min: 50, max: 1500, noNaN: true }),
    x: fc.array(size, { minLength: 3, maxLength: 3 }),
    y: fc.array(size, { minLength: 3, maxLength: 3 }),
  });
  const dutyFrom = (
    any: typeof anyDuty extends fc.Arbitrary<infer T> ? T : never,
    turned = 0,
    scale = 1,
  ): OrbitDuty => {
    const wave = (parts: number[], angle: number) =>
      scale * (parts[0]! + parts[1]! * Math.cos(angle) + parts[2]! * Math.sin(angle / 2));
    const [c, s] = [Math.cos(turned), Math.sin(turned)];
    return {
      bearing: { diameter: 0.05, length: 0.05 * any.lengthToDiameter, clearance: any.clearance },
      viscosity: any.viscosity * scale,
      speed: any.speed,
      sleeveFixed: true,
      loads: loadsOf(
        (angle) => c * wave(any.x, angle) - s * wave(any.y, angle),
        (angle) => s * wave(any.x, angle) + c * wave(any.y, angle),
      ),
    };
  };

  test("the film lies between nothing and the clearance, and heat is made", () => {
    fc.assert(
      fc.property(anyDuty, (any) => {
        const result = orbit(dutyFrom(any));
        expect(allFinite(result)).toBe(true);
        expect(result.leastFilm).toBeLessThanOrEqual(any.clearance / 2);
        expect(result.meanPower).toBeGreaterThan(0);
      }),
      { numRuns: 60 },
    );
  });

  test("thicker oil under as much more load moves the same", () => {
    fc.assert(
      fc.property(anyDuty, (any) => {
        // 0.5 %: the step control sees rounding differently.
        expect(
          Math.abs(orbit(dutyFrom(any, 0, 3)).leastFilm / orbit(dutyFrom(any)).leastFilm - 1),
        ).toBeLessThan(5e-3);
      }),
      { numRuns: 20 },
    );
  });

  test("turning the axes changes no film", () => {
    fc.assert(
      fc.property(anyDuty, fc.double({ min: 0, max: 6, noNaN: true }), (any, turned) => {
        const [straight, turnedBy] = [orbit(dutyFrom(any)), orbit(dutyFrom(any, turned))];
        expect(Math.abs(turnedBy.leastFilm / straight.leastFilm - 1)).toBeLessThan(5e-3);
      }),
      { numRuns: 20 },
    );
  });
});

describe("input that is none", () => {
  test.each([
    ["a bearing without diameter", { bearing: { ...bearing, diameter: 0 } }, "not-positive"],
    ["a negative clearance", { bearing: { ...bearing, clearance: -1e-5 } }, "not-positive"],
    ["a clearance as wide as the bearing", { bearing: { ...bearing, clearance: 0.05 } }, "outside-range"],
    ["no viscosity", { viscosity: Number.NaN }, "not-a-number"],
    ["endless viscosity", { viscosity: Number.POSITIVE_INFINITY }, "outside-range"],
    ["a crank that stands", { speed: 0 }, "not-positive"],
    ["a sleeve that turns at 1e308", { sleeveSpeed: 1e308 }, "outside-range"],
    ["no loads", { loads: [] }, "too-few-points"],
  ])("%s is refused", (_, change, code) => {
    expect(refusal(change)).toBe(code);
  });

  test("any numbers at all end in an answer or a refusal", () => {
    const wild = fc.oneof(
      fc.double(),
      fc.constantFrom(0, -1, 1e-300, 1e308, Number.NaN, Number.POSITIVE_INFINITY, 1e-3, 1, 1e6),
    );
    fc.assert(
      fc.property(
        wild,
        wild,
        wild,
        wild,
        wild,
        wild,
        (diameter, length, clearance, viscosity, speed, load) => {
          try {
            const loads = loadsOf(
              (angle) => load * Math.cos(angle),
              () => load,
            );
            const result = orbit({
              bearing: { diameter, length, clearance },
              viscosity,
              speed,
              loads,
              sleeveFixed: true,
            });
            expect(allFinite(result)).toBe(true);
          } catch (error) {
            expect(error).toBeInstanceOf(EngineeringError);
          }
        },
      ),
      { numRuns: 300 },
    );
  });

  test("the widest of what is accepted still ends soon, with numbers", () => {
    for (const viscosity of [1e-5, 100]) {
      for (const speed of [0.1, 1e4]) {
        for (const clearance of [1e-7, 1e-3]) {
          for (const load of [1e-9, 1e9]) {
            const loads = loadsOf(
              (angle) => load * Math.cos(angle / 2),
              (angle) => load * Math.sin(angle),
            );
            const result = orbit({ ...duty, bearing: { ...bearing, clearance }, viscosity, speed, loads });
            expect(allFinite(result)).toBe(true);
          }
        }
      }
    }
  });
});

describe("share of the cycle below a limit", () => {
  const samples = (films: number[]) =>
    films.map((film, index) => ({ crankAngle: index, ex: 0, ey: 0, film }));

  test("counts between the samples by straight lines", () => {
    // 2 → 4 → 2 …: below 3 for half of every stretch.
    expect(shareBelow(samples([2, 4, 2, 4].map((film) => film * 1e-6)), 3e-6)).toBeCloseTo(0.5, 12);
    expect(shareBelow(samples([1e-6, 1e-6]), 3e-6)).toBe(1);
    expect(shareBelow(samples([5e-6, 4e-6]), 3e-6)).toBe(0);
  });

  test("grows with the limit", () => {
    const { orbit: points, leastFilm } = orbit(duty);
    const shares = [0.9, 1.5, 3, 10, 100].map((factor) => shareBelow(points, leastFilm * factor));
    expect(shares[0]).toBe(0);
    expect(shares.at(-1)).toBe(1);
    expect([...shares].sort((a, b) => a - b)).toEqual(shares);
  });
});
