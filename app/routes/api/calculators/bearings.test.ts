import { beforeAll, describe, expect, it } from "vitest";
import { type Calculators, calculators } from "#test/support/api";
import { openShopOfTests } from "#test/support/shop-of-tests";

const inch = 0.0254;

let calculate: Calculators["calculate"];
let refused: Calculators["refused"];

beforeAll(async () => {
  ({ calculate, refused } = calculators((await openShopOfTests()).readToken));
});

describe("/calc/oil", () => {
  // ASTM D341 in a published worked example: 32 mm²/s at 40 °C and 5.4 at 100 °C give 8.5 at 80 °C, as printed.
  it("draws the line of ASTM D341 through two viscosities", async () => {
    const { points } = await calculate("oil", {
      kv40: "32 cSt",
      kv100: "5.4 mm2/s",
      temperatures: ["80 degC", "176 degF"],
    });
    expect(points[0].kinematic.si * 1e6).toBeCloseTo(8.5, 1);
    expect(points[1].kinematic.si).toBeCloseTo(points[0].kinematic.si, 12);
    expect(points[0].dynamic.si).toBeCloseTo(points[0].kinematic.si * points[0].density.si, 12);
    expect(points[0].temperature).toEqual({ si: 80, text: "80.0 °C" });
  });

  // ASTM D2270, its worked examples.
  it.each([
    ["73.3 cSt", "8.86 cSt", 92],
    ["22.83 cSt", "5.05 cSt", 156],
  ])("gives %s and %s a viscosity index of %d", async (kv40, kv100, index) => {
    expect((await calculate("oil", { kv40, kv100 })).viscosityIndex).toBe(index);
  });

  it("takes any two points in place of those at 40 and 100 °C", async () => {
    const { points: given } = await calculate("oil", {
      kv40: "110 cSt",
      kv100: "14.5 cSt",
      temperatures: ["60 degC", "130 degC"],
    });
    const { points } = await calculate("oil", {
      points: given.map(({ temperature, kinematic }: Record<string, unknown>) => ({
        temperature,
        kinematic,
      })),
      temperatures: ["40 degC"],
    });
    expect(points[0].kinematic.si * 1e6).toBeCloseTo(110, 6);
  });

  it("refuses exchanged viscosities, and neither or both ways of giving them", async () => {
    expect(await refused("oil", { kv40: "9 cSt", kv100: "90 cSt" })).toMatchObject([
      { path: "kv100", code: "viscosity-order" },
    ]);
    expect(await refused("oil", { kv40: "90 cSt" })).toMatchObject([{ code: "missing" }]);
  });
});

describe("/calc/film", () => {
  // Shigley's Mechanical Engineering Design, examples 12-1 to 12-4: inputs as commonly printed, answers from memory
  // and read off charts, so 3 %; a microreyn is 6.894757 mPa·s.
  it("agrees with the handbook's example through the API's units", async () => {
    const film = await calculate("film", {
      diameter: "1.5 in",
      length: "1.5 in",
      clearance: "0.003 in",
      speed: "1800 rpm",
      load: "500 lbf",
      viscosity: "27.579 mPa s",
      roughness: { bore: "16 uin", journal: "8 uin" },
    });
    const printed: [number, number][] = [
      [film.sommerfeld, 0.135],
      [film.leastFilm.si / inch, 0.00063],
      [film.eccentricityRatio, 0.58],
      [(film.attitude * 180) / Math.PI, 53],
      [film.frictionCoefficient, 0.007],
      [film.specificLoad.si / 6894.757, 222.2],
      [film.peakPressure.si / 6894.757, 529],
      [film.sideFlow.si / inch ** 3, 0.142],
      [film.frictionPower.si / 1055.056, 0.0529],
    ];
    for (const [found, print] of printed) expect(Math.abs(found / print - 1)).toBeLessThan(0.03);
    expect(film.specificLoad.text).toMatch(/^222\.2\d* psi$|^222\.2 psi$/);
    expect(film.regime).toBe("full");
  });

  it("balances the heat of an oil, and takes back quantities that it gave", async () => {
    const duty = {
      diameter: "53.34 mm",
      length: "21.6 mm",
      clearance: "0.0635 mm",
      speed: "7200 rpm",
      load: "12 kN",
    };
    const film = await calculate("film?units=metric", {
      ...duty,
      oil: { kv40: "110 cSt", kv100: "16.2 cSt" },
      supplyTemperature: "95 degC",
    });
    expect(film.effectiveTemperature.si).toBeCloseTo(95 + film.temperatureRise.si / 2, 3);
    const again = await calculate("film", { ...duty, viscosity: film.effectiveViscosity });
    expect(again.leastFilm.si).toBeCloseTo(film.leastFilm.si, 12);
    expect(again.lambda).toBeNull();
  });

  it("names what is missing or said twice by the API's own fields", async () => {
    const duty = { diameter: "53 mm", length: "21 mm", clearance: "0.06 mm", speed: "7200 rpm" };
    expect(await refused("film", { ...duty, viscosity: "12 mPa s" })).toMatchObject([
      { path: "load", code: "missing" },
    ]);
    const oil = { kv40: "110 cSt", kv100: "16.2 cSt" };
    expect(await refused("film", { ...duty, load: "12 kN", oil })).toMatchObject([
      { path: "supplyTemperature" },
    ]);
  });
});

describe("/calc/cycle", () => {
  const bearing = { diameter: "53.34 mm", length: "21.6 mm", clearance: "0.0025 in" };

  it("settles under a constant load to the steady film at that load", async () => {
    const loads = Array.from({ length: 37 }, (_, index) => ({
      crankAngle: (index * Math.PI) / 18,
      x: "12 kN",
      y: "0 N",
    }));
    const cycle = await calculate("cycle", {
      bearing,
      viscosity: "10 mPa s",
      loads,
      speed: "7200 rpm",
      sleeveFixed: true,
    });
    const steady = await calculate("film", {
      ...bearing,
      viscosity: "10 mPa s",
      load: "12 kN",
      speed: "7200 rpm",
    });
    expect(cycle.converged).toBe(true);
    // Two ways to the same Reynolds equation: 2 % is what the core's own test holds them to.
    expect(Math.abs(cycle.leastFilm.si / steady.leastFilm.si - 1)).toBeLessThan(0.02);
    expect(cycle.orbit).toHaveLength(360);
    expect(cycle.loads).toBeUndefined();
    expect(cycle.shareBelow).toBeUndefined();
  });

  // At top dead centre of the exchange the gas is near the surroundings' pressure, so the load is that of inertia:
  // −(m_rec (1 + λ) + m_rot) r ω² along the rod (the linkage's own closed form), the gas within 2 % of it.
  it("gives the loads of an engine, and how long the film is thin", async () => {
    const engine = {
      bore: "4.125 in",
      stroke: "3.25 in",
      rodLength: "6.5 in",
      reciprocatingMass: "600 g",
      rotatingMass: "0.5 kg",
      peakPressure: "95 bar",
      peakAngle: 0.21,
      speed: "8500 rpm",
    };
    const cycle = await calculate("cycle", { bearing, viscosity: "10 mPa s", engine, filmLimit: "2 um" });
    const radius = 1.625 * inch;
    const speed = (8500 * Math.PI) / 30;
    const inertia = (0.6 * 1.25 + 0.5) * radius * speed ** 2;
    const exchange = cycle.loads.find(
      ({ crankAngle }: { crankAngle: number }) => Math.abs(crankAngle - 2 * Math.PI) < 1e-6,
    );
    expect(Math.abs(-exchange.x.si / inertia - 1)).toBeLessThan(0.02);
    expect(cycle.shareBelow).toBeGreaterThan(0);
    expect(cycle.shareBelow).toBeLessThan(1);
  });

  it("refuses a cycle without loads, or without what its oil is", async () => {
    expect(await refused("cycle", { bearing, viscosity: "10 mPa s" })).toMatchObject([{ path: "loads" }]);
    expect(await refused("cycle", { bearing, loads: [], speed: "1000 rpm" })).toMatchObject([
      { path: "viscosity" },
    ]);
  });
});

it("/calc/map gives in each cell what /calc/film gives there", async () => {
  const duty = { speed: "7200 rpm", load: "12 kN", roughness: { bore: "12 uin", journal: "4 uin" } };
  const bearing = { diameter: "2.1000 in", length: "0.85 in" };
  const map = await calculate("map", {
    bearing,
    ...duty,
    clearances: ["0.0015 in", "0.0025 in", 3],
    viscosities: ["6 mPa s", "12 mPa s", 2],
  });
  const film = await calculate("film", {
    ...bearing,
    ...duty,
    clearance: "0.0020 in",
    viscosity: "12 mPa s",
  });
  expect(map.clearances.map(({ text }: { text: string }) => text)).toEqual([
    "0.0015 in",
    "0.0020 in",
    "0.0025 in",
  ]);
  expect(map.leastFilm[1][1].si).toBeCloseTo(film.leastFilm.si, 12);
  expect(map.lambda[1][1]).toBeCloseTo(film.lambda, 9);
  expect(map.frictionPower[1][1].si).toBeCloseTo(film.frictionPower.si, 6);
});
