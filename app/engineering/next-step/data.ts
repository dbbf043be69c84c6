import { median } from "simple-statistics";
import type { WeighedBuild } from "./likeness";
import { expandedUncertainty } from "./readings";
import type { CompleteRules } from "./rules";
import type { OilOfRun } from "./types";
import type { Verdict } from "./verdict";

/**
 * The first guard: whether the data of the last build allow a judgement. Null where they do.
 * @param builds at least one
 */
export function judgeData(builds: readonly WeighedBuild[], rules: CompleteRules): Verdict | null {
  const last = builds.at(-1)!;
  const { build, target, hours, oil } = last.iteration;
  const measureAgain = (reason: Verdict["reason"]): Verdict => ({ action: "measure-again", target, reason });
  const hold = (reason: Verdict["reason"]): Verdict => ({ action: "hold", target, reason });

  const twin = sameTwice(builds);
  if (twin) return hold(twin);
  if (last.fault) return last.fault.code === "not-torn-down" ? hold(last.fault) : measureAgain(last.fault);
  const uncertainty = uncertaintyAtTarget(builds);
  if (uncertainty > rules.largestStep) {
    return measureAgain({
      code: "uncertainty-over-step",
      values: { build, uncertainty, step: rules.largestStep },
    });
  }
  if (!hours || !(hours > 0)) return hold({ code: "no-hours", values: { build } });
  if (hours < rules.leastHours) {
    return hold({ code: "too-few-hours", values: { build, hours, least: rules.leastHours } });
  }
  if (!oil) return hold({ code: "no-oil", values: { build } });
  if (!hasViscosity(oil)) return hold({ code: "oil-without-viscosity", values: { build, oil: oil.name } });
  return null;
}

/**
 * Expanded uncertainty of a clearance at the last target, m. A build repeated at the same target halves its variance;
 * more repeats do not help, since what the gauges' calibration adds is the same every time.
 */
export function uncertaintyAtTarget(builds: readonly WeighedBuild[]): number {
  const last = builds.at(-1)!;
  const before = builds.at(-2);
  const repeated =
    before && before.weight > 0 && isSameTarget(before.iteration.target, last.iteration.target);
  return lastUncertainty(last) / (repeated ? Math.SQRT2 : 1);
}

/** Expanded uncertainty of one clearance in a build as it was stated, m: the middle one of its positions. */
export function lastUncertainty({ iteration: { positions } }: WeighedBuild): number {
  return positions.length > 0 ? median(positions.map(expandedUncertainty)) : 0;
}

/** Targets that differ by less than nobody can type. */
export function isSameTarget(a: number, b: number): boolean {
  return Math.abs(a - b) < 1e-8;
}

function sameTwice(builds: readonly WeighedBuild[]): Verdict["reason"] | null {
  const last = builds.at(-1)!.iteration;
  for (const { iteration } of builds.slice(0, -1)) {
    if (iteration.build === last.build) return { code: "build-twice", values: { build: last.build } };
    if (last.date && iteration.date === last.date) {
      return { code: "date-twice", values: { first: iteration.build, second: last.build, date: last.date } };
    }
  }
  return null;
}

function hasViscosity({ kv40, kv100, dynamicViscosity }: OilOfRun): boolean {
  return [kv40, kv100, dynamicViscosity].some((viscosity) => viscosity != null && viscosity > 0);
}
