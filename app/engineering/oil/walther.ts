/**
 * Walther's double logarithm of a kinematic viscosity, log₁₀ log₁₀ Z with ν in mm²/s: straight over log T for one oil,
 * and what mixes by share when two oils are blended. Z = ν + 0.7, below 2 mm²/s with the standard's correction.
 * Range: 0.21 to 2·10⁷ mm²/s. Source: ASTM D341 (recalled; the form is as in a public program that cites it).
 */
export function doubleLog(kinematic: number): number {
  return Math.log10(Math.log10(thickened(kinematic)));
}

/** The kinematic viscosity, mm²/s, of a double logarithm: the inverse of `doubleLog`, to 1e-9 of the value. */
export function fromDoubleLog(value: number): number {
  const z = 10 ** (10 ** value);
  if (z >= 2.7) return z - 0.7;
  // D341's own inverse is 2e-4 off; a few steps of Newton's method close it.
  const excess = z - 0.7;
  let kinematic = excess - Math.exp(-0.7487 - 3.295 * excess + 0.6119 * excess ** 2 - 0.3193 * excess ** 3);
  for (let step = 0; step < 4; step++) {
    const correction = lowViscosityCorrection(kinematic);
    const slope = 1 - correction * (1.84 + 1.02 * kinematic);
    kinematic -= (kinematic + 0.7 + correction - z) / slope;
  }
  return kinematic;
}

function thickened(kinematic: number): number {
  return kinematic + 0.7 + (kinematic < 2 ? lowViscosityCorrection(kinematic) : 0);
}

const lowViscosityCorrection = (kinematic: number) =>
  Math.exp(-1.47 - 1.84 * kinematic - 0.51 * kinematic ** 2);
