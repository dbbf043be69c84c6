import fc from "fast-check";
import { all, create, type Unit } from "mathjs";
import { expect, test } from "vitest";
import { format, formatLength } from "./format";
import { metres, picometres } from "./length";
import { parseQuantity } from "./parse";
import { type QuantityKind, type UnitName, unitNames, unitsOf } from "./units";

// mathjs in 40-digit decimals is the independent reference; it knows no shop units, so they are defined for it here.
const math = create(all!, { number: "BigNumber", precision: 40 });
math.createUnit({
  thou: { definition: "0.001 inch" },
  tenth: { definition: "0.0001 inch" },
  microinch: { definition: "0.000001 inch" },
  revolutionperminute: { definition: "0.1047197551196597746154214461093167628065723133125 rad/s" },
});

const inMathjs: Partial<Record<UnitName, string>> = {
  in: "inch",
  tenths: "tenth",
  uin: "microinch",
  "Pa s": "Pa s",
  "mPa s": "mPa s",
  cP: "mPa s",
  cSt: "mm^2/s",
  "m2/s": "m^2/s",
  "mm2/s": "mm^2/s",
  // mathjs carries psi with ten figures only.
  psi: "lbf/inch^2",
  rpm: "revolutionperminute",
  min: "minute",
  h: "hour",
  "lbf ft": "lbf ft",
  "kg/m3": "kg/m^3",
  "g/cm3": "g/cm^3",
};

const coreUnit: Partial<Record<QuantityKind, string>> = {
  pressure: "Pa",
  "dynamic-viscosity": "Pa s",
  "kinematic-viscosity": "mm^2/s",
  speed: "rad/s",
  force: "N",
  mass: "kg",
  time: "s",
  torque: "N m",
  density: "kg/m^3",
};

/** Digits as a person types them: an optional sign, leading zeros, a point or a comma, up to `most` decimals. */
const typedNumber = (most: number, wholes = 999) =>
  fc
    .record({
      sign: fc.constantFrom("", "", "+", "-", "−"),
      zeros: fc.constantFrom("", "", "0", "00"),
      whole: fc.nat({ max: wholes }),
      mark: fc.constantFrom(".", ".", ","),
      behind: fc.string({ unit: fc.constantFrom(..."0123456789"), maxLength: most }),
    })
    .map(({ sign, zeros, whole, mark, behind }) => ({
      text: `${sign}${zeros}${whole}${behind && mark}${behind}`,
      digits: `${whole}${behind && "."}${behind}`,
      negative: (sign === "-" || sign === "−") && (whole > 0 || /[1-9]/.test(behind)),
    }))
    // What can be read two ways is refused, and tested beside the parser.
    .filter(({ text }) => !/^[+\-−]?[1-9]\d{0,2},\d{3}$/.test(text));

const finestDecimals: Record<string, number> = {
  in: 8,
  thou: 5,
  tenths: 4,
  uin: 2,
  m: 12,
  mm: 9,
  um: 6,
  nm: 3,
};

test("a length is written again with the digits that were typed, whatever was typed", () => {
  const typed = fc
    .constantFrom(...unitsOf("length"))
    .chain((unit) =>
      fc.tuple(fc.constant(unit), typedNumber(finestDecimals[unit]!), fc.constantFrom(" ", "", "\u00a0")),
    );
  fc.assert(
    fc.property(typed, ([unit, { text, digits, negative }, space]) => {
      const quantity = parseQuantity(`${text}${space}${unit}`, "length");
      const again = formatLength(quantity.picometres!, quantity.unit, quantity.decimals);
      expect(again).toBe(`${negative ? "-" : ""}${digits}`);
    }),
    { numRuns: 2000 },
  );
});

test("every other kind is written again with the digits that were typed", () => {
  const others = unitNames.filter((name) => !unitsOf("length").includes(name));
  const kindOf = (unit: UnitName) =>
    ([...Object.keys(coreUnit), "temperature"] as QuantityKind[]).find((kind) =>
      unitsOf(kind).includes(unit),
    )!;
  fc.assert(
    fc.property(fc.constantFrom(...others), typedNumber(9), (unit, { text, digits, negative }) => {
      const kind = kindOf(unit);
      fc.pre(kind !== "temperature" || !negative);
      const quantity = parseQuantity(`${text} ${unit}`, kind);
      const again = format(quantity.si, quantity.unit, quantity.decimals);
      expect(again).toBe(`${negative ? "-" : ""}${digits}`);
    }),
    { numRuns: 2000 },
  );
});

test("lengths are what mathjs makes of them, to the picometre", () => {
  fc.assert(
    fc.property(fc.constantFrom(...unitsOf("length")), typedNumber(2), (unit, { text, digits, negative }) => {
      const { picometres: read } = parseQuantity(`${text} ${unit}`, "length");
      const reference = math.unit(math.bignumber(digits), inMathjs[unit] ?? unit).toNumber("pm");
      expect(read).toBe(negative ? -Math.round(reference) : Math.round(reference));
    }),
    { numRuns: 500 },
  );
});

test("other kinds are what mathjs makes of them, to the last bits of a double", () => {
  for (const [kind, core] of Object.entries(coreUnit) as [QuantityKind, string][]) {
    for (const unit of unitsOf(kind)) {
      const { si } = parseQuantity(`7.25 ${unit}`, kind);
      const reference = (math.unit(math.bignumber("7.25"), inMathjs[unit] ?? unit) as Unit).toNumber(core);
      expect(si / reference, unit).toBeCloseTo(1, 14);
    }
  }
});

test("temperatures are what mathjs makes of them", () => {
  for (const unit of ["degC", "degF", "K"] as const) {
    const { si } = parseQuantity(`295.5 ${unit}`, "temperature");
    // A tolerance of 1e-10: mathjs itself carries the offsets in doubles.
    expect(si).toBeCloseTo(math.unit(295.5, unit).toNumber("degC"), 10);
  }
});

test("changing the page's unit and back changes nothing stored, by way of metres either", () => {
  const units = unitsOf("length");
  fc.assert(
    fc.property(fc.constantFrom(...units), typedNumber(2), (unit, { text, digits, negative }) => {
      const { picometres: stored, si, decimals } = parseQuantity(`${text} ${unit}`, "length");
      expect(picometres(si)).toBe(stored);
      expect(metres(stored!)).toBe(si);
      for (const other of units) format(si, other, decimals);
      expect(format(si, unit, decimals)).toBe(`${negative ? "-" : ""}${digits}`);
    }),
    { numRuns: 500 },
  );
});

test("a length is rounded as mathjs rounds it, save a tie, which goes to the even digit", () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 0, max: 100_000_000_000 }),
      fc.constantFrom(...unitsOf("length")),
      fc.nat({ max: 6 }),
      (stored, unit, decimals) => {
        const exact = math.bignumber(stored).div(math.bignumber(1).mul(unitInPicometres(unit)));
        expect(formatLength(stored, unit, decimals)).toBe(exact.toFixed(decimals, halfEven));
      },
    ),
    { numRuns: 1000 },
  );
});

const halfEven = 6; // decimal.js: ROUND_HALF_EVEN

function unitInPicometres(unit: UnitName) {
  return math.unit(math.bignumber(1), inMathjs[unit] ?? unit).toNumber("pm");
}
