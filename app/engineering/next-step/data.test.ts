import { expect, test } from "vitest";
import {
  bigEndHistory,
  bigEnds,
  build,
  oil,
  tenth,
  thou,
  usual,
  withPosition,
} from "#test/support/big-end-history";
import { nextStep } from "./next-step";
import type { Iteration } from "./types";

// What a careful builder asks for first (issue 4, "Bad input"; common practice, no source). Every case starts from a
// history that would close: one clean build at the usual clearance, then the build in question.
function judged(change: Partial<Iteration>) {
  return nextStep(bigEndHistory(build(1, usual), build(2, usual, change)));
}

test("two clean teardowns at the usual clearance close the fit: what each case below spoils", () => {
  expect(judged({}).action).toBe("close");
});

test.each<[string, string, string, Partial<Iteration>]>([
  ["no hours", "hold", "no-hours", { hours: null }],
  ["hours of zero", "hold", "no-hours", { hours: 0 }],
  ["an hour and a half", "hold", "too-few-hours", { hours: 1.5 }],
  ["no oil", "hold", "no-oil", { oil: null }],
  ["an oil without viscosity", "hold", "oil-without-viscosity", { oil: { name: "A" } }],
  ["the number of the build before", "hold", "build-twice", { build: 1 }],
  ["no teardown", "hold", "not-torn-down", { positions: bigEnds(usual).map(untouched) }],
  ["one position measured", "measure-again", "too-few-positions", { positions: bigEnds(usual).slice(0, 1) }],
  [
    "three of eight measured",
    "measure-again",
    "too-few-positions",
    { positions: bigEnds(usual).slice(0, 3) },
  ],
  [
    "the readings of another engine",
    "measure-again",
    "another-engine",
    { positions: bigEnds(usual - 9 * tenth) },
  ],
  ["a copied column", "measure-again", "copied-readings", { positions: bigEnds(usual).map(alike) }],
  [
    "parts of unknown warmth",
    "measure-again",
    "temperature-unknown",
    { positions: bigEnds(usual).map((position) => ({ ...position, temperatureKnown: false })) },
  ],
  [
    "parts that were not graded",
    "measure-again",
    "not-graded",
    { positions: bigEnds(usual).map((position) => ({ ...position, grade: null })) },
  ],
  ["gauges whose zero moved", "measure-again", "gauges-moved", { positions: bigEnds(usual, { wear: -0.6 }) }],
  [
    "positions that grew metal everywhere",
    "measure-again",
    "negative-wear-everywhere",
    { positions: bigEnds(usual, { wear: -2.5 }) },
  ],
  [
    "gauges that cannot see a step",
    "measure-again",
    "uncertainty-over-step",
    { positions: bigEnds(usual).map((position) => ({ ...position, uncertainty: 4 * tenth })) },
  ],
  [
    "positions spread wider than a step",
    "measure-again",
    "spread",
    { positions: withPosition(bigEnds(usual), 4, at(usual + 3.7 * tenth)) },
  ],
])("a build with %s is answered %s", (_what, action, code, change) => {
  const answer = judged(change);
  expect(answer.action).toBe(action);
  expect(answer.step).toBe(0);
  expect(answer.target).toBe(usual);
  expect(answer.confidence).toBe(0);
  expect(answer.reasons[0]!.code).toBe(code);
});

test("two builds with the same date hold until it is clear which came first", () => {
  const answer = nextStep(
    bigEndHistory(
      build(1, usual, { date: "2031-04-02" }),
      build(2, usual - 2 * tenth, { date: "2031-04-02" }),
    ),
  );
  expect(answer.action).toBe("hold");
  expect(answer.reasons[0]!.text).toContain("2031-04-02");
});

test.each<[string, number]>([
  ["ten times what it should be", 10],
  ["a tenth of what it should be", 0.1],
  ["inches and millimetres swapped", 25.4],
  ["radial for diametral", 0.5],
])("one reading that is %s is left out with a caution, and the others go on", (likely, factor) => {
  const positions = bigEnds(usual);
  const slip = { clearance: positions[2]!.assembled!.clearance * factor };
  const answer = judged({ positions: withPosition(positions, 3, { assembled: slip }) });
  expect(answer.action).toBe("close");
  expect(answer.cautions).toContainEqual(
    expect.objectContaining({
      code: "typing-slip",
      values: expect.objectContaining({ position: 3, likely }),
    }),
  );
});

test("a position that seems to have grown metal is named as a measuring slip and left out", () => {
  const positions = bigEnds(usual);
  const grown = { clearance: positions[5]!.assembled!.clearance - 2 * tenth };
  const answer = judged({ positions: withPosition(positions, 6, { tornDown: grown }) });
  expect(answer.action).toBe("close");
  expect(answer.cautions.map(({ code }) => code)).toContain("negative-wear");
});

test("a fit that is known to have one position may be judged by it", () => {
  const history = bigEndHistory(build(1, usual, { positions: bigEnds(usual).slice(0, 1) }));
  expect(nextStep(history).action).toBe("measure-again");
  history.fit.positions = 1;
  expect(nextStep(history).action).toBe("close");
});

test("distress needs no gauge: it opens the fit even where nothing could be measured", () => {
  const torn = bigEnds(2.1 * thou, { grade: 4, damage: "wiping" }).map((position) => ({
    ...position,
    assembled: null,
    tornDown: null,
  }));
  const answer = nextStep(
    bigEndHistory(build(1, usual), build(2, 2.1 * thou, { hours: null, oil: null, positions: torn })),
  );
  expect(answer.action).toBe("open");
  expect(answer.target).toBe(usual);
  expect(answer.cautions.map(({ code }) => code)).toContain("poor-data-too");
});

test("a poor build in the past is left out of the evidence, with why", () => {
  const answer = nextStep(
    bigEndHistory(build(1, usual, { positions: bigEnds(usual).map(alike) }), build(2, usual, { oil })),
  );
  expect(answer.evidence.builds[0]).toMatchObject({ weight: 0, why: "copied-readings" });
  expect(answer.action).toBe("close");
});

test("impossible numbers are refused by name", () => {
  expect(() => nextStep(bigEndHistory(build(1, 0)))).toThrow(
    expect.objectContaining({ code: "not-positive", field: "iterations[0].target" }),
  );
  expect(() => nextStep(bigEndHistory(build(1, usual)), { largestStep: Number.NaN })).toThrow(
    expect.objectContaining({ field: "rules.largestStep" }),
  );
});

function untouched<T extends object>(position: T) {
  return { ...position, tornDown: null, grade: null };
}

function alike<T extends object>(position: T) {
  return { ...position, assembled: { clearance: usual }, tornDown: { clearance: usual + 0.1 * tenth } };
}

function at(clearance: number) {
  return { assembled: { clearance }, tornDown: { clearance: clearance + 0.1 * tenth } };
}
