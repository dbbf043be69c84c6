import fc from "fast-check";
import { expect, test } from "vitest";
import { densityAt } from "../oil/density";
import { shearedLine } from "../oil/high-shear";
import type { SteadyDuty } from "./duty";
import { steadyFilm } from "./steady-film";

const bigEnd = {
  diameter: 0.05334,
  length: 0.022,
  clearance: 63.5e-6,
  speed: 7200 * (Math.PI / 30),
  load: 9000,
};
const oil = { kv40: 110, kv100: 16.2, density15: 865, hths: 0.0041 };

const duties = fc
  .record({
    diameter: fc.double({ min: 0.03, max: 0.09, noNaN: true }),
    lengthToDiameter: fc.double({ min: 0.16, max: 1.49, noNaN: true }),
    relativeClearance: fc.double({ min: 4e-4, max: 3e-3, noNaN: true }),
    speed: fc.double({ min: 20, max: 1200, noNaN: true }),
    specificLoad: fc.double({ min: 1e3, max: 4e7, noNaN: true }),
  })
  .map(({ diameter, lengthToDiameter, relativeClearance, ...rest }) => ({
    diameter,
    length: diameter * lengthToDiameter,
    clearance: diameter * relativeClearance,
    ...rest,
  }));

test("the film thins as load rises and as oil thins, and friction always costs power", () => {
  fc.assert(
    fc.property(duties, fc.double({ min: 2e-3, max: 0.05, noNaN: true }), (duty, viscosity) => {
      const film = steadyFilm({ ...duty, viscosity });
      const heavier = steadyFilm({ ...duty, specificLoad: 1.1 * duty.specificLoad, viscosity });
      const thinner = steadyFilm({ ...duty, viscosity: 0.9 * viscosity });
      for (const other of [heavier, thinner]) {
        if (!other.outsideRange) expect(other.leastFilm).toBeLessThan(film.leastFilm);
        expect(other.leastFilm).toBeLessThanOrEqual(film.leastFilm);
      }
      expect(thinner.frictionPower).toBeLessThan(film.frictionPower);
      expect(film.frictionPower).toBeGreaterThan(0);
      expect(film.peakPressure).toBeGreaterThan(film.specificLoad);
      for (const value of Object.values(film))
        if (typeof value === "number") expect(value).toSatisfy(Number.isFinite);
    }),
  );
});

test("oil, film and heat are in balance at the effective temperature", () => {
  fc.assert(
    fc.property(duties, fc.double({ min: 40, max: 120, noNaN: true }), (duty, supplyTemperatureC) => {
      const film = steadyFilm({ ...duty, oil, supplyTemperatureC });
      if (!film.converged) {
        expect(film.outsideRange).toBe(true);
        return;
      }
      const temperatureC = film.effectiveTemperatureC!;
      expect(temperatureC).toBeCloseTo(supplyTemperatureC + film.temperatureRise / 2, 5);
      expect(film.effectiveViscosity).toBeCloseTo(shearedLine(oil)(temperatureC), 12);
      const carried =
        densityAt(865, temperatureC) * 1760 * (film.inflow - film.sideFlow / 2) * film.temperatureRise;
      expect(carried / film.frictionPower).toBeCloseTo(1, 6);
    }),
  );
});

test("hotter supply thins the film", () => {
  const at = (supplyTemperatureC: number) => steadyFilm({ ...bigEnd, oil, supplyTemperatureC });
  expect(at(110).leastFilm).toBeLessThan(at(90).leastFilm);
  expect(at(110).effectiveViscosity).toBeLessThan(at(90).effectiveViscosity);
});

test("the specific load stands for the load", () => {
  const { load, ...rest } = bigEnd;
  const specificLoad = load / (bigEnd.length * bigEnd.diameter);
  expect(steadyFilm({ ...rest, specificLoad, viscosity: 0.008 }).leastFilm).toBeCloseTo(
    steadyFilm({ ...bigEnd, viscosity: 0.008 }).leastFilm,
    15,
  );
});

test("roughness turns the film into a regime", () => {
  const at = (bore: number) =>
    steadyFilm({ ...bigEnd, viscosity: 0.008, roughness: { bore, journal: 1e-7 } });
  expect(at(2e-7)).toMatchObject({ regime: "full" });
  expect(at(2e-6)).toMatchObject({ regime: "mixed" });
  expect(at(2e-5)).toMatchObject({ regime: "boundary" });
  expect(steadyFilm({ ...bigEnd, viscosity: 0.008 })).toMatchObject({ lambda: null, regime: null });
});

test("oil pressed in through a hole cools the film", () => {
  const feed = { kind: "hole", diameter: 0.006 } as const;
  const low = steadyFilm({ ...bigEnd, oil, supplyTemperatureC: 95, feed, supplyPressure: 2e5 });
  const high = steadyFilm({ ...bigEnd, oil, supplyTemperatureC: 95, feed, supplyPressure: 6e5 });
  expect(high.pressureFlow).toBeGreaterThan(low.pressureFlow);
  expect(high.temperatureRise).toBeLessThan(low.temperatureRise);
  expect(high.leastFilm).toBeGreaterThan(low.leastFilm);
});

test("a groove all round parts a bearing into two shorter ones, which run closer", () => {
  const grooved = steadyFilm({
    ...bigEnd,
    viscosity: 0.008,
    feed: { kind: "groove", width: 0.003 },
    supplyPressure: 4e5,
  });
  expect(grooved.leastFilm).toBeLessThan(steadyFilm({ ...bigEnd, viscosity: 0.008 }).leastFilm);
  expect(grooved.specificLoad).toBeCloseTo(9000 / (0.019 * 0.05334), 3);
});

test("what lies beyond the model is flagged and said", () => {
  const heavy = steadyFilm({ ...bigEnd, load: 1e6, viscosity: 0.008 });
  expect(heavy).toMatchObject({ outsideRange: true, eccentricityRatio: 0.99 });
  expect(heavy.leastFilm).toBeCloseTo(0.01 * (63.5e-6 / 2), 12);
  expect(heavy.assumptions[0]).toContain("the real film is thinner");
  const turbulent = steadyFilm({ ...bigEnd, clearance: 5e-4, speed: 5000, load: 100, viscosity: 0.001 });
  expect(turbulent.assumptions[0]).toContain("no longer laminar");
  const burning = steadyFilm({ ...bigEnd, clearance: 8e-6, speed: 5000, oil, supplyTemperatureC: 150 });
  expect(burning).toMatchObject({ outsideRange: true });
});

test.each<[Partial<SteadyDuty>, string, string]>([
  [{ clearance: 0 }, "not-positive", "clearance"],
  [{ clearance: -1e-5 }, "not-positive", "clearance"],
  [{ clearance: 0.01 }, "outside-range", "clearance"],
  [{ length: 0 }, "not-positive", "length"],
  [{ length: 0.2 }, "outside-range", "length"],
  [{ diameter: Number.NaN }, "not-a-number", "diameter"],
  [{ viscosity: 0 }, "not-positive", "viscosity"],
  [{ viscosity: -0.01 }, "not-positive", "viscosity"],
  [{ viscosity: Number.POSITIVE_INFINITY }, "outside-range", "viscosity"],
  [{ speed: 1e308 }, "outside-range", "speed"],
  [{ speed: 0 }, "not-positive", "speed"],
  [{ load: 0 }, "not-positive", "load"],
  [{ load: undefined }, "missing", "load"],
  [{ specificLoad: 1e6 }, "said-twice", "load"],
  [{ viscosity: undefined }, "missing", "viscosity"],
  [{ oil, supplyTemperatureC: 90 }, "said-twice", "viscosity"],
  [{ oil, viscosity: undefined }, "missing", "supplyTemperatureC"],
  [
    { oil: { kv40: 10, kv100: 20 }, viscosity: undefined, supplyTemperatureC: 90 },
    "viscosity-order",
    "kv100",
  ],
  [{ roughness: { bore: 0, journal: 1e-7 } }, "not-positive", "roughness.bore"],
  [{ supplyPressure: 3e5 }, "missing", "feed"],
  [{ feed: { kind: "hole", diameter: 0.005 } }, "missing", "supplyPressure"],
  [{ feed: { kind: "groove", width: 0.018 }, supplyPressure: 3e5 }, "outside-range", "feed.width"],
])("refuses %o", (wrong, code, field) => {
  expect(() => steadyFilm({ ...bigEnd, viscosity: 0.008, ...wrong })).toThrow(
    expect.objectContaining({ code, field }),
  );
});
