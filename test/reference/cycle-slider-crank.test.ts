import { describe, expect, test } from "vitest";
import { sliderCrank } from "~/engineering/cycle/slider-crank";

const rpm = Math.PI / 30;
const degrees = Math.PI / 180;

describe("exact slider-crank motion", () => {
  // Throw 80 mm, rod 245 mm, 1000 rpm: geometry from a published teaching model (Rose-Hulman engine example); the
  // figures from the closed form, checked by finite differences outside this project. Tolerance: the digits given.
  const rows = [
    [0, 0, 0, 1163.76288, 0],
    [30, 0.0140053284, 5.38942208, 910.906619, 9.39647738],
    [60, 0.05, 8.49012468, 295.811291, 16.4264214],
    [90, 0.0934292765, 8.37758041, -303.077403, 19.0583325],
    [120, 0.13, 6.02027023, -581.486878, 16.4264214],
    [150, 0.152569393, 2.98815833, -608.618383, 9.39647738],
    [180, 0.16, 0, -590.833461, 0],
  ] as const;

  test.each(rows)("at %d°", (angle, displacement, velocity, acceleration, rodAngle) => {
    const motion = sliderCrank({ stroke: 0.16, rodLength: 0.245 }, angle * degrees, 1000 * rpm);
    expect(motion.displacement).toBeCloseTo(displacement, 9);
    expect(motion.velocity).toBeCloseTo(velocity, 7);
    expect(motion.acceleration).toBeCloseTo(acceleration, 5);
    expect(motion.rodAngle / degrees).toBeCloseTo(rodAngle, 6);
  });

  test("the rod's swing at 45°, throw 0.5 m, rod 2 m, 180 rpm (textbook problem; exact values computed)", () => {
    // The two-term series gives 7.84242 and 125.6196 here, so these digits tell the exact form from it.
    const motion = sliderCrank({ stroke: 1, rodLength: 2 }, 45 * degrees, 180 * rpm);
    expect(motion.velocity).toBeCloseTo(7.86127, 5);
    expect(motion.acceleration).toBeCloseTo(126.3474, 4);
    expect(motion.rodAngularVelocity).toBeCloseTo(3.38548, 5);
    expect(motion.rodAngularAcceleration).toBeCloseTo(-61.756, 3);
  });

  test("the largest piston speed, 8.816969 m/s at 73.444° (same engine, computed outside the project)", () => {
    const speedAt = (angle: number) =>
      sliderCrank({ stroke: 0.16, rodLength: 0.245 }, angle * degrees, 1000 * rpm).velocity;
    expect(speedAt(73.444)).toBeCloseTo(8.816969, 6);
    expect(speedAt(73.344)).toBeLessThan(speedAt(73.444));
    expect(speedAt(73.544)).toBeLessThan(speedAt(73.444));
  });
});
