import { mean } from "simple-statistics";
import { oddOneOutThreshold, robustZ } from "../wear/odd-one-out";
import { causeElsewhere } from "./damage";
import type { WeighedBuild } from "./likeness";
import type { Sign } from "./posterior";
import { usualScatter } from "./readings";

const micron = 1e-6;

/** How far the middle of a build lies from its target, 1 standard deviation, m (common practice, no source). */
const usualOffset = 0.6 * micron;

/**
 * Positions of one build share its oil, its run and its grader, so that eight of them tell a little less than eight
 * builds of one would (no source; set on the simulated shops).
 */
const independence = 0.8;

/** How many positions' worth of confidence the usual scatter has before any was seen. */
const scatterCount = 16;

/**
 * How far positions lie from the middle of their build, 1 standard deviation, m: as seen in every build that counts,
 * less what the gauges add, starting from the usual.
 */
export function buildScatter(builds: readonly WeighedBuild[]): number {
  let sum = scatterCount * usualScatter ** 2;
  let count = scatterCount;
  for (const { weight, positions, clearance } of builds) {
    if (weight === 0 || clearance === null) continue;
    const read = positions.filter((position) => position.clearance !== null);
    if (read.length < 3) continue;
    for (const position of read) {
      sum += (position.clearance! - clearance) ** 2 * (read.length / (read.length - 1));
      sum -= position.standardUncertainty ** 2;
      count += 1;
    }
  }
  return Math.min(Math.max(Math.sqrt(Math.max(sum, 0) / count), usualScatter / 2), 3 * usualScatter);
}

/** Every position of every build that counts, as a sign of the limit. In µm. */
export function signsOf(builds: readonly WeighedBuild[], scatter: number): Sign[] {
  return builds.filter(({ weight }) => weight > 0).flatMap((build) => signsOfBuild(build, scatter));
}

function signsOfBuild(build: WeighedBuild, scatter: number): Sign[] {
  const { iteration, positions, weight, beddingIn } = build;
  const middle = middleOf(build, scatter);
  const odd = oddWears(build);
  const worn = positions.filter(({ position, wear }) => wear !== null && !odd.has(position));
  const usualWear = worn.length > 0 ? mean(worn.map(({ wear }) => wear!)) : 0;
  const hours = iteration.hours !== null && iteration.hours > 0 ? iteration.hours : null;
  return positions
    .filter((position) => causeElsewhere(position) === null)
    .map(({ position, clearance, wear, standardUncertainty, grade }) => {
      // Torn down it was measured once more: less what the build wore, that is a second reading of the same place.
      const twice = clearance !== null && wear !== null && !odd.has(position);
      const reading = twice ? clearance + (wear - usualWear) / 2 : clearance;
      // A reading counts against the build's middle by their variances: neither is exact.
      const share = scatter ** 2 / (scatter ** 2 + standardUncertainty ** 2 / (twice ? 2 : 1));
      const lies = reading === null ? middle : middle + share * (reading - middle);
      // Wear far from the others', with a grade that knows nothing of it, is a slip or one bearing's own trouble.
      const doubtful = odd.has(position) && (grade ?? 0) < 2;
      const tells = wear !== null && hours !== null && !beddingIn && !doubtful;
      return {
        clearance: lies / micron,
        grade,
        wear: tells ? wear / micron : null,
        wearUncertainty: (Math.SQRT2 * standardUncertainty) / micron,
        hours: hours ?? 0,
        weight: weight * independence,
      };
    });
}

/** The middle of a build: between its target and the mean of its readings, by their variances; m. */
function middleOf({ iteration, positions }: WeighedBuild, scatter: number): number {
  const read = positions.filter(({ clearance }) => clearance !== null);
  if (read.length === 0) return iteration.target;
  const seen = mean(read.map(({ clearance }) => clearance!));
  const variance =
    read.reduce((sum, p) => sum + scatter ** 2 + p.standardUncertainty ** 2, 0) / read.length ** 2;
  const offset = seen - iteration.target;
  // Clearly off the target: the shop did not hit it, and the readings say where it is.
  if (Math.abs(offset) > 3 * Math.sqrt(variance + usualOffset ** 2)) return seen;
  return iteration.target + (offset * usualOffset ** 2) / (usualOffset ** 2 + variance);
}

/** Positions whose wear stands out from the others of their build: one bearing's trouble, not the clearance's. */
export function oddWears({ positions }: WeighedBuild): Set<number> {
  const worn = positions.filter(({ wear }) => wear !== null);
  if (worn.length < 4) return new Set();
  const leastDeviation = Math.SQRT2 * Math.max(...worn.map(({ standardUncertainty }) => standardUncertainty));
  const scores = robustZ(
    worn.map(({ wear }) => wear!),
    leastDeviation,
  );
  return new Set(
    worn.filter((_, index) => Math.abs(scores[index]!) > oddOneOutThreshold).map(({ position }) => position),
  );
}
