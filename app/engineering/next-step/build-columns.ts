import type { Iteration } from "./types";
import { worstGrade } from "./worst-grade";

/** A build as a column of the chart of a fit's clearances: aim, window, positions, worst grade, hours, oil; lengths in m. */
export function buildColumns(iterations: readonly Iteration[], tolerance: number) {
  return iterations.map((build) => ({
    build: build.build,
    target: build.target,
    window: { least: build.target - tolerance, most: build.target + tolerance },
    hours: build.hours ?? undefined,
    oil: build.oil?.name,
    kv100: build.oil?.kv100 ?? undefined,
    grade: worstGrade(build),
    positions: build.positions.map((position) => ({
      number: position.position,
      assembled: position.assembled?.clearance,
      tornDown: position.tornDown?.clearance,
    })),
  }));
}

export type BuildColumns = ReturnType<typeof buildColumns>;
