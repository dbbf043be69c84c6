import type { Situation } from "./situation";
import type { Truth } from "./truths";
import { rowOf } from "./wear-law";

/** What a build at one target would show under each truth. */
export interface ExpectedSigns {
  row: Int32Array;
  wear: Float64Array;
  precision: Float64Array;
  logPrecision: Float64Array;
}

/** What a build at a target (µm) would show, under each truth. */
export function expectedSigns(target: number, truths: readonly Truth[], situation: Situation): ExpectedSigns {
  const size = truths.length;
  const signs: ExpectedSigns = {
    row: new Int32Array(size),
    wear: new Float64Array(size),
    precision: new Float64Array(size),
    logPrecision: new Float64Array(size),
  };
  const gauges = situation.wearUncertainty ** 2 / situation.positions;
  for (let at = 0; at < size; at++) {
    const { limit, law, baseRate, baseRateDeviation } = truths[at]!;
    const row = rowOf(target - limit);
    const exposure = situation.hours * law.rise[row]!;
    signs.row[at] = row;
    signs.wear[at] = baseRate * exposure;
    signs.precision[at] = 1 / (gauges + (baseRateDeviation * exposure) ** 2);
    signs.logPrecision[at] = Math.log(signs.precision[at]!);
  }
  return signs;
}

/** The weights of all truths after one of them has shown its signs (not normalised), and the best clearance then. */
export function learn(
  shown: number,
  truths: readonly Truth[],
  { row, wear, precision, logPrecision }: ExpectedSigns,
  positions: number,
  learned: Float64Array,
): { total: number; best: number } {
  const { reported } = truths[shown]!.law;
  const start = 4 * row[shown]!;
  const [g1, g2, g3, g4] = [0, 1, 2, 3].map((grade) => positions * reported[start + grade]!) as Grades;
  const worn = wear[shown]!;
  let highest = Number.NEGATIVE_INFINITY;
  for (let at = 0; at < truths.length; at++) {
    const log = truths[at]!.law.logReported;
    const cell = 4 * row[at]!;
    const byGrade = g1 * log[cell]! + g2 * log[cell + 1]! + g3 * log[cell + 2]! + g4 * log[cell + 3]!;
    const value = byGrade + 0.5 * (logPrecision[at]! - (worn - wear[at]!) ** 2 * precision[at]!);
    learned[at] = value;
    if (value > highest) highest = value;
  }
  let total = 0;
  let best = 0;
  for (let at = 0; at < truths.length; at++) {
    const weight = truths[at]!.weight * Math.exp(learned[at]! - highest);
    learned[at] = weight;
    total += weight;
    best += weight * truths[at]!.best;
  }
  return { total, best: best / total };
}

type Grades = [number, number, number, number];
