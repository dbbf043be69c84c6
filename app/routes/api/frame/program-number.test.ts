import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parseQuantity } from "~/engineering/quantity/parse";
import { readProgramNumber } from "./program-number";

const length = (text: string) => readProgramNumber(text, (written) => parseQuantity(written, "length"));

describe("a number that a program wrote", () => {
  it.each([
    ["6.35e-05 m", 63_500_000],
    ["2.54E-6m", 2_540_000],
    ["1e-3 in", 25_400_000],
    ["2.1025999999999998 in", 53_406_040_000],
    ["53.339999999999996 mm", 53_340_000_000],
    ["0.1000000000000000055511151231257827 mm", 100_000_000],
    ["2.1000 in", 53_340_000_000],
  ])("%s is %d pm", (text, picometres) => {
    expect(length(text).picometres).toBe(picometres);
  });

  it("keeps what was typed where a person could have typed it", () => {
    expect(length("2.1000 in")).toMatchObject({ typed: "2.1000 in", decimals: 4 });
    expect(length("1 7/8 in").picometres).toBe(47_625_000_000);
  });

  it("is refused where nobody can read it, as before", () => {
    for (const text of ["e5 in", "1e5000 in", "1e in", "1.2.3 in", "0x10 in", "Infinity in", "1e3"]) {
      expect(() => length(text), text).toThrow(expect.objectContaining({ name: "EngineeringError" }));
    }
  });

  // 8 decimals of an inch are 254 pm, so that half of that is the farthest a number can be moved.
  it("is never moved by more than 127 pm, whatever double it was", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-9, max: 10, noNaN: true }), (inches) => {
        const { picometres } = length(`${inches} in`);
        expect(Math.abs(picometres! - inches * 25.4e9)).toBeLessThanOrEqual(127.1);
      }),
    );
  });
});
