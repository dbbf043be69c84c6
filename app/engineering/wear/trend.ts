import tQuantile from "@stdlib/stats-base-dists-t-quantile";
import { EngineeringError } from "../engineering-error";
import type { Interval, Point } from "./line";

/** A point with the standard uncertainty of its y. */
export interface WeighedPoint extends Point {
  uncertainty: number;
}

export interface Trend {
  slope: number;
  intercept: number;
  /** Null with only two points: a line through two points says nothing of its own doubt. */
  slopeStandardError: number | null;
  interceptStandardError: number | null;
  /** Weighted: in y for the point of mean weight. */
  residualStandardDeviation: number | null;
  /** 95 % interval of the slope. */
  confidence95: Interval | null;
  /** The 95 % confidence band of the line itself at x. */
  bandAt: (x: number) => Interval | null;
}

/**
 * The weighted line of least squares: a point counts by one over its uncertainty squared, any units. Equal
 * uncertainties give the plain line of `fitLine`. The scale of the scatter is taken from the points themselves.
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, 4.1.4.3 (weighted least squares) and 4.5.1 (bands).
 * @throws EngineeringError `too-few-points`, `not-positive` (an uncertainty), `same-x`
 */
export function weightedTrend(points: readonly WeighedPoint[]): Trend {
  if (points.length < 2) {
    throw new EngineeringError("too-few-points", "points", "A trend needs at least two points.");
  }
  points.forEach(({ x, y, uncertainty }, index) => {
    if (!Number.isFinite(x) || !Number.isFinite(y) || !(uncertainty > 0) || !Number.isFinite(uncertainty)) {
      throw new EngineeringError(
        "not-positive",
        `points[${index}].uncertainty`,
        `Point ${index + 1} needs numbers, with an uncertainty above zero.`,
      );
    }
  });
  const meanWeight = total(points, ({ uncertainty }) => uncertainty ** -2) / points.length;
  const weighed = points.map(({ x, y, uncertainty }) => ({ x, y, weight: uncertainty ** -2 / meanWeight }));
  const centreX = total(weighed, ({ x, weight }) => weight * x) / points.length;
  const centreY = total(weighed, ({ y, weight }) => weight * y) / points.length;
  const sumSquaresX = total(weighed, ({ x, weight }) => weight * (x - centreX) ** 2);
  if (!(sumSquaresX > 0)) {
    throw new EngineeringError(
      "same-x",
      "points",
      "All points lie at the same x; a trend needs two different ones.",
    );
  }
  const slope = total(weighed, ({ x, y, weight }) => weight * (x - centreX) * (y - centreY)) / sumSquaresX;
  const degreesOfFreedom = points.length - 2;
  const residualSquares = total(
    weighed,
    ({ x, y, weight }) => weight * (y - centreY - slope * (x - centreX)) ** 2,
  );
  const scatter = degreesOfFreedom > 0 ? Math.sqrt(residualSquares / degreesOfFreedom) : null;
  const coverage = degreesOfFreedom > 0 ? tQuantile(0.975, degreesOfFreedom) : 0;
  const standardErrorAt = (x: number) =>
    scatter === null ? null : scatter * Math.sqrt(1 / points.length + (x - centreX) ** 2 / sumSquaresX);
  const around = (value: number, standardError: number | null): Interval | null =>
    standardError === null
      ? null
      : { from: value - coverage * standardError, to: value + coverage * standardError };
  const slopeStandardError = scatter === null ? null : scatter / Math.sqrt(sumSquaresX);
  return {
    slope,
    intercept: centreY - slope * centreX,
    slopeStandardError,
    interceptStandardError: standardErrorAt(0),
    residualStandardDeviation: scatter,
    confidence95: around(slope, slopeStandardError),
    bandAt: (x) => around(centreY + slope * (x - centreX), standardErrorAt(x)),
  };
}

const total = <T>(items: readonly T[], of: (item: T) => number): number =>
  items.reduce((sum, item) => sum + of(item), 0);
