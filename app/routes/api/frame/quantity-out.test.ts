import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parseQuantity } from "~/engineering/quantity/parse";
import { sayIn } from "./quantity-out";

const inch = sayIn("inch");
const metric = sayIn("metric");

// Units by NIST SP 811, appendix B: the inch 25.4 mm, psi 6894.757 Pa, lbf 4.448222 N; each text rounded by hand.
describe("a quantity on its way out", () => {
  it.each([
    [inch.length(0.05334), "2.1000 in"],
    [metric.length(0.05334), "53.340 mm"],
    [inch.length(0.053402505), "2.102461 in"],
    [inch.clearance(0.0000635), "0.0025 in"],
    [inch.clearance(0.000064008), "0.00252 in"],
    [inch.clearance(-0.00000508), "-0.0002 in"],
    [metric.clearance(0.0000635), "63.5 µm"],
    [inch.fine(2.54e-6), "100.0 µin"],
    [metric.fine(2.54e-6), "2.54 µm"],
    [inch.temperature(95), "95.0 °C"],
    [inch.pressure(413_685.4), "60 psi"],
    [metric.pressure(413_685.4), "4.137 bar"],
    [inch.speed((7200 * Math.PI) / 30), "7200 rpm"],
    [inch.force(12_000), "2697.71 lbf"],
    [metric.force(12_000), "12000 N"],
    [inch.viscosity(0.012), "12.00 mPa·s"],
    [inch.power(1234.56), "1235 W"],
    [inch.flow(1.5e-6), "1.5 cm³/s"],
  ])("%j is said as %s", (said, text) => {
    expect(said.text).toBe(text);
  });

  it("has SI beside its text: m²/s, and m/s for wear", () => {
    expect(inch.kinematic(110)).toEqual({ si: 0.00011, text: "110.00 cSt" });
    const rate = metric.wearRate(3.6e-6);
    expect(rate.si).toBeCloseTo(1e-9, 20);
    expect(rate.text).toBe("3.600 µm/h");
  });

  it("says two digits at least of what is smaller than its usual decimals", () => {
    expect(inch.clearance(1e-9).text).toBe("0.000000039 in");
    expect(metric.fine(3.4e-10).text).toBe("0.00034 µm");
    expect(inch.clearance(0).text).toBe("0.0000 in");
  });

  it("can be sent back as its text, and is the same to half its last digit", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1, noNaN: true }), (metres) => {
        const back = parseQuantity(inch.length(metres).text, "length").si;
        expect(Math.abs(back - metres)).toBeLessThanOrEqual(0.5000001e-6 * 0.0254);
      }),
    );
  });

  it("is never no number", () => {
    expect(() => inch.length(Number.NaN)).toThrow();
    expect(() => inch.force(Number.POSITIVE_INFINITY)).toThrow();
  });
});
