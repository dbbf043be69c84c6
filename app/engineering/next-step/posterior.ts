import { lawTable, normalBelow, rowOf, tableStep } from "./wear-law";

/** One position of a counted build. Lengths in µm, hours in h. */
export interface Sign {
  clearance: number;
  grade: number | null;
  /** Growth of the clearance and its standard uncertainty; null where it says nothing (bedding-in, a slip). */
  wear: number | null;
  wearUncertainty: number;
  hours: number;
  /** 0 to 1. */
  weight: number;
}

/** The belief over limit × slope, flat: index = slope × limits.length + limit. Weights add up to 1. */
export interface Belief {
  limits: readonly number[];
  slopes: readonly number[];
  weights: Float64Array;
  /** The base wear rate (µm/h) that each cell makes of the wear, and its standard deviation. */
  baseRate: Float64Array;
  baseRateDeviation: Float64Array;
}

/** Slopes that are thought possible, µm, with how likely each is before any build. */
const slopes = [1, 1.5, 2.1, 2.8, 3.6, 4.8] as const;
const slopePrior = [0.16, 0.18, 0.21, 0.21, 0.15, 0.09] as const;

/** The limit as a share of the usual clearance, before any build. */
const usualShare = { centre: 0.66, deviation: 0.13, anywhere: 0.16 } as const;

/** Base wear rates are thought to lie below this, 1 standard deviation, µm/h. */
const usualBaseRate = 0.3;

/**
 * The belief about the limit from every sign, on a grid. The base wear rate of each cell is integrated out in closed
 * form (a linear model with a half-normal prior).
 * @param usual the shop's usual clearance, µm
 * @param deviation standard deviation of a position's clearance as known, µm
 */
export function believe(signs: readonly Sign[], usual: number, deviation: number): Belief {
  const limits = limitGrid(usual);
  const size = limits.length * slopes.length;
  const logWeights = new Float64Array(size);
  const exposureSquared = new Float64Array(size);
  const exposureWear = new Float64Array(size);
  slopes.forEach((slope, j) => {
    const { rise, logReported } = lawTable(slope, deviation);
    const offset = j * limits.length;
    for (let i = 0; i < limits.length; i++) {
      logWeights[offset + i] = Math.log(slopePrior[j]!) + logPrior(limits[i]! / usual);
    }
    for (const { clearance, grade, wear, wearUncertainty, hours, weight } of signs) {
      const column = grade === null ? -1 : Math.max(1, grade) - 1;
      const precision = wear === null ? 0 : weight / wearUncertainty ** 2;
      for (let i = 0; i < limits.length; i++) {
        const row = rowOf(clearance - limits[i]!);
        if (column >= 0) logWeights[offset + i]! += weight * logReported[4 * row + column]!;
        if (precision > 0) {
          const exposure = hours * rise[row]!;
          exposureSquared[offset + i]! += precision * exposure * exposure;
          exposureWear[offset + i]! += precision * exposure * wear!;
        }
      }
    }
  });
  return normalised(limits, logWeights, exposureSquared, exposureWear);
}

/** The limits looked at: from a quarter of the usual clearance to well above it. */
function limitGrid(usual: number): number[] {
  const step = 4 * tableStep;
  const from = Math.floor(usual / 4);
  return Array.from({ length: Math.ceil(usual + 14 - from) / step + 1 }, (_, index) => from + index * step);
}

/**
 * Before any build: shops choose their usual clearance well above the limit, so that the limit lies near two thirds of
 * it; but now and then it could lie anywhere (common practice, no source).
 */
function logPrior(share: number): number {
  const z = (share - usualShare.centre) / usualShare.deviation;
  const bell = Math.exp(-0.5 * z * z) / (Math.sqrt(2 * Math.PI) * usualShare.deviation);
  return Math.log((1 - usualShare.anywhere) * bell + usualShare.anywhere);
}

function normalised(
  limits: number[],
  logWeights: Float64Array,
  exposureSquared: Float64Array,
  exposureWear: Float64Array,
): Belief {
  const size = logWeights.length;
  const baseRate = new Float64Array(size);
  const baseRateDeviation = new Float64Array(size);
  let highest = Number.NEGATIVE_INFINITY;
  for (let cell = 0; cell < size; cell++) {
    const deviation = 1 / Math.sqrt(exposureSquared[cell]! + usualBaseRate ** -2);
    const mean = exposureWear[cell]! * deviation ** 2;
    const z = mean / deviation;
    logWeights[cell]! += Math.log(deviation) + 0.5 * z * z + logNormalBelow(z);
    // Mean and deviation of a normal cut off below zero.
    const hazard = z < -5 ? -z : Math.exp(-0.5 * z * z) / (2.5066282746 * normalBelow(z));
    baseRate[cell] = Math.max(mean + deviation * hazard, 0);
    baseRateDeviation[cell] = deviation * Math.sqrt(Math.max(1 - hazard * (hazard + z), 0.04));
    highest = Math.max(highest, logWeights[cell]!);
  }
  let total = 0;
  const weights = logWeights.map((value) => Math.exp(value - highest));
  for (const weight of weights) total += weight;
  for (let cell = 0; cell < size; cell++) weights[cell]! /= total;
  return { limits, slopes, weights, baseRate, baseRateDeviation };
}

function logNormalBelow(z: number): number {
  return z < -5 ? -0.5 * z * z - Math.log(-z * 2.5066282746) : Math.log(normalBelow(z));
}
