import { expect, test } from "vitest";
import { formatLength } from "./format";
import { parseQuantity } from "./parse";

const pm = (text: string, options = {}) => parseQuantity(text, "length", options).picometres;

test.each([
  ["2.1000 in", 53_340_000_000],
  ['2.1000"', 53_340_000_000],
  ["53.34mm", 53_340_000_000],
  ["53,34 mm", 53_340_000_000],
  ["2.5 thou", 63_500_000],
  ["2.5 mil", 63_500_000],
  ["25 tenths", 63_500_000],
  ["1 tenth", 2_540_000],
  ["12 uin", 304_800],
  ['12 u"', 304_800],
  ["12 µin", 304_800],
  ["12 μin", 304_800],
  ["0.4 µm", 400_000],
  ["0.4 micron", 400_000],
  ["1 7/8 in", 47_625_000_000],
  ["7/8 in", 22_225_000_000],
  [".0025 in", 63_500_000],
  ["  002.1000\u00a0in ", 53_340_000_000],
  ["0.01 uin", 254],
  ["5 nm", 5_000],
])("reads %s exactly", (text, expected) => {
  expect(pm(text)).toBe(expected);
});

test("a bare number takes the page's unit, and is refused where there is none", () => {
  expect(pm("2.1000", { defaultUnit: "in" })).toBe(53_340_000_000);
  expect(() => pm("2.1000")).toThrow(/Say the unit/);
});

test("a sign makes an offset from the nominal", () => {
  const nominal = 53_340_000_000;
  expect(pm("+3 tenths", { nominal })).toBe(nominal + 7_620_000);
  expect(pm("-.0002", { nominal, defaultUnit: "in" })).toBe(nominal - 5_080_000);
});

test("what can be read two ways is refused with both readings named", () => {
  expect(() => pm("1,234 in")).toThrow("1,234 can be read as 1.234 or 1234");
  expect(pm("0,234 in")).toBe(5_943_600_000);
  expect(pm("1,234.5 mm")).toBe(1_234_500_000_000);
});

test.each([
  ["", "empty"],
  ["=1+1", "not-a-number"],
  ["NaN", "not-a-number"],
  ["Infinity in", "not-a-number"],
  ["1e308 in", "wrong-unit"],
  ["2.1 psi", "wrong-unit"],
  ["2.1 furlongs", "wrong-unit"],
  ["🔧", "not-a-number"],
  ["\u202e2.1 in", "not-a-number"],
  ["2 1 in", "not-a-number"],
  ["9".repeat(30), "too-large"],
  ["9".repeat(1_000_000), "too-long"],
  ["0.001 nm", "ok"],
  ["0.0001 nm", "too-fine"],
])("%s is %s", (text, code) => {
  const read = () => pm(text, { defaultUnit: "in" });
  if (code === "ok") expect(read()).toBe(1);
  else expect(read).toThrow(expect.objectContaining({ code }));
});

test("formats half to even, with or without the leading zero", () => {
  expect(formatLength(63_500_000, "in", 4)).toBe("0.0025");
  expect(formatLength(63_500_000, "in", 4, { dropLeadingZero: true })).toBe(".0025");
  expect(formatLength(6_350_000, "in", 4)).toBe("0.0002");
  expect(formatLength(8_890_000, "in", 4)).toBe("0.0004");
  expect(formatLength(-1, "in", 4)).toBe("0.0000");
});
