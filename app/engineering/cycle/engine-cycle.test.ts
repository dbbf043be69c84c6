import { describe, expect, test } from "vitest";
import { degrees } from "./crank-angle";
import { allBearings, type EngineDuty, engineCycle } from "./engine-cycle";
import { crankOf, usualLayout } from "./engine-layouts";
import { ambientPressure, gasPressure } from "./gas-pressure";

const engine = {
  bore: 0.1,
  stroke: 0.09,
  rodLength: 0.15,
  reciprocatingMass: 0.55,
  rotatingMass: 0.4,
  peakPressure: 90e5,
  peakAngle: 14 * degrees,
  speed: 6000 * (Math.PI / 30),
};
const bearing = { diameter: 0.05334, length: 0.022, clearance: 63.5e-6 };
const viscosity = 0.008;

describe("one big end", () => {
  test("gives loads, orbit and what the gas model took for itself", () => {
    const cycle = engineCycle({ engine, bearing, viscosity });
    expect(cycle.loads).toHaveLength(720);
    expect(cycle.converged).toBe(true);
    expect(cycle.gas).toEqual({ compressionRatio: 12, intakePressure: ambientPressure });
  });

  test("a closer fit, thinner oil or more speed moves the film the way a builder expects", () => {
    const film = (change: object, oil = viscosity) =>
      engineCycle({ engine: { ...engine, ...change }, bearing, viscosity: oil }).leastFilm;
    expect(film({}, 0.004)).toBeLessThan(film({}));
    expect(film({ reciprocatingMass: 0.8 })).toBeLessThan(film({}));
    expect(
      engineCycle({ engine, bearing: { ...bearing, clearance: 100e-6 }, viscosity }).leastFilm,
    ).toBeLessThan(film({}));
  });

  test("a trace of the model's own pressure gives the model's own film", () => {
    const { at } = gasPressure(engine, engine);
    const pressureTrace = Array.from({ length: 1440 }, (_, index) => {
      const crankAngle = index * 0.5 * degrees;
      return { crankAngle, pressure: at(crankAngle) };
    });
    const { peakPressure, peakAngle, ...rest } = engine;
    const traced = engineCycle({ engine: { ...rest, pressureTrace }, bearing, viscosity });
    expect(traced.gas).toBeNull();
    expect(traced.leastFilm / engineCycle({ engine, bearing, viscosity }).leastFilm).toBeCloseTo(1, 6);
  });

  test.each([
    ["no bore", { bore: 0 }, "not-positive"],
    ["a rod too short for its throw", { rodLength: 0.048 }, "rod-too-short"],
    ["an offset past the throw", { pinOffset: 0.12 }, "rod-too-short"],
    ["a mass that is no number", { reciprocatingMass: Number.NaN }, "not-a-number"],
    ["a speed of 1e308", { speed: 1e308 }, "outside-range"],
  ])("%s is refused", (_, change, code) => {
    const wrong: EngineDuty = { ...engine, ...change };
    expect(() => engineCycle({ engine: wrong, bearing, viscosity })).toThrow(
      expect.objectContaining({ code }),
    );
  });
});

describe("all bearings of a V8", () => {
  const layout = crankOf(usualLayout("V", 8), 5);
  const whole = {
    engine,
    layout,
    bigEnds: Array.from({ length: 8 }, () => bearing),
    mains: Array.from({ length: 5 }, () => ({ diameter: 0.0622, length: 0.024, clearance: 68.6e-6 })),
    viscosity,
    balance: { throwMassMoment: -(0.4 * 2 + 0.55) * 0.045 },
  };

  test("like big ends run alike, and as one alone", () => {
    const { bigEnds, mains } = allBearings(whole);
    expect(bigEnds).toHaveLength(8);
    expect(mains).toHaveLength(5);
    const alone = engineCycle({ engine, bearing, viscosity });
    for (const each of bigEnds) expect(each.leastFilm).toBe(alone.leastFilm);
    for (const each of mains) expect(each.leastFilm).toBeGreaterThan(0);
  });

  test("the mains together carry what the rods and throws push with", () => {
    const { mains } = allBearings(whole);
    const { loads } = engineCycle({ engine, bearing, viscosity });
    // At crank angle 0 cylinder 1 is at firing and its rod lies along its bank's axis; summed over the mains, the
    // eight rods' forces are there, with nothing lost between throws and mains.
    const fires = [0, 630, 450, 180, 90, 360, 540, 270];
    const sum = fires.reduce(
      (total, fire, index) => {
        const place = (720 - fire) % 720;
        const point = loads[place]!;
        const rod = (index < 4 ? -45 : 45) * degrees - Math.asin(0.3 * Math.sin(place * degrees));
        return {
          x: total.x - point.x * Math.cos(rod) + point.y * Math.sin(rod),
          y: total.y - point.x * Math.sin(rod) - point.y * Math.cos(rod),
        };
      },
      { x: 0, y: 0 },
    );
    // The four balanced throws of a cross-plane crank cancel among themselves.
    expect(mains.reduce((total, main) => total + main.loads[0]!.x, 0)).toBeCloseTo(sum.x, 4);
    expect(mains.reduce((total, main) => total + main.loads[0]!.y, 0)).toBeCloseTo(sum.y, 4);
  });

  test("a bearing too few or mains that do not fit the throws are refused", () => {
    expect(() => allBearings({ ...whole, bigEnds: [bearing] })).toThrow(
      expect.objectContaining({ code: "bearing-count" }),
    );
    const four = { ...whole, layout: { ...layout, mains: 4 }, mains: whole.mains.slice(1) };
    expect(() => allBearings(four)).toThrow(expect.objectContaining({ code: "mains" }));
  });
});
