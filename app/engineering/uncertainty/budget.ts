import tQuantile from "@stdlib/stats-base-dists-t-quantile";
import { EngineeringError } from "../engineering-error";

/** One line of an uncertainty budget. */
export interface BudgetLine {
  what: string;
  /** Standard uncertainty of the result from this, in the result's unit. */
  uncertainty: number;
  /** Degrees of freedom; infinite where the figure is a bound or a certificate's. */
  degreesOfFreedom: number;
}

/** A combined uncertainty with the lines it is made of. */
export interface Uncertainty {
  combined: number;
  effectiveDegreesOfFreedom: number;
  /** What the combined one is multiplied by to cover about 95 %. */
  coverage: number;
  expanded: number;
  budget: BudgetLine[];
}

/**
 * Combines independent lines: root of the sum of squares (JCGM 100:2008, eq. 10), effective degrees of freedom by
 * Welch–Satterthwaite (eq. G.2b), truncated to the next lower whole number and expanded by Student's t (G.6.4).
 * @param probability what the expanded uncertainty covers; 0.95 unless said
 */
export function combine(budget: BudgetLine[], probability = 0.95): Uncertainty {
  for (const line of budget) {
    if (!(line.uncertainty >= 0 && Number.isFinite(line.uncertainty))) {
      throw new EngineeringError(
        "not-a-number",
        line.what,
        `The uncertainty of ${line.what} must be zero or more.`,
      );
    }
  }
  const combined = Math.hypot(...budget.map((line) => line.uncertainty));
  const sum = budget.reduce((total, line) => total + line.uncertainty ** 4 / line.degreesOfFreedom, 0);
  const effective = sum > 0 ? combined ** 4 / sum : Number.POSITIVE_INFINITY;
  const coverage = tQuantile((1 + probability) / 2, Math.min(Math.max(Math.floor(effective), 1), 1e6));
  return {
    combined,
    effectiveDegreesOfFreedom: effective,
    coverage,
    expanded: coverage * combined,
    budget,
  };
}

/** Standard uncertainty of a value known to lie within ± a half-width, each place as likely (JCGM 100:2008, 4.3.7). */
export function rectangular(halfWidth: number): number {
  return halfWidth / Math.sqrt(3);
}
