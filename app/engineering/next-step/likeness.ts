import { coatingOf } from "./coating";
import type { JudgedBuild } from "./judged-build";
import type { FitOfHistory, OilOfRun } from "./types";

/** A build with what share of its evidence counts, and why not all. */
export interface WeighedBuild extends JudgedBuild {
  weight: number;
  why: string | null;
  /** Ran on the oil and the coating that the fit has now. */
  like: boolean;
}

/** What unlike and old evidence still counts (no source; set so that a few builds on the present oil outweigh it). */
const share = { otherOil: 0.25, fuelInOil: 0.5, older: 0.5 } as const;
const recentBuilds = 12;
const oldestBuilds = 20;

/** Weighs every build as evidence about the clearance on the oil and coating of the last one. */
export function weighBuilds(builds: readonly JudgedBuild[], fit: FitOfHistory): WeighedBuild[] {
  // A build whose oil nobody wrote down is taken to have run on the one before it, until somebody does.
  const present = builds.findLast(({ iteration }) => iteration.oil !== null)?.iteration.oil ?? null;
  return builds.map((build, index) => {
    const age = builds.length - 1 - index;
    const { oil, events } = build.iteration;
    const sameOil = age === 0 || isSameOil(oil, present);
    const sameCoating = coatingOf(build.iteration, fit) === coatingOf({}, fit);
    const weighed = (weight: number, why: string | null): WeighedBuild => ({
      ...build,
      weight,
      why,
      like: sameOil && sameCoating,
    });
    if (build.fault) return weighed(0, build.fault.code);
    if (build.elsewhere.length > 0 && build.distressed.length === 0) return weighed(0, "damage-elsewhere");
    if (!sameCoating) return weighed(0, "other-coating");
    if (age >= oldestBuilds) return weighed(0, "too-old");
    const reasons = [
      ...(sameOil ? [] : [{ factor: share.otherOil, why: "other-oil" }]),
      ...(events.includes("fuel-dilution") ? [{ factor: share.fuelInOil, why: "fuel-in-oil" }] : []),
      ...(age >= recentBuilds ? [{ factor: share.older, why: "older" }] : []),
    ];
    return weighed(
      reasons.reduce((weight, { factor }) => weight * factor, 1),
      reasons.map(({ why }) => why).join(", ") || null,
    );
  });
}

/** Batches of one oil differ by a few percent; neighbouring grades of SAE J300 differ by a quarter and more. */
const sameViscosity = 0.08;

/** Whether two runs had the same oil: by grade and viscosity where both are known, else by name. */
export function isSameOil(a: OilOfRun | null, b: OilOfRun | null): boolean {
  if (!a || !b) return false;
  if (a.grade && b.grade && a.grade !== b.grade) return false;
  for (const point of ["kv100", "kv40"] as const) {
    const [first, second] = [a[point], b[point]];
    if (first && second) return Math.abs(Math.log(first / second)) < sameViscosity;
  }
  return a.name.trim().toLowerCase() === b.name.trim().toLowerCase();
}
