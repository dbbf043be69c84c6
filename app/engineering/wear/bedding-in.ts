import tQuantile from "@stdlib/stats-base-dists-t-quantile";
import { mean, sampleVariance } from "simple-statistics";
import { EngineeringError } from "../engineering-error";
import type { Interval } from "./line";

/** Mean wear of a build, m, over its hours. */
export interface RunWear {
  wear: number;
  /** Standard uncertainty of that mean, m, above zero. */
  uncertainty: number;
  hours: number;
}

export interface BeddingIn {
  /** Wear per hour once bedded in, m/h: total wear over total hours of the later runs. */
  steadyRate: number;
  /** What the first run wore beyond the steady rate, m. */
  beddingIn: number;
  /** 95 %. */
  limits: Interval;
  /** Whether the limits leave zero out. */
  present: boolean;
}

/**
 * Bedding-in told from steady wear: what the first run of a coating or of new parts wore beyond the steady rate of the
 * runs after it. Given only the first run, nobody can tell them apart.
 * The doubt of the steady rate is the larger of what the gauges say and what the later runs show among themselves.
 * @throws EngineeringError `too-few-points` without a later run, `not-positive`
 */
export function beddingIn(first: RunWear, later: readonly RunWear[]): BeddingIn {
  if (later.length === 0) {
    throw new EngineeringError(
      "too-few-points",
      "later",
      "One run alone cannot tell bedding-in from steady wear; a second run on the same parts can.",
    );
  }
  for (const run of [first, ...later]) {
    if (!(run.hours > 0) || !(run.uncertainty > 0)) {
      throw new EngineeringError(
        "not-positive",
        "hours",
        "Hours and uncertainty of every run are above zero.",
      );
    }
  }
  const hours = later.reduce((sum, run) => sum + run.hours, 0);
  const steadyRate = later.reduce((sum, run) => sum + run.wear, 0) / hours;
  const byGauges = Math.sqrt(later.reduce((sum, run) => sum + run.uncertainty ** 2, 0)) / hours;
  const rates = later.map((run) => run.wear / run.hours);
  const byRuns = rates.length > 1 ? Math.sqrt(sampleVariance(rates) / rates.length) : 0;
  const fromRuns = byRuns > byGauges;
  // Known gauges stand for many degrees of freedom: the t quantile is then the normal one.
  const coverage = fromRuns ? tQuantile(0.975, rates.length - 1) : 1.959963984540054;
  const standardError = Math.hypot(first.uncertainty, first.hours * Math.max(byRuns, byGauges));
  const excess = first.wear - steadyRate * first.hours;
  const limits = { from: excess - coverage * standardError, to: excess + coverage * standardError };
  return { steadyRate, beddingIn: excess, limits, present: limits.from > 0 };
}

/** The mean wear of a build's positions with its standard uncertainty, m; the positions' own scatter counts if larger. */
export function runWear(wears: readonly number[], uncertainty: number, hours: number): RunWear {
  const scatter = wears.length > 1 ? Math.sqrt(sampleVariance([...wears])) : 0;
  return {
    wear: mean([...wears]),
    uncertainty: Math.max(scatter, uncertainty) / Math.sqrt(wears.length),
    hours,
  };
}
