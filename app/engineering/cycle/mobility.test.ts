import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { filmModelFor, mobility } from "./mobility";

const anyPlace = fc
  .tuple(
    fc.double({ min: 0, max: 0.999, noNaN: true }),
    fc.double({ min: -Math.PI, max: Math.PI, noNaN: true }),
  )
  .map(([eccentricity, angle]) => [eccentricity * Math.cos(angle), eccentricity * Math.sin(angle)] as const);
const anyLength = fc.double({ min: 0.1, max: 1.5, noNaN: true });

describe("a mobility", () => {
  test("always gives way to the load, so that a film never makes power", () => {
    fc.assert(
      fc.property(anyPlace, anyLength, ([along, across], length) => {
        expect(mobility(length, "finite")(along, across).along).toBeGreaterThan(0);
        expect(mobility(length, "short")(along, across).along).toBeGreaterThan(0);
      }),
    );
  });

  test("is the same seen in a mirror along the load", () => {
    fc.assert(
      fc.property(anyPlace, anyLength, ([along, across], length) => {
        const at = mobility(length, "finite");
        const [here, there] = [at(along, across), at(along, -across)];
        expect(there.along).toBeCloseTo(here.along, 9);
        expect(there.across).toBeCloseTo(-here.across, 9);
      }),
    );
  });

  test("is less in a longer bearing of the same place", () => {
    fc.assert(
      fc.property(anyPlace, fc.double({ min: 0.1, max: 1.2, noNaN: true }), ([along, across], length) => {
        const longer = mobility(length * 1.25, "finite")(along, across);
        expect(longer.along).toBeLessThan(mobility(length, "finite")(along, across).along);
      }),
    );
  });

  test("comes from the model a length asks for, and from none beyond its table", () => {
    expect([0.05, 0.1, 0.4, 1.5].map(filmModelFor)).toEqual(["short", "finite", "finite", "finite"]);
    expect(mobility((0.05 * 1.5) / 0.05, "finite")(0.5, 0).along).toBeGreaterThan(0);
    expect(() => mobility(1.6, "finite")).toThrow(expect.objectContaining({ code: "outside-range" }));
    expect(() => mobility(Number.NaN, "finite")).toThrow(expect.objectContaining({ code: "outside-range" }));
  });
});
