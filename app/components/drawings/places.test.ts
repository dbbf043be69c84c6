import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { clearanceTicks, plainTicks } from "./clearance-axis";
import { filmLevels } from "./film-levels";
import { besideEach, stackApart } from "./keep-apart";
import { spanOf } from "./scale";
import { stepSize, stepWords } from "./step-words";
import { cutTo } from "./text";

const inch = 0.0254;

describe("labels", () => {
  it("of seven builds at two places do not lie on each other nor on the places", () => {
    const places = [100, 100, 100, 100, 140, 140, 140].map((x, index) => ({ x, y: 100 + (index % 2) }));
    const labels = besideEach(places, 23, 35);
    for (const [index, label] of labels.entries()) {
      for (const place of places) {
        expect(Math.hypot(label.x - place.x, label.y - place.y)).toBeGreaterThanOrEqual(22.7);
      }
      for (const other of labels.slice(index + 1)) {
        expect(Math.hypot(label.x - other.x, label.y - other.y)).toBeGreaterThanOrEqual(35);
      }
    }
  });

  it("are one for each place, with numbers, however crowded", () => {
    const labels = besideEach(
      Array.from({ length: 80 }, () => ({ x: 0, y: 0 })),
      23,
      35,
    );
    expect(labels).toHaveLength(80);
    expect(labels.every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y))).toBe(true);
  });

  it("in a stack keep their order and their gap where the span has room", () => {
    const heights = fc.array(fc.double({ min: 0, max: 300, noNaN: true }), { minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(heights, (given) => {
        const stacked = stackApart(given, 18, 0, 300);
        const order = given.map((_, index) => index).sort((a, b) => given[a]! - given[b]!);
        for (const [place, index] of order.entries()) {
          expect(stacked[index]!).toBeGreaterThanOrEqual(-1e-9);
          expect(stacked[index]!).toBeLessThanOrEqual(300 + 1e-9);
          if (place > 0)
            expect(stacked[index]! - stacked[order[place - 1]!]!).toBeGreaterThanOrEqual(18 - 1e-9);
        }
      }),
    );
  });

  it("that are too long for their room are cut, and left away where there is none", () => {
    expect(cutTo("10W-40", 60)).toBe("10W-40");
    expect(cutTo("Bench forty, 10W-40", 60)).toBe("Bench f…");
    expect(cutTo("10W-40", 8)).toBe("");
  });
});

describe("ticks", () => {
  it("of inches have four decimals and no zero before the point", () => {
    const ticks = clearanceTicks({ from: 0.0014 * inch, to: 0.003 * inch }, "inch", 8);
    expect(ticks.map(({ text }) => text)).toEqual([
      ".0014",
      ".0016",
      ".0018",
      ".0020",
      ".0022",
      ".0024",
      ".0026",
      ".0028",
      ".0030",
    ]);
    expect(ticks[0]!.value / inch).toBeCloseTo(0.0014, 12);
  });

  it("have as many decimals as tell them apart", () => {
    expect(
      clearanceTicks({ from: 0.002 * inch, to: 0.0021 * inch }, "inch", 5).map(({ text }) => text),
    ).toEqual([".00200", ".00202", ".00204", ".00206", ".00208", ".00210"]);
    expect(clearanceTicks({ from: 40e-6, to: 60e-6 }, "metric", 4).map(({ text }) => text)).toEqual([
      "40",
      "45",
      "50",
      "55",
      "60",
    ]);
    expect(plainTicks({ from: 0, to: 0.7 }, 4).map(({ text }) => text)).toEqual(["0.0", "0.2", "0.4", "0.6"]);
  });

  it("of a span of nothing is the one value", () => {
    expect(clearanceTicks({ from: 50e-6, to: 50e-6 }, "metric", 5).map(({ text }) => text)).toEqual(["50"]);
  });
});

describe("spans", () => {
  it("have air around what they show, also around one value and around none", () => {
    expect(spanOf([10, 20], 1, 0.1)).toEqual({ from: 9, to: 21 });
    expect(spanOf([10], 1)).toEqual({ from: 9, to: 11 });
    expect(spanOf([], 1)).toEqual({ from: 0, to: 2 });
  });
});

describe("film levels", () => {
  it("are round, inside the range and not too many", () => {
    expect(filmLevels([0.4e-6, 11e-6], 20).map((level) => Number((level * 1e6).toFixed(6)))).toEqual([
      0.5, 0.7, 1, 1.5, 2, 3, 4, 5, 7, 10,
    ]);
    expect(filmLevels([0.4e-6, 11e-6], 5).length).toBeLessThanOrEqual(5);
  });

  it("are evenly spaced in a narrow range", () => {
    expect(filmLevels([3.9e-6, 7.2e-6], 4).map((level) => Number((level * 1e6).toFixed(6)))).toEqual([
      4, 5, 6, 7,
    ]);
  });

  it("are none where there is no film", () => {
    expect(filmLevels([], 5)).toEqual([]);
    expect(filmLevels([0, 0], 5)).toEqual([]);
  });
});

describe("steps in words", () => {
  it("say the direction and the size without a zero that says nothing", () => {
    expect(stepWords({ from: 0.0022 * inch, to: 0.0021 * inch }, "inch")).toBe("close by .0001");
    expect(stepWords({ from: 0.0022 * inch, to: 0.00235 * inch }, "inch")).toBe("open by .00015");
    expect(stepWords({ from: 50e-6, to: 50e-6 }, "metric")).toBe("hold");
    expect(stepSize(-2.5e-6, "metric")).toBe("2.5");
  });
});
