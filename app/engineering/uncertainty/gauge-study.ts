import { EngineeringError } from "../engineering-error";
import { averageAndRange } from "./gauge-study-range";
import { type StudyDeviations, type StudyReading, studyTable } from "./gauge-study-table";
import { type AnovaOfStudy, analysisOfVariance } from "./gauge-study-variance";

/** One source of variation. */
export interface StudyShare {
  standardDeviation: number;
  /** Of the study's total variation, %; these do not add up to 100. */
  percentOfStudy: number;
  /** Six standard deviations of the tolerance, %; absent without a tolerance. */
  percentOfTolerance?: number;
}

/** The result by one method. */
export interface StudyResult extends Record<keyof StudyDeviations, StudyShare> {
  /** How many sizes the gauge can tell apart over these parts: 1.41 × parts ÷ gauge, truncated; `null` where the gauge
   * shows no scatter at all, so that its step is too coarse to say. */
  distinctCategories: number | null;
  /** AIAG's guide: under 10 % of the study good, 10 to 30 % depending on what is at stake, over that not good enough. */
  verdict: "good" | "conditional" | "not-good-enough";
}

export interface GaugeStudy {
  averageAndRange: StudyResult;
  anova: StudyResult & { table: AnovaOfStudy };
  /** What the study cannot see. */
  cautions: string[];
}

/**
 * A gauge's repeatability and reproducibility from people who measured the same parts several times, by the
 * average-and-range and the analysis-of-variance method (AIAG, Measurement Systems Analysis, 4th ed.).
 * @param readings every person, part and trial once; 2–20 parts, 1–10 people, 2–10 trials
 * @param tolerance the width of what is allowed, in the readings' unit
 * @throws EngineeringError `incomplete` or `repeated` with the cell named, `outside-range` for the counts,
 * `not-a-number`, `not-positive` for the tolerance, `no-variation` where all readings are equal
 */
export function gaugeStudy(readings: readonly StudyReading[], tolerance?: number): GaugeStudy {
  if (tolerance !== undefined && !(tolerance > 0 && Number.isFinite(tolerance))) {
    throw new EngineeringError("not-positive", "tolerance", "A tolerance is a width over zero.");
  }
  const table = studyTable(readings);
  const anova = analysisOfVariance(table);
  const { people } = table;
  return {
    averageAndRange: resultOf(averageAndRange(table), tolerance),
    anova: { ...resultOf(anova.deviations, tolerance), table: anova.table },
    cautions:
      people.length === 1
        ? ["One person measured: what people differ by was not seen, and counts as nothing."]
        : [],
  };
}

function resultOf(deviations: StudyDeviations, tolerance: number | undefined): StudyResult {
  const share = (standardDeviation: number): StudyShare => ({
    standardDeviation,
    percentOfStudy: (100 * standardDeviation) / deviations.total,
    ...(tolerance !== undefined && { percentOfTolerance: (600 * standardDeviation) / tolerance }),
  });
  const { gauge, partToPart } = deviations;
  return {
    repeatability: share(deviations.repeatability),
    reproducibility: share(deviations.reproducibility),
    gauge: share(gauge),
    partToPart: share(partToPart),
    total: share(deviations.total),
    distinctCategories: gauge > 0 ? Math.floor((1.41 * partToPart) / gauge) : null,
    verdict: verdictOf((100 * gauge) / deviations.total),
  };
}

function verdictOf(percent: number): StudyResult["verdict"] {
  if (percent < 10) return "good";
  return percent <= 30 ? "conditional" : "not-good-enough";
}
