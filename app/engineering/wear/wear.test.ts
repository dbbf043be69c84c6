import { describe, expect, test } from "vitest";
import { beddingIn, runWear } from "./bedding-in";
import { compareBuilds, pairedT } from "./compare-builds";
import { fitLine } from "./fit-line";
import { oddOneOut, robustZ } from "./odd-one-out";
import { judgeWear, positionWear } from "./position-wear";
import { weightedTrend } from "./trend";
import { wearOfBuilds } from "./wear-of-builds";
import { wearRate } from "./wear-rate";

const micron = 1e-6;
const assembled = { bore: 53.4035e-3, journal: 53.34e-3 };

/** The same position torn down, with so many µm worn off bore and journal. */
function worn(bore: number, journal: number) {
  return { bore: assembled.bore + bore * micron, journal: assembled.journal - journal * micron };
}

describe("wear of a position", () => {
  test("is what the bore gained and the journal lost, each with its uncertainty", () => {
    const wear = positionWear(assembled, worn(2, 1), 0.5 * micron);
    expect(wear.bore.wear).toBeCloseTo(2 * micron, 12);
    expect(wear.journal.wear).toBeCloseTo(1 * micron, 12);
    expect(wear.clearance.wear).toBeCloseTo(3 * micron, 12);
    // Differences of two and of four independent readings (GUM, JCGM 100, 5.1.2).
    expect(wear.bore.uncertainty).toBeCloseTo(Math.SQRT2 * 0.5 * micron, 12);
    expect(wear.clearance.uncertainty).toBeCloseTo(2 * 0.5 * micron, 12);
    expect(wear.clearance.verdict).toBe("worn");
  });

  test("less than the gauges can see is not measurable, with the most it can be, and not zero", () => {
    const { clearance } = positionWear(assembled, worn(0.2, 0.1), 0.5 * micron);
    expect(clearance.verdict).toBe("not-measurable");
    expect(clearance.bound).toBeCloseTo(1.3 * micron, 12);
  });

  test("negative beyond its uncertainty is a measuring slip; within it, it is not", () => {
    expect(positionWear(assembled, worn(-3, 0), 0.5 * micron).clearance.verdict).toBe("slip");
    expect(positionWear(assembled, worn(-0.3, 0), 0.5 * micron).clearance).toMatchObject({
      verdict: "not-measurable",
      bound: 1 * micron,
    });
  });

  test("a journal larger than its bore is refused by name", () => {
    const swapped = { bore: assembled.journal, journal: assembled.bore };
    expect(() => positionWear(assembled, swapped, micron)).toThrow(
      expect.objectContaining({ code: "interference", field: "tornDown.journal" }),
    );
    expect(() => positionWear(assembled, worn(1, 1), 0)).toThrow(
      expect.objectContaining({ code: "not-positive", field: "uncertainty" }),
    );
  });

  test("per hour has limits that never fall below zero, and none for a slip", () => {
    const rate = wearRate(judgeWear(3 * micron, 1 * micron), 6);
    expect(rate.rate).toBeCloseTo(0.5 * micron, 12);
    expect(rate.limits!.from).toBeCloseTo((2 / 6) * micron, 12);
    expect(rate.limits!.to).toBeCloseTo((4 / 6) * micron, 12);
    expect(wearRate(judgeWear(0.2 * micron, 1 * micron), 6)).toMatchObject({
      measurable: false,
      limits: { from: 0 },
    });
    expect(wearRate(judgeWear(-4 * micron, 1 * micron), 6).rate).toBeNull();
    expect(() => wearRate(judgeWear(micron, micron / 2), 0)).toThrow(
      expect.objectContaining({ field: "hours" }),
    );
  });
});

describe("bedding-in", () => {
  test("is what the first run of a coating wore beyond the steady rate of those after it", () => {
    const later = [1.2, 1.0, 1.4].map((wear) => ({
      wear: wear * micron,
      uncertainty: 0.2 * micron,
      hours: 6,
    }));
    const result = beddingIn({ wear: 4.2 * micron, uncertainty: 0.2 * micron, hours: 6 }, later);
    expect(result.steadyRate).toBeCloseTo(0.2 * micron, 12);
    expect(result.beddingIn).toBeCloseTo(3 * micron, 12);
    expect(result.present).toBe(true);
  });

  test("that the gauges cannot tell from steady wear is not said to be present", () => {
    const run = { wear: 1.2 * micron, uncertainty: 0.4 * micron, hours: 6 };
    expect(beddingIn({ ...run, wear: 1.5 * micron }, [run, run]).present).toBe(false);
  });

  test("cannot be told from one run alone", () => {
    expect(() => beddingIn(runWear([micron, 2 * micron], micron, 6), [])).toThrow(
      expect.objectContaining({ code: "too-few-points", field: "later" }),
    );
  });
});

describe("the odd position out", () => {
  // By hand: median 1.1, absolute deviations 0, 0, 0.1, 0.1, 0.2, 0.2, 5 with median 0.1; z = 5 / (1.4826 × 0.1).
  test("is named by its robust z, which the odd one itself does not spoil", () => {
    const odd = oddOneOut([1.0, 1.2, 0.9, 1.1, 1.3, 6.1, 1.1]);
    expect(odd!.index).toBe(5);
    expect(odd!.robustZ).toBeCloseTo(5 / (1.482602218505602 * 0.1), 6);
    expect(oddOneOut([1.0, 1.2, 0.9, 1.1, 1.3, 1.6, 1.1])).toBeNull();
  });

  test("is none where the difference is less than the gauges can tell", () => {
    const values = [1, 1, 1, 1, 1, 1, 1, 2];
    expect(oddOneOut(values, 0.7)).toBeNull();
    expect(oddOneOut(values, 0.2)!.index).toBe(7);
    expect(robustZ(values)).toEqual([0, 0, 0, 0, 0, 0, 0, 0]);
  });

  test("cannot be told among three", () => {
    expect(oddOneOut([1, 1, 9], 0.1)).toBeNull();
  });
});

describe("builds compared", () => {
  const build = (values: number[]) => values.map((value, index) => ({ position: index + 1, value }));

  test("with the same positions are paired, which finds a rise that hides among unlike positions", () => {
    const paired = compareBuilds(build([1, 5, 9, 13]), build([1.5, 5.4, 9.6, 13.5]));
    expect(paired.method).toBe("paired");
    expect(paired.p!).toBeLessThan(0.01);
    const welch = compareBuilds(build([1, 5, 9, 13]), build([1.5, 5.4, 9.6]));
    expect(welch.method).toBe("welch");
    expect(welch.p!).toBeGreaterThan(0.5);
  });

  test("without any scatter cannot be tested, and that is said instead of a number", () => {
    expect(pairedT([1, 1, 1])).toMatchObject({ difference: 1, t: null, p: null, confidence95: null });
    expect(() => pairedT([1])).toThrow(expect.objectContaining({ code: "too-few-points" }));
  });
});

describe("a line", () => {
  test("through two points has no doubt of its own to tell", () => {
    const points = [
      { x: 0, y: 1 },
      { x: 2, y: 5 },
    ];
    expect(fitLine(points)).toMatchObject({ slope: 2, intercept: 1, slopeStandardError: null, r2: 1 });
    expect(weightedTrend(points.map((point) => ({ ...point, uncertainty: 1 }))).bandAt(1)).toBeNull();
  });

  test("without points, with one x only, or with a hole is refused", () => {
    expect(() => fitLine([])).toThrow(expect.objectContaining({ code: "too-few-points" }));
    const sameX = [1, 2, 3].map((y) => ({ x: 4, y }));
    expect(() => fitLine(sameX)).toThrow(expect.objectContaining({ code: "same-x" }));
    const hole = [...sameX, { x: Number.NaN, y: 1 }];
    expect(() => fitLine(hole)).toThrow(expect.objectContaining({ field: "points[3]" }));
  });

  test("counts a point twice as sure as four points", () => {
    const rough = [
      { x: 1, y: 2, uncertainty: 1 },
      { x: 2, y: 3, uncertainty: 1 },
      { x: 4, y: 7, uncertainty: 0.5 },
    ];
    const repeated = [
      rough[0]!,
      rough[1]!,
      ...Array.from({ length: 4 }, () => ({ ...rough[2]!, uncertainty: 1 })),
    ];
    expect(weightedTrend(rough).slope).toBeCloseTo(weightedTrend(repeated).slope, 12);
    expect(weightedTrend(rough).intercept).toBeCloseTo(weightedTrend(repeated).intercept, 12);
  });

  test("has a band that is narrowest at the middle of its points", () => {
    const trend = weightedTrend([1, 2, 3, 4, 5].map((x) => ({ x, y: x + (x % 2) * 0.2, uncertainty: 1 })));
    const width = (x: number) => trend.bandAt(x)!.to - trend.bandAt(x)!.from;
    expect(width(3)).toBeLessThan(width(1));
    expect(width(1)).toBeCloseTo(width(5), 12);
  });
});

describe("the wear of builds", () => {
  const build = (hours: number, wears: number[]) => ({
    hours,
    uncertainty: 0.3 * micron,
    positions: wears.map((wear, index) => ({
      position: index + 1,
      assembled,
      tornDown: worn(wear * 0.6, wear * 0.4),
    })),
  });

  test("over their hours gives the steady rate as slope and what each run wears at once as intercept", () => {
    const { trend } = wearOfBuilds(
      [2, 4, 8, 10].map((hours) => build(hours, [1 + 0.2 * hours, 1 + 0.2 * hours])),
    );
    expect(trend!.slope).toBeCloseTo(0.2 * micron, 12);
    expect(trend!.intercept).toBeCloseTo(1 * micron, 12);
  });

  test("names the odd position and leaves a slip out of the trend", () => {
    const { builds, trend } = wearOfBuilds([
      build(5, [1, 1.1, 0.9, 1, 7, 1]),
      build(10, [2, 2.1, -4, 2, 1.9, 2]),
    ]);
    expect(builds[0]!.oddOneOut!.position).toBe(5);
    expect(builds[1]!.positions[2]).toMatchObject({ rate: null, measurable: false });
    expect(trend).not.toBeNull();
    expect(wearOfBuilds([build(5, [1, 1])]).trend).toBeNull();
  });

  test("says which build a wrong number is in", () => {
    expect(() => wearOfBuilds([build(5, [1]), build(0, [1])])).toThrow(
      expect.objectContaining({ field: "builds[1].hours" }),
    );
  });
});
