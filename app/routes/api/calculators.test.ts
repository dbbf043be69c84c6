import { beforeAll, describe, expect, it } from "vitest";
import study from "#test/reference/data/gauge-study.json";
import { type ApiCaller, apiCaller } from "#test/support/api";
import { openShopOfTests } from "#test/support/shop-of-tests";
import { endpoints } from "./endpoints";

let call: ApiCaller;

beforeAll(async () => {
  call = apiCaller((await openShopOfTests()).readToken);
});

const calculate = async (path: string, body: unknown) => {
  const { status, body: answer } = await call("POST", `/calc/${path}`, { body });
  expect([status, answer.errors]).toEqual([200, undefined]);
  return answer;
};

const refused = async (path: string, body: unknown) => {
  const { status, body: answer } = await call("POST", `/calc/${path}`, { body });
  expect(status).toBe(422);
  return answer.errors as { path: string; code: string }[];
};

const inch = 0.0254;

describe("the examples", () => {
  it("of every calculator are answered", async () => {
    const calculators = endpoints.filter(({ who }) => who === "token");
    expect(calculators.map(({ path }) => path)).toEqual(
      "convert clearance oil film cycle wear fit-line next-step gauge-study map"
        .split(" ")
        .map((one) => `/calc/${one}`),
    );
    for (const { path, example } of calculators) {
      for (const units of ["inch", "metric"]) {
        const { status, body } = await call("POST", `${path}?units=${units}`, { body: example });
        expect([path, status, body.errors]).toEqual([path, 200, undefined]);
      }
    }
  });
});

// The inch is 25.4 mm by definition (NIST SP 811, appendix B), so these are exact.
describe("/calc/convert", () => {
  it("gives 53.34 mm for 2.1 in, and each other unit by its name or another spelling of it", async () => {
    const to = ["mm", "micron", "thou", "tenth", "µin", "nm", "m", "in"];
    const { values } = await calculate("convert", { quantity: "2.1000 in", to });
    expect(values.map(({ number }: { number: number }) => number)).toEqual([
      53.34, 53_340, 2100, 21_000, 2_100_000, 53_340_000, 0.05334, 2.1,
    ]);
    expect(values.map(({ unit }: { unit: string }) => unit)).toEqual(to);
    expect(values[0]).toEqual({ unit: "mm", number: 53.34, text: "53.34 mm" });
  });

  it("takes a temperature by its scale, not its factor (NIST SP 811, B.8)", async () => {
    const { values } = await calculate("convert", { quantity: "95 degC", to: ["degF", "K"] });
    expect(values.map(({ number }: { number: number }) => number)).toEqual([203, 368.15]);
  });

  it("refuses a bare number, an unknown unit, one of something else, and what can be read in two ways", async () => {
    expect(await refused("convert", { quantity: "2.1", to: ["mm"] })).toMatchObject([
      { path: "quantity", code: "no-unit" },
    ]);
    expect(await refused("convert", { quantity: 2.1, to: ["mm"] })).toMatchObject([{ code: "no-unit" }]);
    expect(await refused("convert", { quantity: "2.1 cubits", to: ["mm"] })).toMatchObject([
      { code: "wrong-unit" },
    ]);
    expect(await refused("convert", { quantity: "2.1 in", to: ["mm", "psi"] })).toMatchObject([
      { path: "to[1]" },
    ]);
    expect(await refused("convert", { quantity: "1,234 in", to: ["mm"] })).toMatchObject([
      { code: "ambiguous" },
    ]);
  });
});

describe("/calc/clearance", () => {
  const reading = (plane: string, axis: string, value: string, temperature = "20 degC") => ({
    plane,
    axis,
    value,
    temperature,
  });
  const steel = { boreMaterial: "steel-4340", journalMaterial: "steel-4340" };

  // By hand: bore 2.1026 and 2.1024 vertical, mean 2.1025; journal 2.1000 and 2.0998, mean 2.0999.
  it("subtracts as one does by hand", async () => {
    const answer = await calculate("clearance", {
      bore: [reading("front", "vertical", "2.1026 in"), reading("rear", "vertical", "53.40096 mm")],
      journal: [reading("front", "a", "2.1000 in"), reading("rear", "a", "2099.8 thou")],
      ...steel,
      method: "absolute",
    });
    expect(answer.vertical.si / inch).toBeCloseTo(0.0026, 10);
    expect(answer.least.si / inch).toBeCloseTo(0.0024, 10);
    expect(answer.most.si / inch).toBeCloseTo(0.0028, 10);
    expect(answer.boreTaper.text).toBe("0.0002 in");
    expect(answer.journalTaper.text).toBe("0.0002 in");
    expect(answer.boreOutOfRound).toBeNull();
    expect(answer.at20).toBe(true);
    expect(answer.missing).toHaveLength(2);
  });

  // JCGM 100:2008, 4.3.7 and eq. 10: a step of 0.0001 in is ±0.00005 in, rectangular; without calibration or scatter
  // both steps are all there is but for the temperatures, which at 20 °C on one steel are under 5 % of the variance.
  it("says its uncertainty line by line", async () => {
    const gauge = { resolution: "1 tenth", calibration: "0 in", repeatability: "0 in" };
    const { uncertainty } = await calculate("clearance", {
      bore: [reading("front", "vertical", "2.1025 in")],
      journal: [reading("front", "a", "2.1000 in")],
      ...steel,
      boreGauge: gauge,
      journalGauge: gauge,
    });
    const step = (0.00005 * inch) / Math.sqrt(3);
    const [bore, journal] = uncertainty.budget;
    expect(bore.uncertainty.si).toBeCloseTo(step, 15);
    expect(journal.uncertainty.si).toBeCloseTo(step, 15);
    expect(uncertainty.combined.si / (step * Math.SQRT2)).toBeGreaterThan(1);
    expect(uncertainty.combined.si / (step * Math.SQRT2)).toBeLessThan(1.03);
    expect(uncertainty.expanded.si).toBeCloseTo(uncertainty.coverage * uncertainty.combined.si, 15);
    const shares = uncertainty.budget.map(({ share }: { share: number }) => share);
    expect(shares.reduce((sum: number, share: number) => sum + share, 0)).toBeCloseTo(1, 10);
  });

  it("gives what can be given and says what is missing", async () => {
    const bare = await calculate("clearance", {
      bore: [{ plane: "front", axis: "vertical", value: "53.4 mm" }],
    });
    expect([bare.vertical, bare.uncertainty, bare.at20]).toEqual([null, null, false]);
    expect(bare.missing.join(" ")).toMatch(/No journal is measured.*bore's material, a temperature/);
    expect((await calculate("clearance", {})).vertical).toBeNull();
  });

  it("refuses a part at 300 °C in a sentence", async () => {
    const bore = [reading("front", "vertical", "2.1025 in", "300 degC")];
    const { body } = await call("POST", "/calc/clearance", { body: { bore, ...steel } });
    expect(body.errors).toMatchObject([{ path: "bore[0].temperature", code: "out-of-range" }]);
    expect(body.errors[0].message).toBe(
      "This must be at least -40 °C and at most 200 °C; look at the value and its unit.",
    );
  });
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

describe("/calc/wear", () => {
  const build = (hours: number, wear: number) => ({
    hours,
    uncertainty: "0.00001 in",
    positions: [1, 2, 3, 4].map((position) => ({
      position,
      assembled: { bore: "2.1025 in", journal: "2.1000 in" },
      tornDown: { bore: `${2.1025 + wear / 2} in`, journal: `${2.1 - wear / 2} in` },
    })),
  });

  // By hand: 0.0001 in of bedding-in and 0.00002 in an hour, half of it on each part.
  it("finds the rate and the bedding-in that were put in", async () => {
    const answer = await calculate("wear", {
      builds: [build(5, 0.0002), build(10, 0.0003), build(15, 0.0004)],
    });
    const [first] = answer.builds[0].positions;
    expect(first.wear.si / inch).toBeCloseTo(0.0002, 9);
    expect(first.rate.si).toBeCloseTo((0.0002 * inch) / 5 / 3600, 16);
    expect([first.rate.text, first.measurable]).toEqual(["40.00 µin/h", true]);
    expect(answer.trend.slope.text).toBe("20.00 µin/h");
    expect(answer.trend.intercept.si / inch).toBeCloseTo(0.0001, 9);
    expect(answer.oddOneOut).toBeNull();
  });

  it("names the odd one out, what cannot be measured, and a slip", async () => {
    const odd = build(5, 0.0002);
    odd.positions[2]!.tornDown.bore = "2.1035 in";
    const none = build(5, 0);
    none.positions[3]!.tornDown.bore = "2.1015 in";
    const answer = await calculate("wear", { builds: [odd, none] });
    expect(answer.builds[0].oddOneOut).toMatchObject({ position: 3 });
    expect(answer.builds[1].positions[0]).toMatchObject({ verdict: "not-measurable", measurable: false });
    expect(answer.builds[1].positions[3]).toMatchObject({ verdict: "slip", rate: null });
    expect(answer.oddOneOut).toMatchObject({ build: 2, position: 4 });
    expect(answer.trend).toBeNull();
  });

  it("refuses a journal that is larger than its bore, and names it", async () => {
    const builds = [build(5, 0.0002)];
    builds[0]!.positions[1]!.assembled = { bore: "2.1000 in", journal: "2.1025 in" };
    expect(await refused("wear", { builds })).toMatchObject([{ code: "interference" }]);
  });
});

// NIST StRD, NoInt2: the certified values, to 12 digits.
it("/calc/fit-line gives the certified line through the origin", async () => {
  const points = [
    { x: 4, y: 3 },
    { x: 5, y: 4 },
    { x: 6, y: 4 },
  ];
  const line = await calculate("fit-line", { points, throughOrigin: true });
  expect(line.slope).toBeCloseTo(0.727272727272727, 12);
  expect(line.slopeStandardError).toBeCloseTo(0.0420827318078432, 12);
  expect(line.residualStandardDeviation).toBeCloseTo(0.369274472937998, 12);
  expect(line.r2).toBeCloseTo(0.993348115299335, 12);
  expect(await refused("fit-line", { points: [{ x: 1, y: 1 }] })).toMatchObject([{ code: "too-few-points" }]);
});

describe("/calc/gauge-study", () => {
  const readings = (as: (value: number) => unknown) =>
    study.values.flatMap((byPart, person) =>
      byPart.flatMap((trials, part) =>
        trials.map((value, trial) => ({
          person: "ABC"[person],
          part: part + 1,
          trial: trial + 1,
          value: as(value),
        })),
      ),
    );

  // AIAG, Measurement Systems Analysis, 4th ed., the worked study: printed results from memory, with rounded averages.
  it("gives the worked study's result, in plain numbers as it is printed", async () => {
    const { averageAndRange, anova } = await calculate("gauge-study", {
      readings: readings((value) => value),
    });
    expect(averageAndRange.repeatability.standardDeviation).toBeCloseTo(0.20188, 3);
    expect(averageAndRange.gauge.percentOfStudy).toBeCloseTo(26.68, 1);
    expect(averageAndRange.distinctCategories).toBe(5);
    expect(anova.gauge.standardDeviation).toBeCloseTo(0.302373, 4);
  });

  it("gives the same shares for lengths", async () => {
    const asLengths = readings((value) => `${(50 + value).toFixed(2)} um`);
    const { anova } = await calculate("gauge-study", { readings: asLengths, tolerance: "10 um" });
    expect(anova.gauge.standardDeviation.si).toBeCloseTo(0.302373e-6, 10);
    expect(anova.gauge.percentOfStudy).toBeCloseTo(27.86, 1);
    expect(anova.gauge.percentOfTolerance).toBeCloseTo((600 * 0.302373) / 10, 1);
  });

  it("refuses lengths and plain numbers in one study, and a study with a hole", async () => {
    const mixed = readings((value) => (value > 0 ? value : `${value} um`));
    expect(await refused("gauge-study", { readings: mixed })).toMatchObject([{ code: "mixed-units" }]);
    expect(await refused("gauge-study", { readings: readings((value) => value).slice(1) })).toMatchObject([
      { code: "incomplete" },
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

describe("/calc/next-step", () => {
  const example = endpoints.find(({ path }) => path === "/calc/next-step")!.example as {
    iterations: object[];
  };

  it("starts a fit without builds at the shop's usual clearance", async () => {
    const answer = await calculate("next-step", { ...example, iterations: [] });
    expect(answer).toMatchObject({
      action: "hold",
      target: { text: "0.0025 in" },
      reasons: [{ code: "start-at-usual" }],
    });
  });

  it("says its sentences in the caller's units", async () => {
    const { reasons, target } = await calculate("next-step?units=metric", { ...example, iterations: [] });
    expect(target.text).toBe("63.5 µm");
    expect(reasons[0].text).toContain("µm");
  });

  it("takes rules that are not given from the usual ones, and refuses one that nobody knows", async () => {
    const { rules: _, ...bare } = example as unknown as { rules: unknown };
    expect((await calculate("next-step", bare)).action).toBeDefined();
    expect(await refused("next-step", { ...example, rules: { largestSteps: "0.0002 in" } })).toMatchObject([
      { path: "rules", code: "unknown-field" },
    ]);
  });
});
