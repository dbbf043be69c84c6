import { expect, test } from "vitest";
import { convert, parseAnyQuantity } from "~/engineering/quantity/convert";

// NIST SP 811 (2008), appendix B, factors in bold there are exact; pound-force and psi follow exactly from the
// international pound 0.45359237 kg, the inch 25.4 mm and standard gravity 9.80665 m/s².
test.each([
  ["1 in", "mm", 25.4],
  ["1 uin", "um", 0.0254],
  ["1 thou", "um", 25.4],
  ["1 tenth", "um", 2.54],
  ["1 lbf", "N", 4.4482216152605],
  ["1 psi", "kPa", 6.894757293168361],
  ["1 bar", "kPa", 100],
  ["1 cP", "mPa s", 1],
  ["1 cSt", "mm2/s", 1],
  ["1 lbf ft", "N m", 1.3558179483314003],
  ["1 rpm", "rad/s", Math.PI / 30],
  ["2.1 in", "mm", 53.34],
  ["53.34 mm", "in", 2.1],
])("%s is %s %d", (typed, unit, expected) => {
  const [converted] = convert(parseAnyQuantity(typed), [unit]);
  // Lengths are the nearest double; the others are given to 15 significant digits.
  expect(Math.abs(converted!.number - expected) / expected).toBeLessThan(5e-15);
});

// NIST SP 811, B.8: t/°C = (t/°F − 32)/1.8, t/°C = T/K − 273.15; exact by definition.
test.each([
  ["32 degF", 0],
  ["212 degF", 100],
  ["-40 degF", -40],
  ["68 degF", 20],
  ["104 degF", 40],
  ["293.15 K", 20],
])("%s is %d °C", (typed, expected) => {
  expect(convert(parseAnyQuantity(typed), ["degC"])[0]!.number).toBeCloseTo(expected, 11);
});
