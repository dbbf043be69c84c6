import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { pistonTravel, requireSliderCrank, sliderCrank } from "./slider-crank";

const anyCrank = fc
  .record({
    stroke: fc.double({ min: 0.03, max: 0.15, noNaN: true }),
    rod: fc.double({ min: 1.3, max: 3, noNaN: true }),
    offset: fc.double({ min: -0.1, max: 0.1, noNaN: true }),
  })
  .map(({ stroke, rod, offset }) => ({ stroke, rodLength: rod * stroke, pinOffset: offset * stroke }));
const anyAngle = fc.double({ min: -10, max: 20, noNaN: true });

describe("the slider-crank with a pin offset", () => {
  test("moves as its place changes: velocity, acceleration and swing are what they are the rate of", () => {
    fc.assert(
      fc.property(anyCrank, anyAngle, (crank, angle) => {
        const step = 1e-4;
        const [before, at, after] = [-step, 0, step].map((shift) => sliderCrank(crank, angle + shift, 1));
        const rate = (of: "displacement" | "velocity" | "rodAngle" | "rodAngularVelocity") =>
          (after![of] - before![of]) / (2 * step);
        // 1e-6: central differences of this step leave 1e-8 of the throw, rounding 1e-11 over the step.
        expect(at!.velocity).toBeCloseTo(rate("displacement"), 6);
        expect(at!.acceleration).toBeCloseTo(rate("velocity"), 6);
        expect(at!.rodAngularVelocity).toBeCloseTo(rate("rodAngle"), 6);
        expect(at!.rodAngularAcceleration).toBeCloseTo(rate("rodAngularVelocity"), 6);
      }),
    );
  });

  test("travels between nothing and its whole travel, which an offset lengthens", () => {
    fc.assert(
      fc.property(anyCrank, anyAngle, (crank, angle) => {
        const travel = pistonTravel(crank);
        expect(travel).toBeGreaterThanOrEqual(crank.stroke * (1 - 1e-12));
        const { displacement } = sliderCrank(crank, angle, 1);
        expect(displacement).toBeGreaterThan(-1e-12);
        expect(displacement).toBeLessThan(travel + 1e-12);
      }),
    );
  });

  test("a positive offset puts top dead centre after the throw points along the cylinder", () => {
    const crank = { stroke: 0.09, rodLength: 0.15, pinOffset: 0.005 };
    const top = Math.asin(0.005 / (0.15 + 0.045));
    expect(sliderCrank(crank, top, 1).displacement).toBeCloseTo(0, 12);
    expect(sliderCrank(crank, top, 1).velocity).toBeCloseTo(0, 12);
  });

  test.each([
    [{ stroke: 0, rodLength: 0.1 }, "not-positive"],
    [{ stroke: 0.09, rodLength: Number.NaN }, "not-a-number"],
    [{ stroke: 0.09, rodLength: 1e308 }, "outside-range"],
    [{ stroke: 0.09, rodLength: 0.04 }, "rod-too-short"],
  ])("%j is refused", (crank, code) => {
    expect(() => requireSliderCrank(crank)).toThrow(expect.objectContaining({ code }));
  });
});
