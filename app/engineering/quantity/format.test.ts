import { expect, test } from "vitest";
import { format, formatLength, formatWithUnit } from "./format";
import { metres, picometres } from "./length";
import { fromCore, toCore, unitLabel } from "./units";

test("inches are written with or without the leading zero", () => {
  expect(formatLength(63_500_000, "in", 4)).toBe("0.0025");
  expect(formatLength(63_500_000, "in", 4, { dropLeadingZero: true })).toBe(".0025");
  expect(formatLength(-63_500_000, "in", 4, { dropLeadingZero: true })).toBe("-.0025");
  expect(formatLength(53_340_000_000, "in", 4, { dropLeadingZero: true })).toBe("2.1000");
  expect(formatLength(0, "in", 0, { dropLeadingZero: true })).toBe("0");
});

test("half a tenth goes to the even tenth", () => {
  expect(formatLength(6_350_000, "in", 4)).toBe("0.0002");
  expect(formatLength(8_890_000, "in", 4)).toBe("0.0004");
  expect(formatLength(6_350_001, "in", 4)).toBe("0.0003");
});

test("a zero has no sign", () => {
  expect(formatLength(-1, "in", 4)).toBe("0.0000");
  expect(format(-0.0001, "degC", 1)).toBe("0.0");
  expect(Object.is(picometres(-1e-15), 0)).toBe(true);
});

test("very small and very large values keep their digits", () => {
  expect(format(1e-9, "Pa s", 10)).toBe("0.0000000010");
  expect(format(1e-300, "Pa s", 3)).toBe("0.000");
  expect(format(123_456_789_012_345, "N", 1)).toBe("123456789012345.0");
});

test("a unit is written as a page shows it", () => {
  expect(formatWithUnit(105, "degC", 1)).toBe("105.0 °C");
  expect(formatWithUnit(16.2, "mm2/s", 1)).toBe("16.2 mm²/s");
  expect(formatWithUnit(3e-7, "um", 2)).toBe("0.30 µm");
  expect(unitLabel("uin")).toBe("µin");
  expect(unitLabel("thou")).toBe("thou");
});

test("kinematic viscosity goes out in m²/s", () => {
  expect(fromCore(16.2, "m2/s")).toBe(16.2e-6);
  expect(toCore(16.2e-6, "m2/s")).toBeCloseTo(16.2, 12);
});

test("what is no number is never shown", () => {
  const refused = (code: string) => expect.objectContaining({ code });
  expect(() => format(Number.NaN, "N", 1)).toThrow(refused("not-a-number"));
  expect(() => format(Number.POSITIVE_INFINITY, "mm", 1)).toThrow(refused("not-a-number"));
  expect(() => formatLength(0.5, "mm", 1)).toThrow(refused("not-a-number"));
  expect(() => formatLength(1, "degC", 1)).toThrow(refused("wrong-unit"));
  expect(() => formatLength(1, "mm", -1)).toThrow(refused("outside-range"));
  expect(() => format(1, "N", 1e9)).toThrow(refused("outside-range"));
  expect(() => picometres(Number.NaN)).toThrow(refused("not-a-number"));
  expect(() => picometres(10_000)).toThrow(refused("too-large"));
});

test("metres and picometres turn into each other", () => {
  expect(metres(53_340_000_000)).toBe(0.05334);
  expect(picometres(0.05334)).toBe(53_340_000_000);
});
