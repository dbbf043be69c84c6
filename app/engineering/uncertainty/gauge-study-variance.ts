import { meanOfValues, type StudyDeviations, type StudyTable } from "./gauge-study-table";
import { incompleteBeta } from "./incomplete-beta";

/** One row of the analysis of variance. */
export interface AnovaRow {
  sumOfSquares: number;
  degreesOfFreedom: number;
}

/** The analysis of variance of a study. */
export interface AnovaOfStudy {
  people: AnovaRow;
  parts: AnovaRow;
  /** Of people with parts: some people read some parts differently. */
  interaction: AnovaRow;
  repeats: AnovaRow;
  /** Chance of as much interaction from repeats alone; absent with one person. */
  interactionProbability?: number;
  /** Whether the interaction was too little to keep and went into the repeats. */
  pooled: boolean;
}

/** Over this probability the interaction goes into the repeats (AIAG, Measurement Systems Analysis, 4th ed.). */
const poolOver = 0.25;

/** Two-way analysis of variance with parts and people as random effects; negative components count as nothing. */
export function analysisOfVariance(study: StudyTable): { deviations: StudyDeviations; table: AnovaOfStudy } {
  const people = study.people.length;
  const parts = study.parts.length;
  const trials = study.trials.length;
  const rows = rowsOf(study);
  const probability = people > 1 ? ratioProbability(rows.interaction, rows.repeats) : undefined;
  const pooled = probability === undefined || probability > poolOver;
  const within = pooled ? together(rows.interaction, rows.repeats) : rows.repeats;
  const against = pooled ? within : rows.interaction;
  const component = (row: AnovaRow, less: AnovaRow, count: number) =>
    Math.max(0, (meanSquare(row) - meanSquare(less)) / count);
  const betweenPeople = people > 1 ? component(rows.people, against, parts * trials) : 0;
  const ofInteraction = pooled ? 0 : component(rows.interaction, rows.repeats, trials);
  const repeatability = Math.sqrt(meanSquare(within));
  const reproducibility = Math.sqrt(betweenPeople + ofInteraction);
  const partToPart = Math.sqrt(component(rows.parts, against, people * trials));
  const gauge = Math.hypot(repeatability, reproducibility);
  return {
    deviations: { repeatability, reproducibility, gauge, partToPart, total: Math.hypot(gauge, partToPart) },
    table: {
      ...rows,
      ...(probability !== undefined && { interactionProbability: probability }),
      pooled,
    },
  };
}

function rowsOf({ people, parts, trials, values }: StudyTable) {
  const all = values.flat(2);
  const grand = meanOfValues(all);
  const squares = (means: readonly number[]) => means.reduce((sum, mean) => sum + (mean - grand) ** 2, 0);
  const cells = values.flat();
  const total = squares(all);
  const ofPeople =
    parts.length * trials.length * squares(values.map((byPart) => meanOfValues(byPart.flat())));
  const ofParts =
    people.length *
    trials.length *
    squares(parts.map((_, part) => meanOfValues(values.flatMap((byPart) => byPart[part]!))));
  const ofCells = trials.length * squares(cells.map(meanOfValues));
  const row = (sumOfSquares: number, degreesOfFreedom: number): AnovaRow => ({
    // What the last bits of a double leave of nothing is nothing.
    sumOfSquares: sumOfSquares > 1e-14 * total ? sumOfSquares : 0,
    degreesOfFreedom,
  });
  return {
    people: row(ofPeople, people.length - 1),
    parts: row(ofParts, parts.length - 1),
    interaction: row(ofCells - ofPeople - ofParts, (people.length - 1) * (parts.length - 1)),
    repeats: row(total - ofCells, cells.length * (trials.length - 1)),
  };
}

function meanSquare({ sumOfSquares, degreesOfFreedom }: AnovaRow): number {
  return sumOfSquares / degreesOfFreedom;
}

function together(one: AnovaRow, other: AnovaRow): AnovaRow {
  return {
    sumOfSquares: one.sumOfSquares + other.sumOfSquares,
    degreesOfFreedom: one.degreesOfFreedom + other.degreesOfFreedom,
  };
}

/** Chance of at least this ratio of two mean squares where both are of the same scatter (the F distribution's tail). */
function ratioProbability(above: AnovaRow, below: AnovaRow): number {
  if (above.sumOfSquares === 0) return 1;
  const share = below.sumOfSquares / (below.sumOfSquares + above.sumOfSquares);
  return incompleteBeta(share, below.degreesOfFreedom / 2, above.degreesOfFreedom / 2);
}
