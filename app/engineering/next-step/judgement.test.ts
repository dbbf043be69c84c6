import fc from "fast-check";
import { expect, test } from "vitest";
import { nextStep } from "./next-step";
import type { History, Iteration, PositionOfBuild, Rules } from "./types";
import { inUnits } from "./words";

const thou = 25.4e-6;
const tenth = thou / 10;

const rules: Rules = {
  usual: 2.5 * thou,
  largestStep: 2 * tenth,
  leastHours: 2,
  stopGrade: 3,
  baselineRuns: 1,
};

const oil = { name: "A", grade: "10W-40", kv40: 95, kv100: 14.2, temperatureC: 104 };

/** Eight big ends scattered by half a tenth, each worn by a tenth of a tenth, all of one grade. */
function positions(clearance: number, change: Partial<PositionOfBuild> = {}): PositionOfBuild[] {
  return Array.from({ length: 8 }, (_, index) => {
    const built = clearance + ((index % 4) - 1.5) * 0.25 * tenth;
    return {
      position: index + 1,
      assembled: { clearance: built },
      tornDown: { clearance: built + 0.1 * tenth },
      uncertainty: 0.5 * tenth,
      temperatureKnown: true,
      grade: 1,
      damage: null,
      coatingState: "intact",
      ...change,
    };
  });
}

function build(number: number, target: number, change: Partial<Iteration> = {}): Iteration {
  return { build: number, target, hours: 6.5, oil, events: [], positions: positions(target), ...change };
}

function history(...iterations: Iteration[]): History {
  return {
    fit: {
      kind: "big-end",
      nominal: 2.1 * 1000 * thou,
      positions: 8,
      hardLimits: { least: 1.2 * thou, most: 3.2 * thou },
      coating: null,
    },
    iterations,
  };
}

const usual = 2.5 * thou;

test("after a clean build at the usual clearance a big end closes by at most the largest step", () => {
  const answer = nextStep(history(build(1, usual)), rules);
  expect(answer.action).toBe("close");
  expect(answer.subject).toBe("clearance");
  expect(answer.step).toBeLessThan(0);
  expect(answer.step).toBeGreaterThanOrEqual(-2 * tenth - 1e-12);
  expect(answer.target).toBeCloseTo(usual + answer.step, 12);
  expect(answer.reasons.length).toBeGreaterThan(0);
  expect(answer.cannotSee.length).toBeGreaterThan(0);
});

test("a stored reason says the same in other units", () => {
  const [reason] = nextStep(history(build(1, usual)), rules).reasons;
  expect(reason?.text).toContain(" in");
  expect(inUnits(reason!, "metric")).toContain("µm");
  expect(inUnits(reason!, "inch")).toBe(reason?.text);
  expect(inUnits({ code: "of-another-version", text: "As it was.", values: {} }, "metric")).toBe(
    "As it was.",
  );
});

test("a new coating holds at the usual clearance until its baseline is built", () => {
  const coated = { ...history(build(1, usual)) };
  coated.fit.coating = { kind: "dry-film", isNew: true };
  const answer = nextStep(coated, { ...rules, baselineRuns: 2 });
  expect(answer.action).toBe("hold");
  expect(answer.step).toBe(0);
});

test("a wiped shell after a step opens the fit back up", () => {
  const wiped = build(2, usual - 4 * tenth, {
    positions: positions(usual - 4 * tenth, {
      grade: 3,
      damage: "wiping",
      tornDown: { clearance: usual - tenth },
    }),
  });
  const answer = nextStep(history(build(1, usual), wiped), rules);
  expect(answer.action).toBe("open");
  expect(answer.target).toBeGreaterThan(wiped.target);
  expect(answer.target).toBeLessThanOrEqual(usual + 1e-9);
});

test("debris in one position is not the clearance's fault", () => {
  const marked = positions(usual);
  marked[2] = { ...marked[2]!, grade: 3, damage: "embedded-particles" };
  const answer = nextStep(history(build(1, usual, { positions: marked })), rules);
  expect(answer.action).toBe("find-cause");
  expect(answer.step).toBe(0);
});

test("an oil that changed in the last build holds the clearance: one thing at a time", () => {
  const thin = { ...oil, name: "B", grade: "5W-30", kv40: 60, kv100: 10.4 };
  const answer = nextStep(history(build(1, usual), build(2, usual - 2 * tenth, { oil: thin })), rules);
  expect(["hold", "open"]).toContain(answer.action);
  expect(answer.step).toBeGreaterThanOrEqual(0);
});

test.each<[string, Partial<Iteration>]>([
  ["no hours written down", { hours: null }],
  ["hardly run at all", { hours: 0.4 }],
  ["no oil written down", { oil: null }],
  ["one position measured of eight", { positions: positions(usual).slice(0, 1) }],
  ["nothing torn down", { positions: positions(usual, { tornDown: null }) }],
  ["no part graded", { positions: positions(usual, { grade: null }) }],
  ["every position a hundred times off", { positions: positions(usual * 100) }],
  ["parts at an unknown temperature", { positions: positions(usual, { temperatureKnown: false }) }],
  ["gauges that cannot see a step", { positions: positions(usual, { uncertainty: 6 * tenth }) }],
  ["parts that grew", { positions: positions(usual, { tornDown: { clearance: usual - 4 * tenth } }) }],
])("with %s there is no step closer, and a reason", (_what, change) => {
  const answer = nextStep(history(build(1, usual, change)), rules);
  expect(["measure-again", "hold", "find-cause"]).toContain(answer.action);
  expect(answer.step).toBeGreaterThanOrEqual(0);
  expect(answer.reasons[0]?.text.length).toBeGreaterThan(10);
});

test("with no build at all the fit starts at its usual clearance", () => {
  const answer = nextStep(history(), rules);
  expect(answer.target).toBeCloseTo(usual, 12);
  expect(answer.step).toBe(0);
});

test("whatever the history, the target stays inside the hard limits, a closing step is at most the largest, and the answer is the same again", () => {
  const anyBuild = fc.record({
    target: fc.double({ min: 1.3 * thou, max: 3.1 * thou, noNaN: true }),
    hours: fc.option(fc.double({ min: 0, max: 20, noNaN: true })),
    grade: fc.integer({ min: 0, max: 4 }),
    wear: fc.double({ min: -tenth, max: 3 * tenth, noNaN: true }),
    damage: fc.constantFrom(null, "wiping", "embedded-particles", "corrosion", "overheating"),
    events: fc.subarray(["debris", "pressure-dip", "over-rev"]),
  });
  fc.assert(
    fc.property(fc.array(anyBuild, { maxLength: 8 }), (builds) => {
      const given = history(
        ...builds.map(({ target, hours, grade, wear, damage, events }, index) =>
          build(index + 1, target, {
            hours,
            events,
            positions: positions(target, { grade, damage }).map((position) => ({
              ...position,
              tornDown: { clearance: position.assembled!.clearance + wear },
            })),
          }),
        ),
      );
      const answer = nextStep(given, rules);
      expect(nextStep(given, rules)).toEqual(answer);
      expect(answer.target).toBeGreaterThanOrEqual(1.2 * thou - 1e-12);
      expect(answer.target).toBeLessThanOrEqual(3.2 * thou + 1e-12);
      if (answer.action === "close") expect(answer.step).toBeGreaterThanOrEqual(-2 * tenth - 1e-12);
      expect(answer.confidence).toBeGreaterThanOrEqual(0);
      expect(answer.confidence).toBeLessThanOrEqual(1);
      expect(JSON.stringify(answer)).not.toMatch(/NaN|Infinity|safe to run/);
    }),
    { numRuns: 150 },
  );
});
