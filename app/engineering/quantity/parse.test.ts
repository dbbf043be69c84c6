import fc from "fast-check";
import { expect, test } from "vitest";
import { EngineeringError } from "../engineering-error";
import { parseQuantity } from "./parse";
import type { QuantityKind, UnitName } from "./units";

const pm = (text: string, options = {}) => parseQuantity(text, "length", options).picometres;
const si = (text: string, kind: QuantityKind) => parseQuantity(text, kind).si;

test.each([
  ["2.1000 in", 53_340_000_000],
  ['2.1000"', 53_340_000_000],
  ["2.1000''", 53_340_000_000],
  ["2.1000 IN", 53_340_000_000],
  ["2.1 in.", 53_340_000_000],
  ["53.34mm", 53_340_000_000],
  ["53,34 mm", 53_340_000_000],
  ["53.3400 MM", 53_340_000_000],
  ["2.5 thou", 63_500_000],
  ["2.5 mil", 63_500_000],
  ["2.5 thousandths", 63_500_000],
  ["25 tenths", 63_500_000],
  ["1 tenth", 2_540_000],
  ["12 uin", 304_800],
  ['12 u"', 304_800],
  ["12 µin", 304_800],
  ["12 μin", 304_800],
  ["12 micro-inch", 304_800],
  ["0.4 µm", 400_000],
  ["0.4 μm", 400_000],
  ["0.4 um", 400_000],
  ["0.4 micron", 400_000],
  ["3 microns", 3_000_000],
  ["1 7/8 in", 47_625_000_000],
  ["7/8 in", 22_225_000_000],
  ["1/64 in", 396_875_000],
  [".0025 in", 63_500_000],
  ["+.0025 in", 63_500_000],
  ["−.0025 in", -63_500_000],
  ["5. mm", 5_000_000_000],
  ["  002.1000\u00a0in ", 53_340_000_000],
  ["1 234.5 mm", 1_234_500_000_000],
  ["0.01 uin", 254],
  ["5 nm", 5_000],
])("reads %s exactly", (text, expected) => {
  expect(pm(text)).toBe(expected);
});

test("keeps what was typed, its unit and its decimals", () => {
  expect(parseQuantity(" 53,3400mm ", "length")).toEqual({
    kind: "length",
    si: 0.05334,
    picometres: 53_340_000_000,
    typed: "53,3400mm",
    unit: "mm",
    decimals: 4,
  });
});

test("a bare number takes the page's unit, and is refused where there is none", () => {
  expect(pm("2.1000", { defaultUnit: "in" })).toBe(53_340_000_000);
  expect(() => pm("2.1000")).toThrow("Say the unit: in, mm.");
  expect(() => parseQuantity("2.5", "small-length")).toThrow("Say the unit: thou, in, tenths, µm.");
  expect(() => parseQuantity("12", "finish")).toThrow("Say the unit: µin, µm.");
});

test("a sign makes an offset from the nominal, and no sign a size", () => {
  const nominal = 53_340_000_000;
  expect(pm("+3 tenths", { nominal })).toBe(nominal + 762_000 * 10);
  expect(pm("-.0002", { nominal, defaultUnit: "in" })).toBe(nominal - 5_080_000);
  expect(pm("2.0995", { nominal, defaultUnit: "in" })).toBe(53_327_300_000);
});

test("what can be read two ways is refused with both readings named", () => {
  expect(() => pm("1,234 in")).toThrow("1,234 can be read as 1.234 or 1234");
  expect(() => pm("53,340 mm")).toThrow("53,340 can be read as 53.340 or 53340");
  expect(() => pm("1.234.567 mm")).toThrow(expect.objectContaining({ code: "ambiguous" }));
  // A group of thousands never starts with a zero, and never stands before a mark of the other kind.
  expect(pm("0,234 in")).toBe(5_943_600_000);
  expect(pm("1,234.5 mm")).toBe(1_234_500_000_000);
  expect(pm("1.234,5 mm")).toBe(1_234_500_000_000);
});

test.each([
  ["", "empty"],
  ["=1+1", "not-a-number"],
  ["1+1 in", "wrong-unit"],
  ["NaN", "not-a-number"],
  ["Infinity in", "not-a-number"],
  ["1e308 in", "not-a-number"],
  ["1e-3 in", "not-a-number"],
  ["0x10 in", "wrong-unit"],
  ["2.1 psi", "wrong-unit"],
  ["2.1 furlongs", "wrong-unit"],
  ["2.1.3 in", "not-a-number"],
  ["2,1,3 in", "not-a-number"],
  ["++2 in", "not-a-number"],
  ["1/3 in", "not-a-number"],
  ["1/0 in", "not-a-number"],
  ["🔧", "not-a-number"],
  ["2.1 🔧", "wrong-unit"],
  ["\u202e2.1 in", "not-a-number"],
  ["2.1\u200f in", "wrong-unit"],
  ["２.１ in", "not-a-number"],
  ["2 1 in", "not-a-number"],
  ["2\n100 in", "wrong-unit"],
  ["9".repeat(30), "too-large"],
  ["9".repeat(1_000_000), "too-long"],
  [`1${" ".repeat(1_000_000)}in`, "too-long"],
  ["0.0001 nm", "too-fine"],
  [`0.${"0".repeat(18)}1 m`, "too-fine"],
])("%.20s is refused as %s", (text, code) => {
  expect(() => pm(text, { defaultUnit: "in" })).toThrow(expect.objectContaining({ code, field: "value" }));
});

test("a megabyte is refused before it is read", () => {
  const started = performance.now();
  expect(() => pm("1".repeat(5_000_000))).toThrow(expect.objectContaining({ code: "too-long" }));
  expect(performance.now() - started).toBeLessThan(50);
});

test.each<[string, QuantityKind, number]>([
  ["12 mPa·s", "dynamic-viscosity", 0.012],
  ["0.012 Pa s", "dynamic-viscosity", 0.012],
  ["0.0000162 m²/s", "kinematic-viscosity", 16.2],
  ["520 g", "mass", 0.52],
  ["6.5 h", "time", 23_400],
  ["0.87 g/cm³", "density", 870],
  ["25 MPa", "pressure", 25e6],
  ["95 °C", "temperature", 95],
])("%s is %s %d in the core", (text, kind, expected) => {
  // One bit of a double is 2.2e-16 of the value.
  expect(si(text, kind) / expected).toBeCloseTo(1, 14);
});

test("nothing is colder than absolute zero", () => {
  expect(si("-459.67 degF", "temperature")).toBeCloseTo(-273.15, 12);
  expect(() => si("-460 degF", "temperature")).toThrow(expect.objectContaining({ code: "too-small" }));
});

test("a capital that makes another unit is never guessed", () => {
  for (const text of ["5 mPa", "5 mpa", "5 MPA"]) {
    expect(() => si(text, "pressure")).toThrow(expect.objectContaining({ code: "wrong-unit" }));
  }
  expect(() => si("5 MPa s", "dynamic-viscosity")).toThrow(expect.objectContaining({ code: "wrong-unit" }));
  expect(() => si("5 Nm", "length")).toThrow(expect.objectContaining({ code: "wrong-unit" }));
  expect(si("5 Nm", "torque")).toBe(5);
  expect(si("5 KPA", "pressure")).toBe(5000);
});

test("more figures than an instrument shows are refused outside lengths", () => {
  expect(() => si("1.234567890123 psi", "pressure")).toThrow(expect.objectContaining({ code: "too-fine" }));
  expect(() => si("1234567890123 Pa", "pressure")).toThrow(expect.objectContaining({ code: "too-large" }));
});

test.each<[QuantityKind, UnitName[]]>([
  ["length", ["in", "thou", "tenths", "uin", "m", "mm", "um", "nm"]],
  ["temperature", ["degC", "degF", "K"]],
])("every unit of a %s is read by its name in the API", (kind, names) => {
  for (const name of names) expect(parseQuantity(`300 ${name}`, kind).unit).toBe(name);
});

test("whatever is typed gives a finite quantity or a sentence, and nothing else", () => {
  const piece = fc.constantFrom(
    ..."0123456789.,+-−/ '\"eE",
    "in",
    "mm",
    "µm",
    "tenths",
    "psi",
    "\u00a0",
    "\u202e",
    "1 7/8",
  );
  const scribble = fc.oneof(
    fc.array(piece, { maxLength: 12 }).map((pieces) => pieces.join("")),
    fc.string({ unit: "grapheme" }),
  );
  fc.assert(
    fc.property(
      scribble,
      fc.constantFrom<QuantityKind>("length", "pressure", "temperature"),
      (text, kind) => {
        try {
          const quantity = parseQuantity(text, kind, { nominal: 53_340_000_000 });
          expect(Number.isFinite(quantity.si)).toBe(true);
          if (kind === "length") expect(Number.isSafeInteger(quantity.picometres)).toBe(true);
        } catch (error) {
          expect(error).toBeInstanceOf(EngineeringError);
          expect((error as EngineeringError).message).toMatch(/\.$/);
        }
      },
    ),
    { numRuns: 3000 },
  );
});
