import { max, mean, median, min } from "simple-statistics";
import { type Readings, readingDeviation } from "./readings";
import type { CompleteRules } from "./rules";
import type { Iteration } from "./types";
import type { Said } from "./words";

interface Expectation {
  /** How many positions the fit has. */
  expected: number;
  /** The shop has said that the fit has one position only. */
  singleKnown: boolean;
  rules: CompleteRules;
}

/** Why the readings of a build cannot be used at all; null where they can. */
export function faultOf(
  iteration: Iteration,
  readings: Readings,
  { expected, singleKnown, rules }: Expectation,
): Said | null {
  const { build, target, positions } = iteration;
  if (!positions.some(({ tornDown, grade }) => tornDown !== null || grade !== null)) {
    return { code: "not-torn-down", values: { build } };
  }
  const assembled = readings.positions.flatMap(({ clearance }) => (clearance === null ? [] : [clearance]));
  const wears = readings.positions.flatMap(({ wear }) => (wear === null ? [] : [wear]));
  const graded = positions.filter(({ grade }) => grade !== null).length;

  if (assembled.length > 0 && Math.abs(median(assembled) - target) > 3 * rules.largestStep) {
    return { code: "another-engine", values: { build, clearance: median(assembled), target } };
  }
  if (wasCopied(iteration))
    return { code: "copied-readings", values: { build, positions: positions.length } };
  if (positions.filter(({ temperatureKnown }) => temperatureKnown === false).length * 2 > positions.length) {
    return { code: "temperature-unknown", values: { build } };
  }
  const enough = singleKnown ? 1 : Math.max(2, Math.ceil(expected / 2));
  const usable = Math.min(assembled.length, wears.length);
  if (usable < enough) {
    const slips = readings.leftOut.filter(({ code }) => code === "negative-wear").length;
    return slips > expected - enough
      ? { code: "negative-wear-everywhere", values: { build, positions: slips } }
      : { code: "too-few-positions", values: { build, usable, expected: Math.max(expected, enough) } };
  }
  if (graded * 2 < positions.length)
    return { code: "not-graded", values: { build, graded, positions: positions.length } };

  const uncertainty = readingDeviation(readings);
  // Beyond three standard deviations of their mean the gauges disagree with themselves: a zero has moved.
  const leastMean = (-3 * Math.SQRT2 * uncertainty) / Math.sqrt(wears.length);
  if (mean(wears) < leastMean) return { code: "gauges-moved", values: { build, wear: mean(wears) } };

  const spread = max(assembled) - min(assembled);
  // Readings themselves spread by about four expanded uncertainties' half when the parts do not differ at all.
  if (spread > rules.largestStep + 4 * uncertainty) {
    return { code: "spread", values: { build, spread, step: rules.largestStep } };
  }
  return null;
}

/** Every position alike to the last digit, assembled and torn down: a column was copied, not measured. */
function wasCopied({ positions }: Iteration): boolean {
  if (positions.length < 3) return false;
  const alike = (stage: "assembled" | "tornDown") =>
    positions[0]![stage] !== null &&
    new Set(positions.map((position) => position[stage]?.clearance)).size === 1;
  return alike("assembled") && alike("tornDown");
}
