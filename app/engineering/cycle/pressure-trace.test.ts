import { describe, expect, test } from "vitest";
import { EngineeringError } from "../engineering-error";
import { readPressureTrace, type TraceUnits, tracePressure } from "./pressure-trace";

const bar: TraceUnits = { pressure: "bar", zero: 0 };
const degrees = Math.PI / 180;

/** A made-up trace: 1 bar with a hump of 60 bar over 14° after firing. */
const hump = (angle: number) => 1 + 60 * Math.exp(-(((((angle + 1080) % 720) - 360 - 14) / 30) ** 2));

const csv = (from: number, to: number, step: number, write = (angle: number) => `${angle},${hump(angle)}`) =>
  Array.from({ length: Math.round((to - from) / step) + 1 }, (_, index) => write(from + index * step)).join(
    "\n",
  );

const codeOf = (text: string, units = bar): string => {
  try {
    readPressureTrace(text, units);
  } catch (error) {
    if (error instanceof EngineeringError) return error.code;
    throw error;
  }
  return "accepted";
};

describe("reading a pressure trace", () => {
  test("headings, commas, 0–720°, in Pa at the end", () => {
    const points = readPressureTrace(`Crank angle,Pressure\ndeg,bar\n${csv(0, 719, 1)}\n`, bar);
    expect(points).toHaveLength(720);
    expect(tracePressure(points)(14 * degrees)).toBeCloseTo(61e5, 0);
    expect(tracePressure(points)((14 - 720) * degrees)).toBeCloseTo(61e5, 0);
  });

  test("semicolons with decimal commas, −360–360° with its closing point, gauge pressure", () => {
    const text = csv(-360, 360, 2, (angle) => `${angle};${hump(angle).toFixed(6).replace(".", ",")}`);
    const points = readPressureTrace(text, { pressure: "bar", zero: 1e5 });
    expect(points).toHaveLength(360);
    expect(points[0]!.crankAngle).toBe(0);
    expect(tracePressure(points)(14 * degrees)).toBeCloseTo(62e5, 0);
    expect(tracePressure(points)(15 * degrees)).toBeCloseTo(
      (points[7]!.pressure + points[8]!.pressure) / 2,
      0,
    );
  });

  test("psi by their exact size (NIST SP 811)", () => {
    const points = readPressureTrace(
      csv(0, 719, 1, (angle) => `${angle}\t${hump(angle) * 14.5}`),
      { pressure: "psi", zero: 0 },
    );
    expect(points[14]!.pressure).toBeCloseTo(61 * 14.5 * 6894.757293168, 3);
  });

  test.each([
    ["empty text", "", "too-few-points"],
    ["a few points", csv(0, 720, 10), "too-few-points"],
    ["too many points", csv(0, 720, 0.03), "too-many-points"],
    ["a word among the numbers", csv(0, 719, 1).replace("\n300,", "\nabc,"), "not-a-number"],
    ["a missing pressure", csv(0, 719, 1).replace(/\n300,[^\n]*/, "\n300,"), "not-a-number"],
    ["an angle twice", csv(0, 719, 1).replace("\n300,", "\n299,"), "unsorted"],
    ["a hole", csv(0, 719, 1).replace(/\n300,[\d.,\n-e]*\n320,/, "\n320,"), "gap"],
    ["one turn only", csv(0, 359, 1), "wrong-span"],
    ["two cycles", csv(0, 1439, 1), "wrong-span"],
    [
      "firing at the other dead centre",
      csv(0, 719, 1, (angle) => `${angle},${hump(angle + 360)}`),
      "wrong-dead-centre",
    ],
  ])("%s is refused", (_, text, code) => {
    expect(codeOf(text)).toBe(code);
  });

  test.each(["Pa", "kPa", "MPa"] as const)(
    "a trace in bar said to be in %s is refused by its size",
    (pressure) => {
      expect(codeOf(csv(0, 719, 1), { pressure, zero: 0 })).toBe("wrong-unit");
    },
  );

  test("points that are no trace are refused", () => {
    expect(() => tracePressure([])).toThrow(EngineeringError);
    expect(() =>
      tracePressure(Array.from({ length: 100 }, () => ({ crankAngle: 1, pressure: 1e5 }))),
    ).toThrow(/rise/);
  });
});
