import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ambientPressure, gasPressure } from "./gas-pressure";

const crank = { stroke: 0.09, rodLength: 0.15 };
const degrees = Math.PI / 180;

describe("the closed gas model", () => {
  test("has its peak where and as high as it is told, for any engine", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 20e5, max: 200e5, noNaN: true }),
        fc.double({ min: 0, max: 60 * degrees, noNaN: true }),
        fc.double({ min: 6, max: 20, noNaN: true }),
        (peakPressure, peakAngle, compressionRatio) => {
          const { at } = gasPressure(crank, { peakPressure, peakAngle, compressionRatio });
          expect(at(peakAngle)).toBeCloseTo(peakPressure, 3);
          for (let angle = 0; angle < 720; angle++) {
            expect(at(angle * degrees)).toBeLessThanOrEqual(peakPressure * (1 + 1e-12));
            expect(at(angle * degrees)).toBeGreaterThan(0);
          }
        },
      ),
      { numRuns: 30 },
    );
  });

  test("has no jump anywhere round the cycle", () => {
    const { at } = gasPressure(crank, { peakPressure: 90e5, peakAngle: 14 * degrees });
    for (let angle = 0; angle < 7200; angle++) {
      expect(Math.abs(at((angle + 1) * 0.1 * degrees) - at(angle * 0.1 * degrees))).toBeLessThan(1e5);
    }
  });

  test("compresses by the polytropic law: 12^1.32 times the intake at top dead centre without a burn before it", () => {
    // Peak at 60° burns from 20° on, so top dead centre is compression alone. Closed form; 1.32 from memory.
    const { at, intakePressure } = gasPressure(crank, { peakPressure: 90e5, peakAngle: 60 * degrees });
    expect(intakePressure).toBe(ambientPressure);
    expect(at(0) / (ambientPressure * 12 ** 1.32)).toBeCloseTo(1, 6);
  });

  test("takes a low peak as a throttled engine, and says so", () => {
    const { intakePressure, at } = gasPressure(crank, { peakPressure: 20e5, peakAngle: 15 * degrees });
    expect(intakePressure).toBeLessThan(ambientPressure);
    expect(at(-40 * degrees)).toBeLessThan(20e5);
  });

  test.each([
    [
      "a peak below compression",
      { peakPressure: 20e5, peakAngle: 0.2, intakePressure: 1e5 },
      /below what compression/,
    ],
    ["a peak before top dead centre", { peakPressure: 90e5, peakAngle: -0.1 }, /between 0/],
    ["no pressure", { peakPressure: 0, peakAngle: 0.2 }, /above zero/],
    ["no number", { peakPressure: Number.NaN, peakAngle: 0.2 }, /not a number/],
  ])("%s is refused", (_, gas, sentence) => {
    expect(() => gasPressure(crank, gas)).toThrow(sentence);
  });
});
