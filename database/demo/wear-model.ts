import type { FitKindName } from "~/engineering/trade/fit-kinds";
import type { Random } from "./random";

/** One micron, m. */
export const micron = 1e-6;

/** How far a careful build misses its target, 1 standard deviation a position, m. */
export const buildScatter = 1.2 * micron;

/** How far one reading of a diameter is off, 1 standard deviation, m. */
export const readingNoise = 0.7 * micron;

/** Pa·s; about a 20W-50 at 105 °C. Critical clearances are stated at it. */
const referenceViscosity = 0.0135;

/** How often a builder's grade is one off, among grades that are no distress. */
const misgraded = 0.1;

/** The truth of one fit, which the shop never learns. Lengths in m, rates in m/h. */
export interface Truth {
  /** Clearance at which wear is twice its base, at the reference viscosity and without a coating. */
  critical: number;
  /** Clearance over which the excess wear grows e-fold. */
  slope: number;
  baseRate: number;
  /** Shift of the critical clearance per e-fold of viscosity. */
  viscosityShift: number;
  /** What a coating takes off the critical clearance. */
  coatingBenefit: number;
  /** What a coating's first run wears once. */
  beddingIn: number;
  /** Share of the wear that is the bore's. */
  boreShare: number;
}

type Range = readonly [number, number];

/** Where truths are drawn from: µm and µm/h, critical clearances as what they lie below the usual one. */
interface Character {
  belowUsual: Range;
  slope: Range;
  baseRate: Range;
  viscosityShift: Range;
  coatingBenefit: Range;
  beddingIn: Range;
  boreShare: number;
}

// No source: chosen so that a shop finds its clearance within a season. A shell is softer than its journal, a guide
// softer than its stem; a pin and its eye are more alike.
const shell: Character = {
  belowUsual: [14, 21],
  slope: [2.2, 3.4],
  baseRate: [0.06, 0.14],
  viscosityShift: [3, 7],
  coatingBenefit: [2, 4],
  beddingIn: [1.5, 3],
  boreShare: 0.85,
};
const pin: Character = {
  belowUsual: [8, 10.5],
  slope: [1.2, 1.8],
  baseRate: [0.03, 0.06],
  viscosityShift: [0.5, 1.5],
  coatingBenefit: [1, 2],
  beddingIn: [0.6, 1.2],
  boreShare: 0.6,
};
const stem: Character = {
  belowUsual: [11, 15],
  slope: [2, 3],
  baseRate: [0.08, 0.18],
  viscosityShift: [0, 1],
  coatingBenefit: [1, 2],
  beddingIn: [0.8, 1.6],
  boreShare: 0.8,
};

const characters: Partial<Record<FitKindName, Character>> = {
  main: shell,
  "big-end": shell,
  "pin-in-piston": pin,
  "pin-in-rod": pin,
  "intake-stem": stem,
  "exhaust-stem": stem,
};

/** Draws the truth of a fit. Dust wears everything faster. @param usual the fit's usual clearance, m */
export function drawTruth(random: Random, kind: FitKindName, usual: number, dusty: boolean): Truth {
  const character = characters[kind];
  if (!character) throw new RangeError(`the demo has no wear for ${kind}`);
  const draw = (range: Range) => random.between(range) * micron;
  return {
    critical: usual - draw(character.belowUsual),
    slope: draw(character.slope),
    baseRate: draw(character.baseRate) * (dusty ? 1.5 : 1),
    viscosityShift: draw(character.viscosityShift),
    coatingBenefit: draw(character.coatingBenefit),
    beddingIn: draw(character.beddingIn),
    boreShare: character.boreShare,
  };
}

/** The critical clearance at a viscosity, Pa·s, with or without the coating, m. */
export function criticalAt(truth: Truth, viscosity: number, coated: boolean): number {
  const shift = truth.viscosityShift * Math.log(viscosity / referenceViscosity);
  return truth.critical + shift - (coated ? truth.coatingBenefit : 0);
}

/** How many times its base rate a position wears at a clearance: 1 + exp((critical − clearance) / slope). */
export function wearRise(truth: Truth, clearance: number, critical: number): number {
  return 1 + Math.exp((critical - clearance) / truth.slope);
}

/** The condition grade that a rise of wear leaves behind. */
export function gradeOfRise(rise: number): number {
  if (rise < 1.5) return 1;
  if (rise < 3) return 2;
  return rise < 8 ? 3 : 4;
}

/** The grade as a builder writes it down: now and then one off, but nobody mistakes distress for polish. */
export function seenGrade(random: Random, grade: number): number {
  if (!random.chance(misgraded)) return grade;
  const other = grade + (random.chance(0.5) ? 1 : -1);
  return Math.max(grade, other) < 3 && other >= 0 ? other : grade;
}
