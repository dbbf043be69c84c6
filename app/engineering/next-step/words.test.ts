import { expect, test } from "vitest";
import { bigEndHistory, build, tenth, thou, usual } from "#test/support/big-end-history";
import { chanceText, clearanceText, stepText } from "./lengths";
import { lambdaAt } from "./margin";
import { nextStep } from "./next-step";

test("lengths are written as the trade writes them", () => {
  expect(clearanceText(2.1 * thou, "inch")).toBe("0.0021 in");
  expect(clearanceText(2.15 * thou, "inch")).toBe("0.00215 in");
  expect(clearanceText(2.1 * thou, "metric")).toBe("53.3 µm");
  expect(stepText(-2 * tenth, "inch")).toBe("2 tenths (0.0002 in)");
  expect(stepText(tenth, "inch")).toBe("1 tenth (0.0001 in)");
  expect(stepText(1.5 * tenth, "metric")).toBe("3.8 µm");
});

test("chances are said as people say them", () => {
  expect(chanceText(0.7)).toBe("about 7 in 10");
  expect(chanceText(0.02)).toBe("about 1 in 50");
  expect(chanceText(0.0001)).toBe("less than 1 in 1000");
});

test("the same answer in other units has the same numbers and other words", () => {
  const history = bigEndHistory(build(1, usual), build(2, usual));
  const inch = nextStep(history, {}, "inch");
  const metric = nextStep(history, {}, "metric");
  expect(metric.reasons.map(({ code, values }) => ({ code, values }))).toEqual(
    inch.reasons.map(({ code, values }) => ({ code, values })),
  );
  const band = inch.reasons.find(({ code }) => code === "limit-band")!.text;
  expect(band).toMatch(/^7 in 10 that the limit lies between 0\.00\d+ in and 0\.00\d+ in\.$/);
  expect(metric.reasons.find(({ code }) => code === "limit-band")!.text).toContain("µm");
});

test("every answer says what would change it and what the program cannot see, and never that it is safe", () => {
  const answers = [
    nextStep(bigEndHistory(), { usual }),
    nextStep(bigEndHistory(build(1, usual))),
    nextStep(bigEndHistory(build(1, usual, { hours: null }))),
  ];
  for (const answer of answers) {
    expect(answer.wouldChange.length).toBeGreaterThan(0);
    expect(answer.cannotSee.length).toBeGreaterThan(2);
    expect(JSON.stringify(answer)).not.toMatch(/safe|undefined|NaN/);
  }
});

test("a film parameter is read between the points given and not beyond them", () => {
  const film = [
    { clearance: 60e-6, lambda: 2 },
    { clearance: 50e-6, lambda: 1 },
  ];
  expect(lambdaAt(film, 55e-6)).toBeCloseTo(1.5, 12);
  expect(lambdaAt(film, 50e-6)).toBe(1);
  expect(lambdaAt(film, 45e-6)).toBeNull();
  expect(lambdaAt(film, 65e-6)).toBeNull();
});
