import { expect, test } from "vitest";
import { positionClearance } from "~/engineering/clearance/position-clearance";

const inch = 0.0254;
const bore = (plane: "front" | "rear", axis: "vertical" | "plus45" | "minus45", inches: number) => ({
  plane,
  axis,
  value: inches * inch,
  temperatureC: 20,
});
const journal = (plane: "front" | "rear", axis: "a" | "b", inches: number) => ({
  plane,
  axis,
  value: inches * inch,
  temperatureC: 20,
});

// Worked by hand, in inches: vertical = mean(2.1026, 2.1024) − mean(2.1000, 2.0999, 2.1001, 2.1000) = 0.00250;
// least = 2.1023 − 2.1001 = 0.0022; most = 2.1026 − 2.0999 = 0.0027; bore out of round, front: 2.1026 − 2.1024;
// journal out of round 0.0001; bore taper = mean(0.0002, 0.0001, 0.0001); journal taper = mean(−0.0001, −0.0001).
test("a big end measured at ten stations", () => {
  const result = positionClearance({
    bore: [
      bore("front", "vertical", 2.1026),
      bore("front", "plus45", 2.1025),
      bore("front", "minus45", 2.1024),
      bore("rear", "vertical", 2.1024),
      bore("rear", "plus45", 2.1024),
      bore("rear", "minus45", 2.1023),
    ],
    journal: [
      journal("front", "a", 2.1),
      journal("front", "b", 2.0999),
      journal("rear", "a", 2.1001),
      journal("rear", "b", 2.1),
    ],
    boreExpansion: 12.3e-6,
    journalExpansion: 12.3e-6,
  });
  const inches = (value: number | undefined) => Number(((value as number) / inch).toFixed(9));
  expect(inches(result.vertical)).toBe(0.0025);
  expect(inches(result.least)).toBe(0.0022);
  expect(inches(result.most)).toBe(0.0027);
  expect(inches(result.boreOutOfRound)).toBe(0.0002);
  expect(inches(result.journalOutOfRound)).toBe(0.0001);
  expect(inches(result.boreTaper)).toBe(0.000133333);
  expect(inches(result.journalTaper)).toBe(-0.0001);
  expect(result).toMatchObject({ at20: true, interference: false, missing: [] });
});

test("what is missing is said, and what can be given is given", () => {
  const half = positionClearance({ bore: [bore("front", "vertical", 2.1025)], journal: [] });
  expect(half.bore).toBeCloseTo(2.1025 * inch, 12);
  expect(half.vertical).toBeUndefined();
  expect(half.missing).toEqual([
    "The bore is measured in one direction only: its out-of-round is not known.",
    "The bore is not measured front and rear on one axis: its taper is not known.",
    "No journal is measured.",
  ]);
  expect(half.at20).toBe(false);
});

test("a journal larger than its bore is an interference, not an error", () => {
  const tight = positionClearance({
    bore: [bore("front", "vertical", 2.0999)],
    journal: [journal("front", "a", 2.1)],
  });
  expect(tight.interference).toBe(true);
  expect(tight.vertical).toBeCloseTo(-0.0001 * inch, 12);
});
