import { describe, expect, it } from "vitest";
import { amount, anyQuantity, quantity } from "./quantity-in";

const codesOf = (
  schema: { safeParse: (value: unknown) => { error?: { issues: unknown[] } | undefined } },
  value: unknown,
) =>
  schema.safeParse(value).error?.issues.map((issue) => (issue as { params: { code: string } }).params.code) ??
  [];

describe("a quantity on its way in", () => {
  it("is kept as it was typed where it is stored", () => {
    expect(quantity("length").parse(" 2.1000 in ")).toMatchObject({
      typed: "2.1000 in",
      unit: "in",
      decimals: 4,
      picometres: 53_340_000_000,
    });
    expect(codesOf(quantity("length"), { si: 1, text: "1 m" })).toEqual(["wrong-type"]);
  });

  it("is refused without its unit, as a number, and where it is not there", () => {
    for (const schema of [quantity("length"), amount("length")]) {
      expect(codesOf(schema, "2.1")).toEqual(["no-unit"]);
      expect(codesOf(schema, 2.1)).toEqual(["no-unit"]);
      expect(codesOf(schema, undefined)).toEqual(["missing"]);
      expect(codesOf(schema, "2.1 psi")).toEqual(["wrong-unit"]);
      expect(codesOf(schema, ["2.1 in"])).toEqual(["wrong-type"]);
    }
  });

  it("to reckon with may be one that an answer gave, kinematic viscosity in m²/s", () => {
    expect(amount("length").parse({ si: 0.05334, text: "2.1000 in" })).toBe(0.05334);
    expect(amount("kinematic-viscosity").parse({ si: 1.1e-4, text: "110.00 cSt" })).toBeCloseTo(110, 10);
    expect(amount("temperature").parse({ si: 95, text: "95.0 °C" })).toBe(95);
    expect(amount("kinematic-viscosity").parse("110 cSt")).toBe(110);
  });

  it("stays within its limits, whichever way it came", () => {
    const part = amount("temperature", { least: -40, most: 200 });
    expect(part.parse("392 degF")).toBeCloseTo(200, 9);
    expect(codesOf(part, "300 degC")).toEqual(["out-of-range"]);
    expect(codesOf(part, { si: 300, text: "20 °C" })).toEqual(["out-of-range"]);
    expect(codesOf(amount("length", { over: 0 }), "0 in")).toEqual(["out-of-range"]);
  });

  it("may be of any kind where its unit says which", () => {
    expect(anyQuantity.parse("60 psi").kind).toBe("pressure");
    expect(codesOf(anyQuantity, "60")).toEqual(["no-unit"]);
  });
});
