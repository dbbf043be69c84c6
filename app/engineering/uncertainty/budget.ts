import { EngineeringError } from "../engineering-error";
import { tQuantile } from "./student-t";

/** One line of an uncertainty budget. */
export interface BudgetLine {
  what: string;
  /** Standard uncertainty of the result from this, in the result's unit: sensitivity times the input's own. */
  uncertainty: number;
  /** Absent where the figure is a bound or a certificate's, which counts as known for certain (GUM G.4.2, note). */
  degreesOfFreedom?: number;
}

/** A combined uncertainty with the lines it is made of. */
export interface Uncertainty {
  /** Standard uncertainty of the result. */
  combined: number;
  /** Absent where every line is known for certain. */
  effectiveDegreesOfFreedom?: number;
  /** What the combined one is multiplied by to cover the probability. */
  coverage: number;
  expanded: number;
  /** The lines with their share of the variance, 0 to 1. */
  budget: (BudgetLine & { share: number })[];
}

/**
 * Combines independent lines: root of the sum of squares (JCGM 100:2008, eq. 10), effective degrees of freedom by
 * Welch–Satterthwaite (eq. G.2b), truncated to the next lower whole number and expanded by Student's t (G.6.4).
 * @param probability what the expanded uncertainty covers; 0.95 unless said
 * @throws EngineeringError `not-a-number` for an uncertainty below zero or none, `outside-range` for degrees of
 * freedom under one
 */
export function combine(lines: readonly BudgetLine[], probability = 0.95): Uncertainty {
  for (const line of lines) refuseUnsound(line);
  const combined = Math.hypot(...lines.map((line) => line.uncertainty));
  const effective = effectiveDegrees(lines, combined);
  // A line with all the weight can leave a hair under its own whole number of degrees of freedom.
  const whole =
    effective === undefined ? Number.POSITIVE_INFINITY : Math.max(1, Math.floor(effective + 1e-9));
  const coverage = tQuantile((1 + probability) / 2, whole);
  return {
    combined,
    ...(effective !== undefined && { effectiveDegreesOfFreedom: effective }),
    coverage,
    expanded: coverage * combined,
    budget: lines.map((line) => ({
      ...line,
      share: combined > 0 ? (line.uncertainty / combined) ** 2 : 0,
    })),
  };
}

function refuseUnsound({ what, uncertainty, degreesOfFreedom }: BudgetLine): void {
  if (!(uncertainty >= 0 && Number.isFinite(uncertainty))) {
    throw new EngineeringError("not-a-number", what, `The uncertainty of ${what} must be zero or more.`);
  }
  if (degreesOfFreedom !== undefined && !(degreesOfFreedom >= 1)) {
    throw new EngineeringError(
      "outside-range",
      what,
      `The degrees of freedom of ${what} must be one or more.`,
    );
  }
}

function effectiveDegrees(lines: readonly BudgetLine[], combined: number): number | undefined {
  const sum = lines.reduce((total, { uncertainty, degreesOfFreedom }) => {
    return degreesOfFreedom === undefined ? total : total + (uncertainty / combined) ** 4 / degreesOfFreedom;
  }, 0);
  // So little of it is estimated that Student's t cannot be told from the normal distribution.
  return sum > 1e-12 ? 1 / sum : undefined;
}

/** Standard uncertainty of a value known to lie within ± a half-width, each place as likely (JCGM 100:2008, 4.3.7). */
export function rectangular(halfWidth: number): number {
  return halfWidth / Math.sqrt(3);
}
