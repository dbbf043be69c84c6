/** A point of a line, any units. */
export interface Point {
  x: number;
  y: number;
}

/** A straight line of least squares; a figure that the points cannot give is null. */
export interface Line {
  slope: number;
  intercept: number;
  slopeStandardError: number | null;
  /** Null also where the line was forced through the origin. */
  interceptStandardError: number | null;
  residualStandardDeviation: number | null;
  /** Share of the spread of y that the line explains. */
  r2: number | null;
  degreesOfFreedom: number;
}

/** A confidence interval. */
export interface Interval {
  from: number;
  to: number;
}
