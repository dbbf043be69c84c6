/**
 * What the hidden limit does: the wear rate is the base rate times 1 + exp((limit − clearance) / slope), and the
 * condition grade follows from how many times the base rate it is. Lengths in µm, inside the next step only.
 */

/** The rise of the wear rate at which the grade passes from 1 to 2, from 2 to 3 and from 3 to 4. */
const gradeRises = [1.5, 3, 8] as const;

/** How far above the limit, in slopes, each grade begins: where the rise reaches its threshold. */
const gradeBegins = gradeRises.map((rise) => -Math.log(rise - 1)) as [number, number, number];

/** How often a builder's grade is one off, and how often it is anything at all. */
const misgraded = 0.1;
const anything = 0.01;

/** Tables run over the way above the limit, from deep in failure to where nothing changes any more. */
export const tableStep = 0.25;
const tableFrom = -20;
const tableLength = 261;

/** The law for one slope and one doubt of where a position lies. */
export interface LawTable {
  /** Wear over the base rate, by row. */
  rise: Float64Array;
  /** Chance that a position's true grade is over 2, and over 3, by row. */
  distressed: Float64Array;
  failed: Float64Array;
  /** Chance of being reported grade 1 to 4 (0 is read as 1), and its logarithm: index = row × 4 + grade − 1. */
  reported: Float64Array;
  logReported: Float64Array;
}

/**
 * The law as a table over the way above the limit.
 * @param deviation how far a position may lie from where it is thought to be, 1 standard deviation
 */
export function lawTable(slope: number, deviation: number): LawTable {
  const table: LawTable = {
    rise: new Float64Array(tableLength),
    distressed: new Float64Array(tableLength),
    failed: new Float64Array(tableLength),
    reported: new Float64Array(4 * tableLength),
    logReported: new Float64Array(4 * tableLength),
  };
  for (let row = 0; row < tableLength; row++) {
    const above = tableFrom + row * tableStep;
    const [over1, over2, over3] = gradeBegins.map((begins) =>
      normalBelow((begins * slope - above) / deviation),
    ) as [number, number, number];
    table.rise[row] = 1 + Math.exp(Math.min(-above / slope, 12));
    table.distressed[row] = over2;
    table.failed[row] = over3;
    const truly = [1 - over1, over1 - over2, over2 - over3, over3];
    for (let grade = 0; grade < 4; grade++) {
      const chance = reportedChance(truly, grade);
      table.reported[4 * row + grade] = chance;
      table.logReported[4 * row + grade] = Math.log(chance);
    }
  }
  return table;
}

/** The row of a table for a way above the limit; what lies beyond its ends takes the end. */
export function rowOf(above: number): number {
  return Math.min(Math.max(Math.round((above - tableFrom) / tableStep), 0), tableLength - 1);
}

/** Chance of a reported grade (0 to 3 for grade 1 to 4): half of the misgraded go up and half down. */
function reportedChance(truly: readonly number[], grade: number): number {
  const share = truly[grade]!;
  const lower = truly[grade - 1] ?? share;
  const higher = truly[grade + 1] ?? share;
  return (1 - anything) * (share + (misgraded / 2) * (lower + higher - 2 * share)) + anything / 4;
}

/**
 * Normal distribution function, to 1e-7 (Abramowitz & Stegun, Handbook of Mathematical Functions, 26.2.17); the tails
 * matter, because failure is judged in them.
 */
export function normalBelow(z: number): number {
  const t = 1 / (1 + 0.2316419 * Math.abs(z));
  const tail =
    0.3989422804014327 *
    Math.exp(-0.5 * z * z) *
    t *
    (0.31938153 + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429))));
  return z > 0 ? 1 - tail : tail;
}
