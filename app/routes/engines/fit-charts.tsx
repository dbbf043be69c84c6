import { ClearanceByBuild } from "~/components/drawings/clearance-by-build";
import type { Iteration } from "~/engineering/next-step/types";
import type { PageUnits } from "~/engineering/quantity/figures";

interface FitChartsProps {
  title: string;
  units: PageUnits;
  builds: Iteration[];
}

/** A fit's history as drawings. */
export function FitCharts({ title, units, builds }: FitChartsProps) {
  return (
    <ClearanceByBuild
      title={`${title}, clearance by build`}
      units={units}
      builds={builds.map((build) => ({
        build: build.build,
        target: build.target,
        hours: build.hours ?? undefined,
        oil: build.oil?.name,
        grade: worstGrade(build),
        positions: build.positions.map((position) => ({
          number: position.position,
          assembled: position.assembled?.clearance,
          tornDown: position.tornDown?.clearance,
        })),
      }))}
    />
  );
}

/** The worst grade of a build's positions; `undefined` where none is graded. */
export function worstGrade(build: Iteration): number | undefined {
  const grades = build.positions.flatMap((position) => position.grade ?? []);
  return grades.length > 0 ? Math.max(...grades) : undefined;
}
