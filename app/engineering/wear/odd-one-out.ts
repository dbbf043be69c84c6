import { median } from "simple-statistics";
import { EngineeringError } from "../engineering-error";

/**
 * A robust z beyond this names an odd one out.
 * Source: Iglewicz & Hoaglin, How to Detect and Handle Outliers (ASQC, 1993), as given in the NIST/SEMATECH
 * e-Handbook of Statistical Methods, 1.3.5.17.
 */
export const oddOneOutThreshold = 3.5;

/** Standard deviation of a normal distribution over its median absolute deviation: 1 / Φ⁻¹(0.75). */
const deviationPerMad = 1.482602218505602;

export interface OddOneOut {
  /** Index in the values given. */
  index: number;
  robustZ: number;
}

/**
 * How far each value lies from the median, in robust standard deviations (1.4826 × median absolute deviation).
 * @param leastDeviation the standard uncertainty of one value, same unit: values cannot lie closer together than the
 *   gauges can tell, so the deviation is never taken as less. 0 where it is not known.
 * @throws EngineeringError `too-few-points` with no value
 */
export function robustZ(values: readonly number[], leastDeviation = 0): number[] {
  if (values.length === 0)
    throw new EngineeringError("too-few-points", "values", "There is no value to compare.");
  const centre = median([...values]);
  const deviations = values.map((value) => Math.abs(value - centre));
  const deviation = Math.max(deviationPerMad * median(deviations), leastDeviation);
  return values.map((value) => (value === centre || deviation === 0 ? 0 : (value - centre) / deviation));
}

/**
 * The value that lies farthest out, if it lies beyond the threshold; null where none does, or with fewer than four
 * values, among which nobody can say which one is odd.
 */
export function oddOneOut(values: readonly number[], leastDeviation = 0): OddOneOut | null {
  if (values.length < 4) return null;
  const scores = robustZ(values, leastDeviation);
  const farthest = scores.reduce(
    (best, z, index) => (Math.abs(z) > Math.abs(scores[best]!) ? index : best),
    0,
  );
  return Math.abs(scores[farthest]!) > oddOneOutThreshold
    ? { index: farthest, robustZ: scores[farthest]! }
    : null;
}
