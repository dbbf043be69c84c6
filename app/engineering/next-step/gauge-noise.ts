import { median } from "simple-statistics";
import type { Iteration } from "./types";

/** Standard deviation of a normal distribution over its median absolute deviation: 1 / Φ⁻¹(0.75). */
const deviationPerMad = 1.482602218505602;

/**
 * How much one reading of a clearance scatters, 1 standard deviation, m, as the builds themselves show it: wear differs
 * little between the positions of a build, so what its wears differ by is mostly two readings' noise. The middle build
 * is taken, so that one bad build does not speak for the gauges. 0 where no build has four positions.
 * People state an uncertainty too small more often than too large; this is its floor where wear is judged.
 */
export function gaugeNoise(iterations: readonly Iteration[]): number {
  const noises = iterations.flatMap(({ positions }) => {
    const wears = positions.flatMap(({ assembled, tornDown }) =>
      assembled && tornDown ? [tornDown.clearance - assembled.clearance] : [],
    );
    if (wears.length < 4 || !wears.every(Number.isFinite)) return [];
    const middle = median(wears);
    return [(deviationPerMad * median(wears.map((wear) => Math.abs(wear - middle)))) / Math.SQRT2];
  });
  return noises.length > 0 ? median(noises) : 0;
}
