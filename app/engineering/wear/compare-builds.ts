import tCdf from "@stdlib/stats-base-dists-t-cdf";
import tQuantile from "@stdlib/stats-base-dists-t-quantile";
import { mean, sampleVariance } from "simple-statistics";
import { EngineeringError } from "../engineering-error";
import type { Interval } from "./line";

/** One figure (a wear, a rate, a clearance) of one position. */
export interface PositionValue {
  position: number;
  value: number;
}

export interface Comparison {
  method: "paired" | "welch";
  /** Mean of the later minus mean of the earlier, unit of the values. */
  difference: number;
  standardError: number;
  /** Null where the values show no scatter at all, so that nothing can be tested. */
  t: number | null;
  degreesOfFreedom: number;
  /** Two-sided. */
  p: number | null;
  confidence95: Interval | null;
}

/**
 * Whether a later build differs from an earlier one: paired by position where both have the same positions, which takes
 * the differences between positions out; else Welch's test.
 * @throws EngineeringError `too-few-points` with fewer than two positions in either
 */
export function compareBuilds(
  earlier: readonly PositionValue[],
  later: readonly PositionValue[],
): Comparison {
  const before = new Map(earlier.map(({ position, value }) => [position, value]));
  const paired = later.filter(({ position }) => before.has(position));
  return paired.length === later.length && paired.length === before.size
    ? pairedT(paired.map(({ position, value }) => value - before.get(position)!))
    : welchT(
        earlier.map(({ value }) => value),
        later.map(({ value }) => value),
      );
}

/** Student's t of differences by position against none. Source: NIST/SEMATECH e-Handbook, 7.3.1.1. */
export function pairedT(differences: readonly number[]): Comparison {
  atLeastTwo(differences, "differences");
  const variance = sampleVariance([...differences]) / differences.length;
  return compared("paired", mean([...differences]), variance, differences.length - 1);
}

/**
 * Welch's t of two groups of unlike spread, degrees of freedom by Welch and Satterthwaite.
 * Source: Welch, Biometrika 34 (1947); NIST/SEMATECH e-Handbook, 7.3.1.
 */
export function welchT(earlier: readonly number[], later: readonly number[]): Comparison {
  atLeastTwo(earlier, "earlier");
  atLeastTwo(later, "later");
  const a = sampleVariance([...earlier]) / earlier.length;
  const b = sampleVariance([...later]) / later.length;
  const degreesOfFreedom =
    a + b > 0 ? (a + b) ** 2 / (a ** 2 / (earlier.length - 1) + b ** 2 / (later.length - 1)) : 0;
  return compared("welch", mean([...later]) - mean([...earlier]), a + b, degreesOfFreedom);
}

function compared(
  method: Comparison["method"],
  difference: number,
  variance: number,
  degreesOfFreedom: number,
): Comparison {
  const standardError = Math.sqrt(variance);
  if (!(standardError > 0)) {
    return { method, difference, standardError: 0, t: null, degreesOfFreedom, p: null, confidence95: null };
  }
  const t = difference / standardError;
  const half = tQuantile(0.975, degreesOfFreedom) * standardError;
  return {
    method,
    difference,
    standardError,
    t,
    degreesOfFreedom,
    p: 2 * tCdf(-Math.abs(t), degreesOfFreedom),
    confidence95: { from: difference - half, to: difference + half },
  };
}

function atLeastTwo(values: readonly number[], field: string): void {
  if (values.length < 2) {
    throw new EngineeringError(
      "too-few-points",
      field,
      "A comparison needs at least two positions in each build.",
    );
  }
}
