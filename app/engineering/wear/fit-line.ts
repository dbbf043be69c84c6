import { EngineeringError } from "../engineering-error";
import type { Line, Point } from "./line";

interface Options {
  /** Force the line through x = 0, y = 0; r² is then about zero, not about the mean. */
  throughOrigin?: boolean;
}

/**
 * The straight line of least squares through points, any units.
 * Standard errors, residual deviation and r² are null where the points are too few or too alike to have them.
 * Two passes: the points are centred on their means first, so that large offsets cost no digits.
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, 4.1.4.1 and 4.4.3; certified to the digits of NIST StRD.
 * @throws EngineeringError `too-few-points` with fewer than two points (one through the origin), `not-a-number`,
 *   `same-x` where all x agree
 */
export function fitLine(points: readonly Point[], { throughOrigin = false }: Options = {}): Line {
  const least = throughOrigin ? 1 : 2;
  if (points.length < least) {
    throw new EngineeringError("too-few-points", "points", `A line needs at least ${least} points.`);
  }
  points.forEach(({ x, y }, index) => {
    if (!Number.isFinite(x) || !Number.isFinite(y)) {
      throw new EngineeringError("not-a-number", `points[${index}]`, `Point ${index + 1} has no number.`);
    }
  });
  const centre = throughOrigin ? { x: 0, y: 0 } : { x: mean(points, "x"), y: mean(points, "y") };
  const centred = points.map(({ x, y }) => ({ x: x - centre.x, y: y - centre.y }));
  const sumSquaresX = sum(centred, ({ x }) => x * x);
  if (!(sumSquaresX > 0)) {
    throw new EngineeringError(
      "same-x",
      "points",
      "All points lie at the same x; a line needs two different ones.",
    );
  }

  const first = sum(centred, ({ x, y }) => x * y) / sumSquaresX;
  // One step of refinement on the residuals takes back what rounding lost in the first estimate.
  const slope = first + sum(centred, ({ x, y }) => x * (y - first * x)) / sumSquaresX;
  const residualSquares = sum(centred, ({ x, y }) => (y - slope * x) ** 2);
  const totalSquares = sum(centred, ({ y }) => y * y);

  const degreesOfFreedom = points.length - least;
  const residualStandardDeviation =
    degreesOfFreedom > 0 ? Math.sqrt(residualSquares / degreesOfFreedom) : null;
  return {
    slope,
    intercept: throughOrigin ? 0 : centre.y - slope * centre.x,
    slopeStandardError: times(residualStandardDeviation, 1 / Math.sqrt(sumSquaresX)),
    interceptStandardError: throughOrigin
      ? null
      : times(residualStandardDeviation, Math.sqrt(1 / points.length + centre.x ** 2 / sumSquaresX)),
    residualStandardDeviation,
    r2: totalSquares > 0 ? 1 - residualSquares / totalSquares : null,
    degreesOfFreedom,
  };
}

const sum = <T>(items: readonly T[], of: (item: T) => number): number =>
  items.reduce((total, item) => total + of(item), 0);

const times = (value: number | null, factor: number): number | null =>
  value === null ? null : value * factor;

/** The mean, with the rounding of the first pass taken back in a second. */
function mean(points: readonly Point[], axis: "x" | "y"): number {
  const rough = sum(points, (point) => point[axis]) / points.length;
  return rough + sum(points, (point) => point[axis] - rough) / points.length;
}
