import { expect, test } from "vitest";
import { format, formatLength } from "~/engineering/quantity/format";
import { parseQuantity } from "~/engineering/quantity/parse";
import { fromCore, type QuantityKind, type UnitName } from "~/engineering/quantity/units";

// NIST SP 811 (2008), appendix B: factors exact by definition (inch, pound, standard gravity) and their products to
// 15 figures. Read in a copy of that appendix; bar and lbf·ft follow from the definitions.
test.each<[string, QuantityKind, UnitName, number]>([
  ["1 in", "length", "mm", 25.4],
  ["1 uin", "finish", "um", 0.0254],
  ["1 thou", "small-length", "um", 25.4],
  ["1 lbf", "force", "N", 4.4482216152605],
  ["1 psi", "pressure", "kPa", 6.89475729316836],
  ["1 bar", "pressure", "kPa", 100],
  ["1 cP", "dynamic-viscosity", "mPa s", 1],
  ["1 cSt", "kinematic-viscosity", "mm2/s", 1],
  ["100 cSt", "kinematic-viscosity", "m2/s", 0.0001],
  ["1 lbf ft", "torque", "N m", 1.3558179483314],
  ["1 rpm", "speed", "rad/s", 0.10471975511966],
])("%s (%s) in %s is %d", (text, kind, unit, factor) => {
  // Relative 1e-14: the printed factor has 15 figures, a double somewhat more.
  expect(fromCore(parseQuantity(text, kind).si, unit) / factor).toBeCloseTo(1, 13);
});

// °C = (°F − 32) / 1.8 (NIST SP 811, B.8); fixed points, the last two by arithmetic.
test.each([
  ["32 degF", 0],
  ["212 degF", 100],
  ["-40 degF", -40],
  ["68 degF", 20],
  ["104 degF", 40],
  ["100 degF", 37.7777777777778],
  ["293.15 K", 20],
])("%s is %d °C", (text, expected) => {
  // 1e-12 °C: 295 − 273.15 loses the last bits of a double.
  expect(parseQuantity(text, "temperature").si).toBeCloseTo(expected, 12);
});

// Arithmetic of exact units, as the trade states it: 1 thou = 10 tenths = 25.4 µm, 1 tenth = 2.54 µm.
test("a tenth is 2.54 µm and a thou ten of them, exactly", () => {
  expect(formatLength(parseQuantity("1 tenth", "small-length").picometres!, "um", 6)).toBe("2.540000");
  expect(formatLength(parseQuantity("1 thou", "small-length").picometres!, "tenths", 6)).toBe("10.000000");
  expect(formatLength(parseQuantity("0.01 uin", "finish").picometres!, "nm", 6)).toBe("0.254000");
});

// ISO 80000-1:2009, annex B, rule A, half to the even multiple (rule and cases from memory).
test.each([
  [1.25, 1, "1.2"],
  [1.35, 1, "1.4"],
  [2.5, 0, "2"],
  [3.5, 0, "4"],
  [-2.5, 0, "-2"],
])("%d with %d decimals is %s", (value, decimals, expected) => {
  expect(format(value, "Pa", decimals)).toBe(expected);
  expect(formatLength(Math.round(value * 1e9), "mm", decimals)).toBe(expected);
});
