import { mean } from "simple-statistics";
import { pairedT } from "../wear/compare-builds";
import { isClean } from "./judged-build";
import type { WeighedBuild } from "./likeness";

/** The chance of being wrong that is accepted before a rise of wear counts, one-sided. */
const significance = 0.005;

export interface WearRise {
  /** m/h, mean over the positions. */
  baseline: number;
  rate: number;
  /** How many times the baseline. */
  rise: number;
  /** One-sided. */
  p: number;
}

/** Wear per hour of each position, m/h, over the builds together; positions without a usable wear are left out. */
function ratesByPosition(builds: readonly WeighedBuild[]): Map<number, number> {
  const sums = new Map<number, { wear: number; hours: number }>();
  for (const { iteration, positions } of builds) {
    const hours = iteration.hours ?? 0;
    for (const { position, wear } of positions) {
      if (wear === null || !(hours > 0)) continue;
      const sum = sums.get(position) ?? { wear: 0, hours: 0 };
      sums.set(position, { wear: sum.wear + wear, hours: sum.hours + hours });
    }
  }
  return new Map([...sums].map(([position, { wear, hours }]) => [position, wear / hours]));
}

/** Builds that show the engine's own steady wear: clean, bedded in, on this oil and coating. */
function steadyBuilds(builds: readonly WeighedBuild[]): WeighedBuild[] {
  return builds.filter((build) => build.weight > 0 && build.like && !build.beddingIn && isClean(build));
}

/** The engine's own steady wear rate, m/h; null where no steady build was measured. */
export function baselineRate(builds: readonly WeighedBuild[]): number | null {
  const rates = [...ratesByPosition(steadyBuilds(builds)).values()];
  return rates.length > 0 ? mean(rates) : null;
}

/**
 * How the wear rate of the last build stands to the engine's own baseline at wider clearances, paired by position; null
 * where it has not risen by so many times, or not beyond doubt, or where there is nothing to compare with.
 */
export function wearRise(builds: readonly WeighedBuild[], atLeast: number): WearRise | null {
  const last = builds.at(-1)!;
  if (last.beddingIn) return null;
  const wider = steadyBuilds(builds.slice(0, -1)).filter(
    ({ iteration }) => iteration.target > last.iteration.target + 1e-8,
  );
  const before = ratesByPosition(wider);
  const now = ratesByPosition([last]);
  const shared = [...now.keys()].filter((position) => before.has(position));
  if (shared.length < 3) return null;
  const { t, p } = pairedT(shared.map((position) => now.get(position)! - before.get(position)!));
  if (t === null || p === null || t < 0 || p / 2 > significance) return null;
  const baseline = mean(shared.map((position) => before.get(position)!));
  const rate = mean(shared.map((position) => now.get(position)!));
  // A baseline below what the gauges can see would make any wear look like a rise.
  const hours = wider.reduce((sum, { iteration }) => sum + (iteration.hours ?? 0), 0);
  const visible = (Math.SQRT2 * last.positions[0]!.standardUncertainty) / Math.sqrt(shared.length) / hours;
  const rise = rate / Math.max(baseline, visible);
  return rise >= atLeast ? { baseline, rate, rise, p: p / 2 } : null;
}
