import { EngineeringError } from "../engineering-error";
import { incompleteBeta, logGamma } from "./incomplete-beta";

const manyDegrees = 1e4;
const mostSteps = 100;

/**
 * The value that Student's t stays under with this probability. Newton's method on the distribution function; from
 * zero it climbs to the answer without passing it, since the function bends one way above zero.
 * Kept here because a page needs it: the well-known package for it is 52 kB gzip in a page, this is 1.
 * Relative error about 1e-10, and 1e-7 over ten thousand degrees of freedom (1e-6 far out in the tail).
 * @param probability between 0 and 1
 * @param degreesOfFreedom 1 or more; infinite gives the normal distribution's
 * @throws EngineeringError `outside-range`
 */
export function tQuantile(probability: number, degreesOfFreedom: number): number {
  if (!(probability > 0 && probability < 1)) {
    throw new EngineeringError("outside-range", "probability", "A probability lies between 0 and 1.");
  }
  if (!(degreesOfFreedom >= 1)) {
    throw new EngineeringError("outside-range", "degreesOfFreedom", "Student's t needs a degree of freedom.");
  }
  if (probability < 0.5) return -tQuantile(1 - probability, degreesOfFreedom);
  if (degreesOfFreedom <= manyDegrees) return climb(1 - probability, degreesOfFreedom);
  // First term of the expansion about the normal distribution (Abramowitz & Stegun, 26.7.5), taken from ten thousand.
  const near = climb(1 - probability, manyDegrees);
  return near + ((near ** 3 + near) / 4) * (1 / degreesOfFreedom - 1 / manyDegrees);
}

function climb(tail: number, degrees: number): number {
  const peak = logGamma((degrees + 1) / 2) - logGamma(degrees / 2) - 0.5 * Math.log(degrees * Math.PI);
  let t = 0;
  for (let step = 0; step < mostSteps; step++) {
    const square = t * t;
    const above = 0.5 * incompleteBeta(degrees / (degrees + square), degrees / 2, 0.5);
    const density = Math.exp(peak - ((degrees + 1) / 2) * Math.log1p(square / degrees));
    const change = (above - tail) / density;
    t += change;
    if (Math.abs(change) <= 1e-12 * t) break;
  }
  return t;
}
