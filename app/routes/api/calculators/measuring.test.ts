import { beforeAll, describe, expect, it } from "vitest";
import study from "#test/reference/data/gauge-study.json";
import { type Calculators, calculators } from "#test/support/api";
import { openShopOfTests } from "#test/support/shop-of-tests";

const inch = 0.0254;

let calculate: Calculators["calculate"];
let refused: Calculators["refused"];

beforeAll(async () => {
  ({ calculate, refused } = calculators((await openShopOfTests()).readToken));
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
    const [error] = await refused("clearance", { bore, ...steel });
    expect(error).toMatchObject({ path: "bore[0].temperature", code: "out-of-range" });
    expect(error!.message).toBe(
      "This must be at least -40 °C and at most 200 °C; look at the value and its unit.",
    );
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
